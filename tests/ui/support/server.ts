import { errorCodes, type ErrorCode } from '@/shared/error-codes';

type Answer = { status: number; body?: unknown; headers?: Record<string, string> };
type Call = { method: string; path: string; body: unknown; headers: Record<string, string> };
type Handler = Answer | ((call: Call) => Answer | Promise<Answer>);

/** A problem document as the server writes it. */
export function problem(code: ErrorCode, more: object = {}): Answer {
  const { status, title } = errorCodes[code];
  return { status, body: { type: `/problems/${code}`, title, status, code, requestId: 'test', ...more } };
}

/**
 * Stands in for the server: answers by "METHOD /path", 404 for anything else, and keeps every call.
 * `null` for a handler: no network.
 */
export function fakeServer(handlers: Record<string, Handler | null>) {
  const calls: Call[] = [];
  globalThis.fetch = jest.fn(async (input: RequestInfo | URL, init: RequestInit = {}) => {
    const url = new URL(String(input), 'http://localhost');
    const call: Call = {
      method: init.method ?? 'GET',
      path: url.pathname.replace('/api/v1', '') + url.search,
      body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined,
      headers: (init.headers ?? {}) as Record<string, string>,
    };
    calls.push(call);
    const handler = handlers[`${call.method} ${url.pathname.replace('/api/v1', '')}`];
    if (handler === null) throw new TypeError('Failed to fetch');
    const answer =
      handler === undefined ? problem('not-found') : typeof handler === 'function' ? await handler(call) : handler;
    return respond(answer);
  }) as typeof fetch;
  return { calls };
}

function respond({ status, body, headers = {} }: Answer): Response {
  const kind = status >= 400 ? 'application/problem+json' : 'application/json';
  const all = new Map(Object.entries({ ...(body === undefined ? {} : { 'Content-Type': kind }), ...headers }));
  return {
    ok: status < 400,
    status,
    headers: { get: (name: string) => all.get(name) ?? null },
    json: async () => JSON.parse(JSON.stringify(body)),
  } as unknown as Response;
}
