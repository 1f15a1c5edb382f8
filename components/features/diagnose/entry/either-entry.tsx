import { Text } from '@/components/ui/text';
import { sentenceCase } from '@/lib/layout/words';
import type { Evidence } from '@/shared';
import type { Bench } from '../bench';
import { evidenceWords } from '../evidence-words';
import { ActionList } from './choice-list';

type EitherEntryProps = {
  bench: Bench;
  seen: Extract<Evidence, { kind: 'either' }>;
  /** It is known now which way is meant. */
  onChoose: (way: Evidence) => void;
};

/** One thing that can be understood in several ways: the choice of the one that is true, once that is known. */
export function EitherEntry({ bench, seen, onChoose }: EitherEntryProps) {
  return (
    <>
      <Text>All of these are weighed. Choose one once you know which is true.</Text>
      <ActionList
        label="Ways to understand it"
        lines={seen.ways.map(({ takes, evidence }, at) => ({
          value: String(at),
          label: sentenceCase(takes),
          help: evidenceWords(evidence, bench).text,
        }))}
        onPress={(at) => {
          const way = seen.ways[Number(at)];
          if (way !== undefined) onChoose(way.evidence);
        }}
      />
    </>
  );
}
