import type { Platform } from '@/server/context';
import { hashPassword } from '@/server/services/passwords';
import { emailKeyOf } from '@/server/services/sign-up';
import type { Role } from '@/shared/roles';

/** Invented people, one a role but the owner, whom the configuration names. */
const people: readonly { name: string; email: string; role: Exclude<Role, 'owner'> }[] = [
  { name: 'Tova Lindqvarn', email: 'technician@rowcall.example', role: 'technician' },
  { name: 'Ivo Marschak', email: 'contributor@rowcall.example', role: 'contributor' },
  { name: 'Nerys Abbotsleigh', email: 'moderator@rowcall.example', role: 'moderator' },
];

/** Makes the demo accounts that are missing; all have the one password. */
export const seedAccounts = async ({ db, config, now }: Platform, password: string): Promise<void> => {
  for (const person of people) {
    const emailKey = emailKeyOf(person.email);
    if (await db.User.findOne({ where: { emailKey } })) continue;
    const passwordHash = await hashPassword(config, password);
    await db.User.create({ ...person, emailKey, passwordHash, emailConfirmedAt: now() });
  }
};
