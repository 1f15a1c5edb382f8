import { z } from 'zod';
import { errorCodes, type ErrorCode } from '@/shared/error-codes';
import { layoutProblem } from '@/shared/layout/problem';

/** One field of a request that cannot be used. */
export const fieldProblem = z.strictObject({
  in: z.enum(['params', 'query', 'body']),
  pointer: z.string().describe('JSON pointer (RFC 6901) to the field; "" is the whole.'),
  code: z.string().describe('Kind of problem, such as too_small or invalid_type.'),
  message: z.string().describe('Words for the person who filled the field in.'),
});

export type FieldProblem = z.output<typeof fieldProblem>;

/** Body of every error: application/problem+json (RFC 9457), with the request id and all field problems at once. */
export const problemDocument = z.object({
  type: z.string().describe('Address of the meaning of the code.'),
  title: z.string(),
  status: z.number().int(),
  code: z.enum(Object.keys(errorCodes) as [ErrorCode, ...ErrorCode[]]),
  detail: z.string().optional().describe('What is particular to this occurrence.'),
  requestId: z.string().describe('Name this when asking for help.'),
  fields: z.array(fieldProblem).optional(),
  problems: z
    .array(layoutProblem)
    .optional()
    .describe('With layout-invalid: everything that is wrong or doubtful in the layout document.'),
});

export type ProblemDocument = z.output<typeof problemDocument>;
