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

/** Roles that somebody of a role may give and take. There is one owner, made at set-up, so nobody gives that role. */
export const rolesInPowerOf: Record<Role, readonly Role[]> = {
  technician: [],
  contributor: [],
  moderator: ['technician', 'contributor'],
  owner: ['technician', 'contributor', 'moderator'],
};
