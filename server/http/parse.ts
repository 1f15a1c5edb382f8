import type { Request } from 'express';
import type { z } from 'zod';
import { AppError } from '@/server/errors';
import type { FieldProblem } from '@/shared/api/problem';

/** Most field problems that one answer lists. */
const mostListed = 500;

interface Schemas {
  params?: z.ZodType;
  query?: z.ZodType;
  body?: z.ZodType;
}

/** The parts of a request after its schemas; a part without a schema is undefined. */
export interface Parsed {
  params: unknown;
  query: unknown;
  body: unknown;
}

/** Checks params, query and body against their schemas; throws `invalid-request` with every field problem of all three. */
export const parse = (req: Request, schemas: Schemas): Parsed => {
  const fields: FieldProblem[] = [];
  const read = (part: FieldProblem['in']) => {
    const result = schemas[part]?.safeParse(part === 'body' ? (req.body as unknown) : req[part]);
    if (result && !result.success) fields.push(...result.error.issues.flatMap((issue) => describe(part, issue)));
    return result?.data;
  };
  const parsed = { params: read('params'), query: read('query'), body: read('body') };
  if (fields.length) {
    const message =
      fields.length > mostListed ? `The first ${mostListed} of ${fields.length} problems are listed.` : undefined;
    throw new AppError('invalid-request', { message, fields: fields.slice(0, mostListed) });
  }
  return parsed;
};

const describe = (part: FieldProblem['in'], issue: z.core.$ZodIssue): FieldProblem[] => {
  if (issue.code !== 'unrecognized_keys') {
    return [{ in: part, pointer: pointer(issue.path), code: issue.code, message: issue.message }];
  }
  return issue.keys.map((key) => ({
    in: part,
    pointer: pointer([...issue.path, key]),
    code: issue.code,
    message: 'There is no such field.',
  }));
};

/** JSON pointer (RFC 6901) of a path into a document; "" is the whole. */
export const pointer = (path: readonly PropertyKey[]): string =>
  path.map((step) => `/${String(step).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');
