import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { percentWords } from '@/components/ui/percent';
import { Text } from '@/components/ui/text';
import {
  type BitIndex,
  lanesWords,
  parseReadings,
  patternWords,
  wordsOfLine,
  type LayoutIndex,
  type LinePattern,
} from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { LogEvidence, Reading, Readings } from '@/shared';
import { ChoiceList, type ChoiceLine } from '../entry/choice-list';
import { readingPlaces } from '../entry/reading-places';
import { ColumnChoice } from './column-choice';
import { beginDraft, patternOfDraft } from './column-draft';
import { byteWords } from './log-words';
import type { LogChoice, LogLook } from './log-store';

type PatternPanelProps = {
  index: LayoutIndex;
  look: LogLook;
  onRead: (choice: LogChoice) => void;
  onOther: () => void;
};

const byColumns = 'columns';
/** Candidates that are offered, and lines that show what a pattern comes to. */
const mostOffered = 4;
const mostShown = 4;

/** How the lines of a log are read: as it was found, or as the person points it out, with what it comes to. */
export function PatternPanel({ index, look, onRead, onOther }: PatternPanelProps) {
  const styles = useStyles();
  const { source, sample, candidates } = look;
  const [choice, setChoice] = useState(candidates.length === 0 ? byColumns : '0');
  const [draft, setDraft] = useState(() => beginDraft(index, candidates[0]));
  const [passed, setPassed] = useState(false);
  const line = useMemo(() => typicalLine(sample), [sample]);
  const pattern = choice === byColumns ? patternOfDraft(draft) : (candidates[Number(choice)] ?? patternOfDraft(draft));
  const problem = typeof pattern === 'string' ? pattern : null;
  return (
    <View style={styles.all}>
      <Text variant="small" tone="soft">{`${source.name}, ${byteWords(source.blob.size)}`}</Text>
      <Text variant="subheading" level={3}>
        How its lines are read
      </Text>
      {candidates.length === 0 ? (
        <Text variant="smallStrong" tone="pencil">
          {sample.length === 0
            ? 'It has no line with letters or digits. It is packed in another way than gzip, or no text.'
            : 'No line looks like an address with what was written and read. Point at the words of a line.'}
        </Text>
      ) : (
        <ChoiceList label="How its lines are read" lines={offers(candidates)} value={choice} onChange={setChoice} />
      )}
      {choice === byColumns && line !== null ? (
        <ColumnChoice index={index} line={line} draft={draft} onChange={setDraft} />
      ) : null}
      {typeof pattern === 'string' ? null : <Shown index={index} sample={sample} pattern={pattern} />}
      <View style={styles.row}>
        <Chip label="All else was tested and passed" selected={passed} onPress={() => setPassed(!passed)} />
      </View>
      {problem === null || line === null ? null : (
        <Text role="status" variant="smallStrong">
          {problem}
        </Text>
      )}
      <View style={styles.row}>
        <Button
          kind="primary"
          label="Read the log"
          disabled={problem !== null}
          onPress={() => {
            if (typeof pattern !== 'string') onRead({ pattern, rest: passed ? 'passed' : 'unknown' });
          }}
        />
        <Button kind="quiet" label="Another file" onPress={onOther} />
      </View>
    </View>
  );
}

function offers(candidates: readonly LinePattern[]): ChoiceLine<string>[] {
  const found = candidates.slice(0, mostOffered).map((pattern, at) => ({
    value: String(at),
    label: sentenceCase(patternWords(pattern)),
    help: [pattern.reason ?? '', pattern.score === undefined ? '' : `Fits with ${percentWords(pattern.score)}.`]
      .join(' ')
      .trim(),
  }));
  return [...found, { value: byColumns, label: 'I point at the words', help: '' }];
}

/** The first line with enough numbers to be a reading. */
function typicalLine(sample: readonly string[]): string | null {
  const numbers = (line: string) => wordsOfLine(line).filter(({ text }) => /[0-9]/.test(text)).length;
  return sample.find((line) => numbers(line) > 1) ?? sample[0] ?? null;
}

/** "Bit 8 of bank 2": the lanes that fail in lines that are read by a format of the board. */
function lanesOfLog(index: LayoutIndex, { lanes }: LogEvidence): string {
  const failing = lanes.flatMap(({ bank, bit }) => {
    const at = index.bankByName.get(bank);
    return at === undefined ? [] : [index.laneOf(at, bit as BitIndex)];
  });
  return failing.length === 0 ? 'All of them read what was written.' : `${sentenceCase(lanesWords(index, failing))}.`;
}

/** Readings with those first that say more than that all is right. */
function failingFirst(readings: Readings): Readings {
  const fails = ({ mask, written, read }: Reading) => (mask === undefined ? written !== read : mask !== 0);
  return { ...readings, lines: [...readings.lines].sort((a, b) => Number(fails(b)) - Number(fails(a))) };
}

/** What the first lines mean on this board, so that a wrong pattern is seen before the log is read. */
function Shown({ index, sample, pattern }: { index: LayoutIndex; sample: readonly string[]; pattern: LinePattern }) {
  const styles = useStyles();
  const parsed = useMemo(() => parseReadings(index, sample.join('\n'), { pattern }), [index, sample, pattern]);
  const { evidence, unread } = parsed;
  const places = evidence?.kind === 'readings' ? readingPlaces(index, failingFirst(evidence), mostShown) : [];
  return (
    <View role="list" aria-label="What its first lines mean" style={styles.lines}>
      {evidence?.kind === 'log' ? (
        <View role="listitem">
          <Text variant="small">{lanesOfLog(index, evidence)}</Text>
        </View>
      ) : null}
      {places.map(({ text, means, wrong }, at) => (
        <View key={at} role="listitem" style={styles.line}>
          <Text variant="codeSmall">{text}</Text>
          <Text variant={wrong ? 'smallStrong' : 'small'} tone={wrong ? 'pencil' : 'ink'} style={styles.means}>
            {means}
          </Text>
        </View>
      ))}
      {unread.slice(0, places.length === 0 ? mostShown : 1).map(({ line, text, reason }) => (
        <View key={`unread ${line}`} role="listitem" style={styles.line}>
          <Text variant="mono" numberOfLines={1} style={styles.cut}>
            {text}
          </Text>
          <Text variant="smallStrong" tone="pencil" style={styles.means}>
            {reason}
          </Text>
        </View>
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  lines: { gap: t.space.xs },
  line: { flexDirection: 'row', flexWrap: 'wrap', columnGap: t.space.md, alignItems: 'baseline' },
  means: { flexGrow: 1, flexShrink: 1, flexBasis: t.measure.beside, minWidth: 0 },
  cut: { maxWidth: '100%' },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
