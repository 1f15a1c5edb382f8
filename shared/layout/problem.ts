import { z } from 'zod';

/** One thing that is wrong or doubtful in a layout document, in words that its contributor understands. */
export const layoutProblem = z.strictObject({
  pointer: z.string().describe('JSON pointer (RFC 6901) to the place in the document.'),
  severity: z
    .enum(['error', 'warning'])
    .describe('error: the layout would mislead and cannot be published. warning: look again.'),
  code: z.string().describe('A stable name of the kind of problem.'),
  message: z.string(),
});

export type LayoutProblem = z.output<typeof layoutProblem>;
