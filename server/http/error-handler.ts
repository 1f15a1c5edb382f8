import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { Logger } from 'pino';
import { tooLarge } from './body';
import { AppError } from '@/server/errors';
import type { ProblemDocument } from '@/shared/api/problem';
import { errorCodes } from '@/shared/error-codes';

/** Any path that no route takes. */
export const notFound: RequestHandler = () => {
  throw new AppError('not-found');
};

/**
 * The one error handler: answers application/problem+json (RFC 9457) with the request id.
 * What is not an AppError is logged whole and answered as `internal`, without its words.
 */
export const errorHandler =
  (logger: Logger): ErrorRequestHandler =>
  // eslint-disable-next-line max-params -- Express knows an error handler by its four parameters.
  (cause: unknown, req, res, next) => {
    const error = asAppError(cause);
    if (error.status >= 500) logger.error({ err: cause, requestId: req.id }, 'request failed');
    if (res.headersSent) return next(cause);
    res
      .status(error.status)
      .set(error.headers)
      .set('Cache-Control', 'no-store')
      .type('application/problem+json')
      .send(JSON.stringify(presentProblem(error, req.id)));
  };

const presentProblem = (error: AppError, requestId: string): ProblemDocument => {
  const { title } = errorCodes[error.code];
  return {
    type: `/api/v1/problems/${error.code}`,
    title,
    status: error.status,
    code: error.code,
    ...(error.message === title ? {} : { detail: error.message }),
    requestId,
    ...(error.fields.length ? { fields: [...error.fields] } : {}),
    ...(error.problems.length ? { problems: [...error.problems] } : {}),
  };
};

/** The errors of Express and its body parser have a `type` or a status; anything else stays unknown. */
const asAppError = (cause: unknown): AppError => {
  if (cause instanceof AppError) return cause;
  const { type, limit, status } = (cause ?? {}) as { type?: unknown; limit?: unknown; status?: unknown };
  switch (type) {
    case 'entity.too.large':
      return tooLarge(Number(limit));
    case 'entity.parse.failed':
      return new AppError('malformed-json', { message: placeOf(cause) });
    case 'encoding.unsupported':
    case 'charset.unsupported':
      return new AppError('unsupported-media-type');
    case 'request.aborted':
    case 'request.size.invalid':
      return new AppError('invalid-request', { message: 'The body did not arrive whole.' });
    default:
      return cause instanceof URIError || (status === 400 && cause instanceof Error)
        ? new AppError('malformed-address')
        : new AppError('internal');
  }
};

/** Where JSON broke. The parser's own words would repeat part of the body, which may hold a password. */
const placeOf = (cause: unknown): string | undefined => {
  const place = cause instanceof Error ? /position (\d+)/.exec(cause.message)?.[1] : undefined;
  return place && `Reading stopped at character ${place}.`;
};
