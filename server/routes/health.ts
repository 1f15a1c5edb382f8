import { z } from 'zod';
import { ok, route, type Route } from '@/server/http/route';
import { checkReady } from '@/server/services/health';

export const healthRoutes: readonly Route[] = [
  route({
    method: 'get',
    path: '/health',
    may: 'guest',
    tag: 'server',
    summary: 'Whether the server and its database answer.',
    answer: { status: 200, schema: z.strictObject({ status: z.literal('ready') }), words: 'It is ready.' },
    problems: ['not-ready'],
    handler: async ({ context }) => {
      await checkReady(context);
      return ok({ status: 'ready' });
    },
  }),
];
