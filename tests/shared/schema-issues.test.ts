import { z } from 'zod';
import { flattenIssues, pointerOf } from '@/shared/schema-issues';

const issuesOf = (schema: z.ZodType, value: unknown) =>
  flattenIssues(schema.safeParse(value).error?.issues ?? []).map(({ path, message }) => [pointerOf(path), message]);

describe('what a schema finds wrong', () => {
  it('is told at each field that is too many', () => {
    expect(issuesOf(z.strictObject({ a: z.number() }), { a: 1, b: 2, 'c/d': 3 })).toEqual([
      ['/b', 'There is no such field.'],
      ['/c~1d', 'There is no such field.'],
    ]);
  });

  it('is told for the way of writing that was meant', () => {
    const amount = z.union([z.number(), z.string().regex(/^0x/, 'Begin with 0x.')]);
    expect(issuesOf(z.strictObject({ amount }), { amount: '16K' })).toEqual([['/amount', 'Begin with 0x.']]);
  });

  it('names every kind that fits where none was meant', () => {
    const first = z.union([z.literal(0), z.literal(1), z.string()]);
    expect(issuesOf(first, true)).toEqual([['', 'Expected 0 or 1 or string.']]);
  });

  it('is told inside the part of a union that comes nearest', () => {
    const part = z.union([
      z.strictObject({ text: z.string() }),
      z.strictObject({ field: z.string(), first: z.number() }),
    ]);
    expect(issuesOf(z.array(part), [{ field: 'bit', first: 'one' }])).toEqual([
      ['/0/first', expect.stringContaining('expected number')],
    ]);
  });
});
