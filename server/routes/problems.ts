import { z } from 'zod';
import { ok, route, type Route } from '@/server/http/route';
import { errorCodes, type ErrorCode } from '@/shared/error-codes';

const codes = Object.keys(errorCodes) as [ErrorCode, ...ErrorCode[]];

const meaning = z.strictObject({ code: z.enum(codes), status: z.number().int(), title: z.string() });

const present = (code: ErrorCode) => ({ code, ...errorCodes[code] });

export const problemRoutes: readonly Route[] = [
  route({
    method: 'get',
    path: '/problems',
    may: 'guest',
    tag: 'server',
    summary: 'Every error code with its status and its meaning.',
    answer: { status: 200, schema: z.strictObject({ items: z.array(meaning) }), words: 'All codes.' },
    handler: () => ok({ items: codes.map(present) }),
  }),
  route({
    method: 'get',
    path: '/problems/:code',
    may: 'guest',
    tag: 'server',
    summary: 'The meaning of one error code.',
    params: z.strictObject({ code: z.enum(codes) }),
    answer: { status: 200, schema: meaning, words: 'The code.' },
    handler: ({ params }) => ok(present(params.code)),
  }),
];
