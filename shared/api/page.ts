import { z } from 'zod';
import { limits } from '@/shared/limits';

/** Query of a list: how many rows at most, and where the page before it ended. */
export const pageQuery = z.strictObject({
  limit: z.coerce.number().int().min(1).max(limits.pageSize).default(25),
  cursor: z.string().max(512).optional(),
});

export type PageQuery = z.output<typeof pageQuery>;

/** One page of a list; `nextCursor` is null on the last one. */
export const page = <Item extends z.ZodType>(item: Item) =>
  z.strictObject({ items: z.array(item), nextCursor: z.string().nullable() });
