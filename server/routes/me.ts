import { noContent, ok, route, type Route } from '@/server/http/route';
import { presentOwnPerson } from '@/server/presenters/person';
import { changePassword } from '@/server/services/password-reset';
import { loadPerson } from '@/server/services/sessions';
import { meAnswer, passwordChange } from '@/shared/api/account';

const tag = 'accounts';

export const meRoutes: readonly Route[] = [
  route({
    method: 'get',
    path: '/me',
    may: 'guest',
    tag,
    summary: 'Who is signed in; null for a guest.',
    answer: { status: 200, schema: meAnswer, words: 'The person, or null.' },
    handler: async ({ context }) => {
      const user = context.who.standing === 'guest' ? undefined : await loadPerson(context, context.who);
      return ok({ person: user ? presentOwnPerson(user) : null }, { 'Cache-Control': 'no-store' });
    },
  }),
  route({
    method: 'put',
    path: '/me/password',
    may: 'technician',
    tag,
    summary: 'Change the password. Ends every other session.',
    body: passwordChange,
    answer: { status: 204, words: 'The new password holds.' },
    problems: ['password-wrong', 'too-many-attempts'],
    handler: async ({ context, body }) => {
      await changePassword(context, body);
      return noContent();
    },
  }),
];
