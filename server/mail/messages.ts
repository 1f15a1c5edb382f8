import type { Config } from '@/server/config';
import type { Mail } from '@/server/services/outbox';

export interface Recipient {
  readonly name: string;
  readonly email: string;
}

/** A mail of paragraphs with a greeting and our name. */
export const letter = (to: Recipient, subject: string, lines: readonly string[]): Mail => ({
  recipient: to.email,
  subject,
  body: [`Hello ${to.name},`, ...lines, 'Rowcall'].join('\n\n') + '\n',
});

const link = (config: Config, path: string, token: string): string => `${config.publicUrl}${path}?token=${token}`;

/** Asks to confirm the address that an account was made with. */
export const confirmationMail = (config: Config, to: Recipient, token: string): Mail =>
  letter(to, 'Confirm your e-mail address', [
    'somebody, probably you, made an account at Rowcall with this address. Confirm it with this link:',
    link(config, '/confirm', token),
    'The link is good for 48 hours and once. If it was not you, do nothing: the account cannot be used without it.',
  ]);

/** Tells the owner of an account that somebody tried to make another one with its address. */
export const alreadyKnownMail = (config: Config, to: Recipient): Mail =>
  letter(to, 'You have an account already', [
    'somebody, probably you, tried to make an account at Rowcall with this address. You have one already:',
    `${config.publicUrl}/sign-in`,
    `If you have forgotten the password, choose another one at ${config.publicUrl}/reset`,
    'If it was not you, do nothing: nothing was changed.',
  ]);

/** Leads to the page where a new password is chosen. */
export const resetMail = (config: Config, to: Recipient, token: string): Mail =>
  letter(to, 'Choose a new password', [
    'choose a new password for your account at Rowcall with this link:',
    link(config, '/reset', token),
    'The link is good for one hour and once. If you did not ask for it, do nothing: the old password still holds.',
  ]);

/** Tells that the password was changed, in case it was somebody else. */
export const passwordChangedMail = (config: Config, to: Recipient): Mail =>
  letter(to, 'Your password was changed', [
    'the password of your account at Rowcall was changed just now, and all other devices were signed out.',
    `If it was not you, choose another one at once: ${config.publicUrl}/reset`,
  ]);

/** Tells the answer to a request for the role of contributor. */
export const roleDecisionMail = (config: Config, to: Recipient, { granted }: { granted: boolean }): Mail =>
  letter(to, granted ? 'You are a contributor now' : 'Your request to contribute', [
    granted
      ? `you can now document boards for others: ${config.publicUrl}/contribute`
      : 'a moderator has declined your request to become a contributor for now. You can ask again later.',
  ]);
