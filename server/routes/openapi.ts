import { z } from 'zod';
import { version } from '../../package.json';
import { describeApi } from '@/server/http/openapi';
import { handled, route, type Route } from '@/server/http/route';

/** The route that describes the others; `all` is asked for when the description is made, once. */
export const openapiRoutes = (all: () => readonly Route[]): readonly Route[] => {
  let text: string | undefined;
  return [
    route({
      method: 'get',
      path: '/openapi.json',
      may: 'guest',
      tag: 'server',
      summary: 'This description, for tools (OpenAPI 3.1).',
      answer: { status: 200, schema: z.record(z.string(), z.unknown()), words: 'The document.' },
      handler: ({ response }) => {
        text ??= JSON.stringify(describeApi(all(), { version }));
        response.type('application/json').set('Cache-Control', 'no-cache').send(text);
        return handled;
      },
    }),
  ];
};
