import type { User } from '@/server/models/user';
import type { OwnPerson } from '@/shared/api/account';
import type { PersonRow } from '@/shared/api/people';

/** A person as he sees himself. */
export const presentOwnPerson = (user: User): OwnPerson => ({
  id: user.id,
  name: user.name,
  email: user.email,
  role: user.role,
  createdAt: user.createdAt.toISOString(),
});

/** A person as moderators see him. */
export const presentPersonRow = (user: User): PersonRow => ({
  ...presentOwnPerson(user),
  confirmed: user.emailConfirmedAt !== null,
  version: user.version,
});
