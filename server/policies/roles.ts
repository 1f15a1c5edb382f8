import { AppError } from '@/server/errors';
import type { Role } from '@/shared/roles';

interface RoleChange {
  readonly by: { readonly id: string; readonly role: Role };
  readonly of: { readonly id: string; readonly role: Role };
  readonly to: Role;
}

/** Roles that somebody of a role may give and take. There is one owner, made at set-up, so nobody gives that role. */
const within: Record<Role, readonly Role[]> = {
  technician: [],
  contributor: [],
  moderator: ['technician', 'contributor'],
  owner: ['technician', 'contributor', 'moderator'],
};

/** Throws `role-required` unless the change is in the power of who makes it; nobody changes his own role. */
export const mayChangeRole = ({ by, of, to }: RoleChange): void => {
  if (by.id === of.id) throw new AppError('role-required', { message: 'Nobody changes his own role.' });
  const power = within[by.role];
  if (!power.includes(of.role) || !power.includes(to)) {
    throw new AppError('role-required', {
      message: `A change from ${of.role} to ${to} is not in the power of a ${by.role}.`,
    });
  }
};
