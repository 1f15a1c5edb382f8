import type { FieldProblem, ProblemDocument } from '@/shared/api/problem';
import type { ErrorCode } from '@/shared/error-codes';
import type { LayoutProblem } from '@/shared/layout/problem';

/** The server answered, and said what is wrong. Decide by `code`, never by the words. */
export class ApiProblem extends Error {
  readonly code: ErrorCode;
  readonly status: number;
  /** Words for the person: what is particular to this case, else the title of the code. */
  override readonly message: string;
  readonly fields: readonly FieldProblem[];
  /** With layout-invalid: everything that is wrong or doubtful in the layout document. */
  readonly layoutProblems: readonly LayoutProblem[];
  readonly requestId: string;
  /** Seconds to wait before the next attempt, where the server said so. */
  readonly retryAfter: number | null;

  constructor(document: ProblemDocument, retryAfter: number | null = null) {
    super();
    this.name = 'ApiProblem';
    this.code = document.code;
    this.status = document.status;
    this.message = document.detail ?? document.title;
    this.fields = document.fields ?? [];
    this.layoutProblems = document.problems ?? [];
    this.requestId = document.requestId;
    this.retryAfter = retryAfter;
  }
}

/** The server could not be reached, or what answered was not the server. */
export class NetworkFailure extends Error {
  constructor(options?: ErrorOptions) {
    super('The server cannot be reached. Check the connection and try again.', options);
    this.name = 'NetworkFailure';
  }
}

/** Words for a person about any error that a request can end in. */
export function problemWords(error: unknown): string {
  if (error instanceof ApiProblem || error instanceof NetworkFailure) return error.message;
  return 'Something went wrong here. Try again.';
}
