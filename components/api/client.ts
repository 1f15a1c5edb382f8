import type { OwnPerson, RefreshAnswer } from '@/shared/api/account';
import type { ProblemDocument } from '@/shared/api/problem';
import { ApiProblem, NetworkFailure } from './problem';

const base = '/api/v1';

type QueryValue = string | number | boolean | undefined;

/** What a request may carry besides its path. */
export type RequestOptions = {
  method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  query?: Record<string, QueryValue>;
  body?: unknown;
  /** Version that is changed, for If-Match. */
  version?: string | number;
  signal?: AbortSignal;
};

/** Codes that mean: the short access token has run out, a new one may be had. */
const renewable = new Set(['sign-in-required', 'token-expired', 'token-invalid']);

/**
 * Asks the server under /api/v1 of the same origin and gives the JSON of its answer, undefined for an empty one.
 * Throws ApiProblem where the server refused, NetworkFailure where it could not be reached; an abort is thrown as it is.
 * A session whose access token has run out is renewed once, unseen.
 */
export async function request<Answer>(path: string, options: RequestOptions = {}): Promise<Answer> {
  try {
    return await send<Answer>(path, options);
  } catch (error) {
    if (!(error instanceof ApiProblem) || !renewable.has(error.code) || path.startsWith('/sessions')) throw error;
    if ((await renewSession()) === null) throw error;
    return send<Answer>(path, options);
  }
}

async function send<Answer>(
  path: string,
  { method = 'GET', query, body, version, signal }: RequestOptions,
): Promise<Answer> {
  const headers: Record<string, string> = { Accept: 'application/json' };
  if (body !== undefined) headers['Content-Type'] = 'application/json';
  if (version !== undefined) headers['If-Match'] = `"${version}"`;
  const response = await reach(address(path, query), {
    method,
    headers,
    body: body === undefined ? undefined : JSON.stringify(body),
    credentials: 'include',
    signal,
  });
  if (response.status === 204) return undefined as Answer;
  const answer = await readJson(response);
  if (response.ok) return answer as Answer;
  throw new ApiProblem(answer as ProblemDocument, secondsToWait(response));
}

async function reach(url: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(url, init);
  } catch (error) {
    if (init.signal?.aborted) throw error;
    throw new NetworkFailure({ cause: error });
  }
}

/** The JSON of an answer. Whatever is not JSON did not come from the server but from something between. */
async function readJson(response: Response): Promise<unknown> {
  if (!/json/.test(response.headers.get('Content-Type') ?? '')) throw new NetworkFailure();
  try {
    return await response.json();
  } catch (error) {
    throw new NetworkFailure({ cause: error });
  }
}

function address(path: string, query: RequestOptions['query']): string {
  const pairs = Object.entries(query ?? {}).flatMap(([name, value]) =>
    value === undefined ? [] : [[name, String(value)]],
  );
  const search = new URLSearchParams(pairs).toString();
  return `${base}${path}${search === '' ? '' : `?${search}`}`;
}

function secondsToWait(response: Response): number | null {
  const seconds = Number(response.headers.get('Retry-After'));
  return Number.isFinite(seconds) && seconds > 0 ? seconds : null;
}

let renewal: Promise<OwnPerson | null> | null = null;

/**
 * Asks for a new access token and gives the person it is for, null where the session has ended.
 * All that ask at the same time share one request, and tabs wait for each other: a refresh token that is used
 * twice ends its session. Throws NetworkFailure where the server cannot be reached.
 */
export function renewSession(): Promise<OwnPerson | null> {
  renewal ??= alone(() => send<RefreshAnswer>('/sessions/refresh', { method: 'POST' }))
    .then(({ person }) => person)
    .catch((error: unknown) => {
      if (error instanceof ApiProblem && error.status === 401) return null;
      throw error;
    })
    .finally(() => {
      renewal = null;
    });
  return renewal;
}

/** Runs work while no other tab of the application does the same. */
async function alone<Result>(work: () => Promise<Result>): Promise<Result> {
  // Browsers have locks on secure origins only.
  if (typeof navigator === 'undefined' || !navigator.locks) return work();
  return navigator.locks.request('rowcall.renew-session', work);
}
