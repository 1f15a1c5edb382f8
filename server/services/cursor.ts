import type { z } from 'zod';
import { AppError } from '@/server/errors';

/** Where a page of a list ended: the values that the list is sorted by, in a text that only we read. */
export const writeCursor = (values: readonly (string | number)[]): string =>
  Buffer.from(JSON.stringify(values)).toString('base64url');

/** Reads a cursor that writeCursor made; throws `invalid-request` for anything else. */
export const readCursor = <Values extends z.ZodType>(cursor: string, values: Values): z.output<Values> => {
  try {
    return values.parse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')));
  } catch {
    throw new AppError('invalid-request', {
      fields: [{ in: 'query', pointer: '/cursor', code: 'custom', message: 'This is not the end of a page.' }],
    });
  }
};

/** Splits the rows of a query for one more than `limit` into a page and the cursor of the next, null on the last. */
export const toPage = <Row>(
  rows: readonly Row[],
  limit: number,
  endOf: (row: Row) => readonly (string | number)[],
): { rows: readonly Row[]; nextCursor: string | null } => {
  const kept = rows.slice(0, limit);
  const last = kept.at(-1);
  return { rows: kept, nextCursor: rows.length > limit && last !== undefined ? writeCursor(endOf(last)) : null };
};
