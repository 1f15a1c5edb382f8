import type { Request, Response } from 'express';
import type { z } from 'zod';
import type { Context } from '@/server/context';
import type { ErrorCode } from '@/shared/error-codes';
import type { Standing } from '@/shared/roles';

/** What a handler returns; `handled` says that it has written the answer itself. */
export type Reply =
  | { readonly status: number; readonly body?: unknown; readonly headers?: Readonly<Record<string, string>> }
  | typeof handled;

/** For a handler that wrote to `response` itself. */
export const handled = Symbol('handled');

/** What a handler is given: who asks, and the parsed parts of the request. */
interface Call<Params, Query, Body> {
  readonly context: Context;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly request: Request;
  readonly response: Response;
}

interface RouteExample<Params, Query, Body> {
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  readonly answer?: () => unknown;
}

/**
 * One route of the API, under /api/v1. Express, the table test of roles and the OpenAPI document all read
 * this declaration, so it is the only place where a route is described.
 */
export interface RouteSpec<Params extends z.ZodType, Query extends z.ZodType, Body extends z.ZodType> {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Path in Express's notation, such as /layouts/:slug. */
  readonly path: string;
  /** Weakest standing that may call it. There is no default: a route without it does not compile. */
  readonly may: Standing;
  /** One line for the API's documentation. */
  readonly summary: string;
  readonly tag: string;
  /** More for the API's documentation, in Markdown. */
  readonly details?: string;
  /** A worked example for the API's documentation; `answer` is asked for when the documentation is made. */
  readonly example?: RouteExample<z.input<Params>, z.input<Query>, z.input<Body>>;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  /** Bytes of the largest body; limits.bodyBytes when left out. */
  readonly bodyBytes?: number;
  /** The answer when all is well; `schema` is left out for an answer without a body. */
  readonly answer: { readonly status: number; readonly schema?: z.ZodType; readonly words: string };
  /** Codes of problems that this route answers beyond those that any route may. */
  readonly problems?: readonly ErrorCode[];
  handler(call: Call<z.output<Params>, z.output<Query>, z.output<Body>>): Promise<Reply> | Reply;
}

/** A route whose schemas are forgotten: what lists of routes hold. */
export type Route = RouteSpec<z.ZodType, z.ZodType, z.ZodType>;

/** Declares a route; the handler's input has the types of the schemas. */
export const route = <
  Params extends z.ZodType = z.ZodUndefined,
  Query extends z.ZodType = z.ZodUndefined,
  Body extends z.ZodType = z.ZodUndefined,
>(
  spec: RouteSpec<Params, Query, Body>,
): Route => spec as unknown as Route;

/** 200 with a body. */
export const ok = (body: unknown, headers?: Readonly<Record<string, string>>): Reply => ({
  status: 200,
  body,
  headers,
});

/** 201 with a body and the address of what was made. */
export const created = (location: string, body: unknown, headers?: Readonly<Record<string, string>>): Reply => ({
  status: 201,
  body,
  headers: { Location: location, ...headers },
});

/** 202: taken, the rest happens later (by mail). */
export const accepted = (body: unknown): Reply => ({ status: 202, body });

/** 204. */
export const noContent = (): Reply => ({ status: 204 });
