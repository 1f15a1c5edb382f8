import { useMemo } from 'react';
import { Link } from '@/components/ui/link';
import { Notice } from '@/components/ui/notice';
import { Text } from '@/components/ui/text';
import { fitCheck, type RailAtPins } from '@/lib';
import type { ChipFamily } from '@/shared';
import { changesTitle, verdictKind, verdictWords } from './fit-words';
import { partsLink } from './parts-link';
import { WordList } from './word-list';

type FitNoteProps = {
  /** What the socket is wired for. */
  socketFamily: ChipFamily;
  fittedFamily: ChipFamily;
  /** The supplies that the layout states at the socket. */
  rails?: readonly RailAtPins[];
};

/** Whether a chip may go into a socket, read out as soon as it is known: before it is pushed in. */
export function FitNote({ socketFamily, fittedFamily, rails }: FitNoteProps) {
  const check = useMemo(() => fitCheck(socketFamily, fittedFamily, rails), [socketFamily, fittedFamily, rails]);
  const changes = changesTitle(check);
  const weighty = check.reasons.filter(({ severity }) => severity !== 'harmless');
  const shown = weighty.length > 0 ? weighty : check.reasons;
  return (
    <Notice kind={verdictKind[check.verdict]} title={verdictWords[check.verdict]} live>
      {shown.length === 0 ? null : <WordList label="Why" items={shown.map(({ words }) => words)} />}
      {changes === null ? null : (
        <>
          <Text variant="smallStrong">{changes}</Text>
          <WordList label={changes} items={check.changes} numbered />
        </>
      )}
      <Link href={partsLink({ socket: socketFamily.id, chip: fittedFamily.id })} variant="smallStrong" standalone>
        Pin by pin
      </Link>
    </Notice>
  );
}
