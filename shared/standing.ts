/** Roles of people with an account, weakest first. Each includes the ones before it. */
export const roles = ['technician', 'contributor', 'moderator', 'owner'] as const;

export type Role = (typeof roles)[number];

/** Who may ask: a guest has no account. */
export type Standing = 'guest' | Role;

/** Every standing, weakest first. */
export const standings: readonly Standing[] = ['guest', ...roles];

/** True if somebody of standing `has` may do what `needs` may do. */
export const includesRole = (has: Standing, needs: Standing): boolean =>
  standings.indexOf(has) >= standings.indexOf(needs);
