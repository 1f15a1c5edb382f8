import { accepted, noContent, route, type Route } from '@/server/http/route';
import { completeReset, requestReset } from '@/server/services/password-reset';
import { confirmAddress, resendConfirmation, signUp } from '@/server/services/sign-up';
import { addressRequest, confirmRequest, mailSent, resetRequest, signUpRequest } from '@/shared/api/account';

const tag = 'accounts';
const sent = { status: 202, schema: mailSent, words: 'The same for every address, known or not.' };

export const accountRoutes: readonly Route[] = [
  route({
    method: 'post',
    path: '/accounts',
    may: 'guest',
    tag,
    summary: 'Sign up. A mail asks to confirm the address.',
    body: signUpRequest,
    answer: sent,
    problems: ['too-many-attempts'],
    handler: async ({ context, body }) => {
      await signUp(context, body);
      return accepted({ status: 'mail-sent' });
    },
  }),
  route({
    method: 'post',
    path: '/accounts/confirm',
    may: 'guest',
    tag,
    summary: 'Confirm the e-mail address with the token of the link in the mail.',
    body: confirmRequest,
    answer: { status: 204, words: 'The address is confirmed; sign in now.' },
    problems: ['link-invalid'],
    handler: async ({ context, body }) => {
      await confirmAddress(context, body);
      return noContent();
    },
  }),
  route({
    method: 'post',
    path: '/accounts/resend-confirmation',
    may: 'guest',
    tag,
    summary: 'Send the confirmation again.',
    body: addressRequest,
    answer: sent,
    problems: ['too-many-attempts'],
    handler: async ({ context, body }) => {
      await resendConfirmation(context, body);
      return accepted({ status: 'mail-sent' });
    },
  }),
  route({
    method: 'post',
    path: '/password-resets',
    may: 'guest',
    tag,
    summary: 'Forgotten password: send a link to a new one.',
    body: addressRequest,
    answer: sent,
    problems: ['too-many-attempts'],
    handler: async ({ context, body }) => {
      await requestReset(context, body);
      return accepted({ status: 'mail-sent' });
    },
  }),
  route({
    method: 'post',
    path: '/password-resets/complete',
    may: 'guest',
    tag,
    summary: 'Choose the new password with the token of the link in the mail. Ends every session.',
    body: resetRequest,
    answer: { status: 204, words: 'The new password holds; sign in now.' },
    problems: ['link-invalid'],
    handler: async ({ context, body }) => {
      await completeReset(context, body);
      return noContent();
    },
  }),
];
