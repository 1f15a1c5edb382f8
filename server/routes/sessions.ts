import type { Request } from 'express';
import { clearSessionCookies, refreshCookie, setSessionCookies } from '@/server/http/cookies';
import { noContent, ok, route, type Route } from '@/server/http/route';
import { AppError } from '@/server/errors';
import { presentSession } from '@/server/presenters/session';
import { refreshSession, signIn, signOut } from '@/server/services/sessions';
import { refreshAnswer, sessionAnswer, signInRequest } from '@/shared/api/account';

const tag = 'sessions';

const refreshTokenOf = (request: Request): string | undefined => {
  const value = (request.cookies as Record<string, unknown>)[refreshCookie];
  return typeof value === 'string' ? value : undefined;
};

export const sessionRoutes: readonly Route[] = [
  route({
    method: 'post',
    path: '/sessions',
    may: 'guest',
    tag,
    summary: 'Sign in: cookies for a browser, or a bearer token for a script.',
    example: { body: { email: 'contributor@rowcall.example', password: 'a password of yours', bearer: true } },
    body: signInRequest,
    answer: { status: 201, schema: sessionAnswer, words: 'Signed in.' },
    problems: ['sign-in-failed', 'email-not-confirmed', 'too-many-attempts'],
    handler: async ({ context, body, response }) => {
      const session = await signIn(context, body);
      if (!body.bearer) {
        setSessionCookies(response, context.config, { access: session.access.token, refresh: session.refresh });
      }
      const answer = presentSession(session, { bearer: body.bearer });
      return { status: 201, body: answer, headers: { Location: '/api/v1/me' } };
    },
  }),
  route({
    method: 'post',
    path: '/sessions/refresh',
    may: 'guest',
    tag,
    summary: 'Change the refresh cookie for new cookies. Without one the answer is a guest.',
    answer: { status: 200, schema: refreshAnswer, words: 'Who is signed in, and until when.' },
    problems: ['session-ended'],
    handler: async ({ context, request, response }) => {
      const token = refreshTokenOf(request);
      if (token === undefined) return ok({ person: null, accessExpiresAt: null });
      try {
        const session = await refreshSession(context, token);
        setSessionCookies(response, context.config, { access: session.access.token, refresh: session.refresh });
        return ok(presentSession(session, { bearer: false }));
      } catch (error) {
        if (error instanceof AppError && error.code === 'session-ended') clearSessionCookies(response, context.config);
        throw error;
      }
    },
  }),
  route({
    method: 'delete',
    path: '/sessions/current',
    may: 'guest',
    tag,
    summary: 'Sign out: ends the session and takes the cookies away.',
    answer: { status: 204, words: 'Signed out, or was not signed in.' },
    handler: async ({ context, request, response }) => {
      await signOut(context, refreshTokenOf(request));
      clearSessionCookies(response, context.config);
      return noContent();
    },
  }),
];
