import type { FieldProblem } from '@/shared/api/problem';
import { errorCodes, type ErrorCode } from '@/shared/error-codes';
import type { LayoutProblem } from '@/shared/layout/problem';

interface Particulars {
  /** Words about this occurrence; safe to show to whoever asked. */
  message?: string;
  fields?: readonly FieldProblem[];
  /** What is wrong in a layout document that was sent. */
  problems?: readonly LayoutProblem[];
  headers?: Readonly<Record<string, string>>;
}

/** The one error class that services and middleware throw; the error handler turns it into a problem document. */
export class AppError extends Error {
  readonly status: number;
  readonly fields: readonly FieldProblem[];
  readonly problems: readonly LayoutProblem[];
  readonly headers: Readonly<Record<string, string>>;

  constructor(
    readonly code: ErrorCode,
    { message, fields = [], problems = [], headers = {} }: Particulars = {},
  ) {
    super(message ?? errorCodes[code].title);
    this.name = 'AppError';
    this.status = errorCodes[code].status;
    this.fields = fields;
    this.problems = problems;
    this.headers = headers;
  }
}
