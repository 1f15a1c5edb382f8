import type { z } from 'zod';
import { collectSchemas, type JsonSchema, type SchemaCollector } from './openapi-schemas';
import type { Route } from './route';
import { problemDocument } from '@/shared/api/problem';
import { errorCodes, type ErrorCode } from '@/shared/error-codes';

const about = `
Everything that the screens of Rowcall do goes through this API, and a script may do it too.

**Start here.** \`GET /layouts?q=\` finds a board; \`POST /diagnoses\` takes its address and what its self-test
reported, and answers which socket to pull, how sure that is and why. Neither needs an account.

**Errors** are problem documents (RFC 9457, \`application/problem+json\`). Decide by \`code\`; \`GET /problems\`
lists every code. \`fields\` names each part of the request that cannot be used, \`problems\` each fault of a layout
document.

**Signing in.** \`POST /sessions\` with \`"bearer": true\` answers an access token for \`Authorization: Bearer\`.

**Lists** answer \`items\` and \`nextCursor\`; send \`nextCursor\` as \`cursor\` to get the next page, until it is null.

**Changes** of something that others may change too need \`If-Match\` with the version that you have seen, in quotes:
\`If-Match: "3"\`.
`;

/** The OpenAPI 3.1 document of the declared routes. */
export const describeApi = (routes: readonly Route[], { version }: { version: string }): JsonSchema => {
  const schemas = collectSchemas();
  const paths: Record<string, Record<string, JsonSchema>> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    (paths[path] ??= {})[route.method] = describeRoute(route, schemas);
  }
  schemas.write(problemDocument, 'output');
  return {
    openapi: '3.1.0',
    info: { title: 'Rowcall', version, description: about.trim(), license: { name: 'MIT', identifier: 'MIT' } },
    servers: [{ url: '/api/v1' }],
    tags: [...new Set(routes.map(({ tag }) => tag))].map((name) => ({ name })),
    paths,
    components: {
      schemas: schemas.components(),
      securitySchemes: {
        bearer: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' },
        cookie: { type: 'apiKey', in: 'cookie', name: 'rowcall_access' },
      },
    },
  };
};

const describeRoute = (route: Route, schemas: SchemaCollector): JsonSchema => {
  const { method, path, summary, details, tag, may, body, answer, example } = route;
  const needs = may === 'guest' ? '' : `Needs the role **${may}**.`;
  const description = [details?.trim(), needs].filter(Boolean).join('\n\n');
  return {
    operationId: operationId(method, path),
    tags: [tag],
    summary,
    ...(description ? { description } : {}),
    ...(may === 'guest' ? {} : { security: [{ bearer: [] }, { cookie: [] }] }),
    parameters: parametersOf(route, schemas),
    ...(body ? { requestBody: { required: true, content: json(schemas.write(body, 'input'), example?.body) } } : {}),
    responses: {
      [answer.status]: {
        description: answer.words,
        ...(answer.schema ? { content: json(schemas.write(answer.schema, 'output'), example?.answer?.()) } : {}),
      },
      ...problemsOf(route),
    },
  };
};

const json = (schema: JsonSchema, example: unknown) => ({
  'application/json': { schema, ...(example === undefined ? {} : { example }) },
});

/** Such as getLayoutsSlugVersions. */
const operationId = (method: string, path: string): string =>
  method + path.replace(/\W+(\w)/g, (_, letter: string) => letter.toUpperCase()).replace(/\W/g, '');

const parametersOf = (route: Route, schemas: SchemaCollector): JsonSchema[] => {
  const { params, query, example, problems } = route;
  const list = (schema: z.ZodType | undefined, place: 'path' | 'query', given: unknown) => {
    if (!schema) return [];
    const { properties = {}, required = [] } = schemas.write(schema, 'input') as {
      properties?: Record<string, JsonSchema>;
      required?: string[];
    };
    const examples = (given ?? {}) as Record<string, unknown>;
    return Object.entries(properties).map(([name, { description, ...rest }]) => ({
      name,
      in: place,
      required: place === 'path' || required.includes(name),
      ...(description ? { description } : {}),
      schema: rest,
      ...(name in examples ? { example: examples[name] } : {}),
    }));
  };
  const ifMatch = {
    name: 'If-Match',
    in: 'header',
    required: true,
    description: 'The version (or change) that you have seen, in quotes.',
    schema: { type: 'string', pattern: '^"[0-9]+"$' },
    example: '"1"',
  };
  return [
    ...list(params, 'path', example?.params),
    ...list(query, 'query', example?.query),
    ...(problems?.includes('version-required') ? [ifMatch] : []),
  ];
};

/** Problems that any route with such a declaration may answer, beside its own. */
const usualProblems = ({ may, params, query, body }: Route): ErrorCode[] => [
  ...((params ?? query ?? body) ? (['invalid-request'] as const) : []),
  ...(body
    ? (['malformed-json', 'body-too-deep', 'body-too-large', 'unsupported-media-type', 'foreign-origin'] as const)
    : []),
  ...(may === 'guest' ? [] : (['sign-in-required', 'session-ended', 'role-required'] as const)),
  'token-invalid',
  'token-expired',
  'too-many-requests',
  'internal',
];

const problemsOf = (route: Route): Record<string, JsonSchema> => {
  const byStatus = new Map<number, Set<ErrorCode>>();
  for (const code of [...(route.problems ?? []), ...usualProblems(route)]) {
    const { status } = errorCodes[code];
    byStatus.set(status, (byStatus.get(status) ?? new Set()).add(code));
  }
  const content = { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } };
  return Object.fromEntries(
    [...byStatus]
      .sort(([a], [b]) => a - b)
      .map(([status, codes]) => [status, { description: wordsOf(codes), content }]),
  );
};

const wordsOf = (codes: ReadonlySet<ErrorCode>): string =>
  [...codes].map((code) => `\`${code}\`: ${errorCodes[code].title}`).join('\n\n');
