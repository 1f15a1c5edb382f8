import type { Request } from 'express';
import type { z } from 'zod';
import { AppError } from '@/server/errors';
import type { FieldProblem } from '@/shared/api/problem';
import { flattenIssues, pointerOf, type SchemaIssue } from '@/shared/schema-issues';

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
    if (result && !result.success)
      fields.push(...flattenIssues(result.error.issues).map((issue) => describe(part, issue)));
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

const describe = (part: FieldProblem['in'], { path, code, message }: SchemaIssue): FieldProblem => ({
  in: part,
  pointer: pointerOf(path),
  code,
  message,
});
