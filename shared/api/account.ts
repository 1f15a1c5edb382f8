import { z } from 'zod';
import { words } from '@/shared/layout/primitives';
import { roleSchema } from '@/shared/roles';

/** An e-mail address, without spaces around it. */
export const emailAddress = z
  .string()
  .trim()
  .min(1, 'Write your e-mail address.')
  .max(254, 'At most 254 characters.')
  .pipe(z.email('This does not look like an e-mail address.'));

/** bcrypt reads 72 bytes; what lies beyond would not count. */
const passwordBytes = 72;

/** A password as it is chosen: at least 10 characters, at most 72 bytes. Any characters but control ones. */
export const newPassword = z
  .string()
  .normalize('NFKC')
  .min(10, 'At least 10 characters.')
  .refine((text) => new TextEncoder().encode(text).length <= passwordBytes, 'At most 72 bytes.')
  .regex(/^[^\u0000-\u001f\u007f]*$/, 'Control characters are not allowed.');

/** A password as it is given to be checked: nothing is said about its form. */
const givenPassword = z.string().normalize('NFKC').min(1, 'Write your password.').max(1024, 'This is too long.');

/** Token of a link in a mail. */
const linkToken = z.string().min(20, 'The link is not complete.').max(200, 'The link is not complete.');

/** Name that others see. */
const personName = words(80);

/** POST /accounts */
export const signUpRequest = z.strictObject({ name: personName, email: emailAddress, password: newPassword });
export type SignUpRequest = z.output<typeof signUpRequest>;

/** POST /accounts/confirm */
export const confirmRequest = z.strictObject({ token: linkToken });
export type ConfirmRequest = z.output<typeof confirmRequest>;

/** POST /accounts/resend-confirmation and POST /password-resets */
export const addressRequest = z.strictObject({ email: emailAddress });
export type AddressRequest = z.output<typeof addressRequest>;

/** The same for every address, known or not. */
export const mailSent = z.strictObject({
  status: z.literal('mail-sent').describe('If the address can be used, a mail is on its way to it.'),
});

/** POST /password-resets/complete */
export const resetRequest = z.strictObject({ token: linkToken, password: newPassword });
export type ResetRequest = z.output<typeof resetRequest>;

/** PUT /me/password */
export const passwordChange = z.strictObject({ currentPassword: givenPassword, newPassword });
export type PasswordChange = z.output<typeof passwordChange>;

/** POST /sessions */
export const signInRequest = z.strictObject({
  email: emailAddress,
  password: givenPassword,
  bearer: z
    .boolean()
    .default(false)
    .describe('True for a script: the access token comes in the answer, and no cookie is set.'),
});
export type SignInRequest = z.input<typeof signInRequest>;

/** A person as he sees himself. */
export const ownPerson = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  createdAt: z.iso.datetime(),
});
export type OwnPerson = z.output<typeof ownPerson>;

/** Answer of POST /sessions. */
export const sessionAnswer = z.strictObject({
  person: ownPerson,
  accessExpiresAt: z.iso.datetime().describe('When the access token must be refreshed, UTC.'),
  accessToken: z.string().optional().describe('For `Authorization: Bearer`; only when asked for.'),
});
export type SessionAnswer = z.output<typeof sessionAnswer>;

/** Answer of POST /sessions/refresh; person is null for somebody who is not signed in. */
export const refreshAnswer = z.strictObject({
  person: ownPerson.nullable(),
  accessExpiresAt: z.iso.datetime().nullable(),
});
export type RefreshAnswer = z.output<typeof refreshAnswer>;

/** Answer of GET /me; person is null for a guest. */
export const meAnswer = z.strictObject({ person: ownPerson.nullable() });
export type MeAnswer = z.output<typeof meAnswer>;
