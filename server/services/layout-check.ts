import { validateLayout } from '@/lib';
import { spendComputing } from './computing-limit';
import type { Context } from '@/server/context';
import { AppError } from '@/server/errors';
import type { LayoutDocument } from '@/shared';
import type { LayoutCheck } from '@/shared/api/layouts';
import type { LayoutProblem } from '@/shared/layout/problem';
import { readLayoutDocument } from '@/shared/layout/read-document';

/** Most problems that one answer lists. */
const mostListed = 500;

const isError = ({ severity }: LayoutProblem): boolean => severity === 'error';

/** Every problem of what somebody sent as a layout document, errors first; nothing is stored. */
export const checkLayout = (sent: unknown): LayoutCheck => {
  const { problems } = findProblems(sent);
  return {
    publishable: !problems.some(isError),
    problems: problems.slice(0, mostListed),
    more: Math.max(0, problems.length - mostListed),
  };
};

/** Counts the work that a document makes before it is looked at; throws `too-many-requests`. */
export const spendForDocument = (context: Context, sent: unknown): void => {
  const { sockets } = (sent ?? {}) as { sockets?: unknown };
  spendComputing(context, { of: 'document', sockets: Array.isArray(sockets) ? sockets.length : 0 });
};

/** The check for whoever asks: the same, within what one caller may have computed. */
export const checkSentLayout = (context: Context, sent: unknown): LayoutCheck => {
  spendForDocument(context, sent);
  return checkLayout(sent);
};

/** Reads a layout document that can be published; throws `layout-invalid` with every problem if it has an error. */
export const requireSoundLayout = (sent: unknown): { document: LayoutDocument; warnings: readonly LayoutProblem[] } => {
  const { document, problems } = findProblems(sent);
  if (document && !problems.some(isError)) return { document, warnings: problems };
  const message =
    problems.length > mostListed ? `The first ${mostListed} of ${problems.length} problems are listed.` : undefined;
  throw new AppError('layout-invalid', { message, problems: problems.slice(0, mostListed) });
};

/**
 * The problems of the schema and those of the layout together. Where a section does not fit the schema, the layout
 * is looked at without it and what follows from that is not told.
 */
const findProblems = (sent: unknown): { document?: LayoutDocument; problems: readonly LayoutProblem[] } => {
  const read = readLayoutDocument(sent);
  if (read.ok) return { document: read.document, problems: errorsFirst(validateLayout(read.document)) };
  const { problems, rest } = read;
  const beyond = rest ? validateLayout(rest.document).filter(({ pointer }) => !isWithin(pointer, rest.leftOut)) : [];
  return { problems: errorsFirst([...problems, ...beyond]) };
};

const isWithin = (pointer: string, sections: readonly string[]): boolean =>
  sections.includes(pointer.split('/')[1] ?? '');

const errorsFirst = (problems: readonly LayoutProblem[]): LayoutProblem[] => [
  ...problems.filter(isError),
  ...problems.filter((problem) => !isError(problem)),
];
