import { randomUUID } from 'node:crypto';
import bcrypt from 'bcryptjs';
import type { Database } from '@/server/models';
import type { User } from '@/server/models/user';
import type { Role } from '@/shared/roles';

/** The password of every person that buildUser makes. */
export const builtPassword = 'a bench lamp and a meter';

interface Wish {
  role?: Role;
  email?: string;
  name?: string;
  confirmed?: boolean;
}

/** Puts a person into the database, with a confirmed address unless told otherwise. */
export const buildUser = async (db: Database, wish: Wish = {}): Promise<User> => {
  const email = wish.email ?? `${randomUUID()}@rowcall.test`;
  return db.User.create({
    email,
    emailKey: email.toLowerCase(),
    name: wish.name ?? 'Person of a test',
    passwordHash: await bcrypt.hash(builtPassword, 4),
    role: wish.role ?? 'technician',
    emailConfirmedAt: wish.confirmed === false ? null : new Date(),
  });
};
