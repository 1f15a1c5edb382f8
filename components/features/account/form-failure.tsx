import { ApiProblem, problemWords } from '@/components/api/problem';
import { Notice } from '@/components/ui/notice';

const minute = 60;

function waitWords(seconds: number): string {
  if (seconds < 2 * minute) return `Try again in ${Math.ceil(seconds)} seconds.`;
  return `Try again in ${Math.ceil(seconds / minute)} minutes.`;
}

/** Why a form could not be sent, where no single field is to blame. Nothing that was typed is lost. */
export function FormFailure({ failure }: { failure: unknown }) {
  if (failure === null || failure === undefined) return null;
  const wait = failure instanceof ApiProblem && failure.retryAfter !== null ? ` ${waitWords(failure.retryAfter)}` : '';
  return (
    <Notice kind="problem" live>
      {`${problemWords(failure)}${wait}`}
    </Notice>
  );
}
