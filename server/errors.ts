import type { FieldProblem } from '@/shared/api/problem';
import { errorCodes, type ErrorCode } from '@/shared/error-codes';

interface Particulars {
  /** Words about this occurrence; safe to show to whoever asked. */
  message?: string;
  fields?: readonly FieldProblem[];
  headers?: Readonly<Record<string, string>>;
}

/** The one error class that services and middleware throw; the error handler turns it into a problem document. */
export class AppError extends Error {
  readonly status: number;
  readonly fields: readonly FieldProblem[];
  readonly headers: Readonly<Record<string, string>>;

  constructor(
    readonly code: ErrorCode,
    { message, fields = [], headers = {} }: Particulars = {},
  ) {
    super(message ?? errorCodes[code].title);
    this.name = 'AppError';
    this.status = errorCodes[code].status;
    this.fields = fields;
    this.headers = headers;
  }
}
