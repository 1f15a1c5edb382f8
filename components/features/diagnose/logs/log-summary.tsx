import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Table } from '@/components/ui/table';
import { Text } from '@/components/ui/text';
import type { LaneSummary, LayoutIndex, LogSummary, UnreadLine } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { LogResult } from './log-task';
import { counted, countedOf, speedWords } from './log-words';

type LogSummaryProps = {
  index: LayoutIndex;
  result: LogResult;
  onUse: () => void;
  onAgain: () => void;
  onOther: () => void;
};

/** Lanes and lines that stand at once; the rest on demand. */
const mostLanes = 16;
const mostLines = 5;

/** What a log showed, before it is taken as evidence. */
export function LogSummaryPanel({ index, result, onUse, onAgain, onOther }: LogSummaryProps) {
  const styles = useStyles();
  const { summary, seconds } = result;
  const { counts, notes } = summary;
  const usable = counts.readings > counts.outside;
  return (
    <View style={styles.all}>
      <View role="status" style={styles.notes}>
        <Text variant="strong">{headline(summary)}</Text>
        <Text variant="small" tone="soft">
          {[
            countedOf(counts.lines, 'line'),
            `${countedOf(counts.readings, 'reading')}, ${counted(counts.failing)} of them wrong`,
            ...(counts.unread > 0 ? [`${countedOf(counts.unread, 'line')} not read`] : []),
            ...(counts.outside > 0 ? [`${counted(counts.outside)} outside this board's memory`] : []),
            speedWords(counts.lines, seconds),
          ].join('; ')}
        </Text>
        {notes.map((note) => (
          <Text key={note} variant="small" tone="mark">
            {note}
          </Text>
        ))}
      </View>
      <Lanes index={index} lanes={summary.lanes} />
      <LineList title="Lines that were not read" lines={summary.unreadLines} count={counts.unread} />
      <LineList title="Outside this board's memory" lines={summary.outsideLines} count={counts.outside} />
      <View style={styles.row}>
        <Button kind="primary" label="Use this log" disabled={!usable} onPress={onUse} />
        <Button label="Read it another way" onPress={onAgain} />
        <Button kind="quiet" label="Another file" onPress={onOther} />
      </View>
    </View>
  );
}

function headline({ counts, lanes }: LogSummary): string {
  if (counts.readings === 0) return 'No line was read. Another pattern may fit.';
  if (counts.readings === counts.outside) return "No reading lies in this board's memory.";
  if (lanes.length === 0) return 'No reading failed.';
  return lanes.length === 1 ? 'One bit failed.' : `${counted(lanes.length)} bits failed.`;
}

function chipsOf({ laneSockets, laneSocketStart, document }: LayoutIndex, lane: number): string {
  const sockets = Array.from(laneSockets.subarray(laneSocketStart[lane], laneSocketStart[lane + 1]));
  const labels = sockets.map((socket) => document.sockets[socket]?.label ?? '');
  return labels.length > 3 ? `${labels.slice(0, 2).join(', ')} and ${labels.length - 2} more` : labels.join(', ');
}

/** "1: 35", "256, most in 1C": rows or columns, and the one with the most failing words. */
function linesWords(count: number, worst: LaneSummary['worstRows'], radix: number): string {
  const [first, second] = worst;
  if (count === 0 || first === undefined) return '';
  const named = first.number.toString(radix).toUpperCase();
  if (count === 1) return `1: ${named}`;
  return second !== undefined && first.words > second.words ? `${counted(count)}, most in ${named}` : counted(count);
}

function directionWords({ readsOne, readsZero }: LaneSummary): string {
  if (readsOne === 0 && readsZero === 0) return '';
  if (readsZero === 0) return 'reads 1';
  if (readsOne === 0) return 'reads 0';
  return `1: ${counted(readsOne)}, 0: ${counted(readsZero)}`;
}

function Lanes({ index, lanes }: { index: LayoutIndex; lanes: readonly LaneSummary[] }) {
  const [all, setAll] = useState(false);
  if (lanes.length === 0) return null;
  const { multiplexing, addressMap } = index.document;
  const radix = { hexadecimal: 16, octal: 8, decimal: 10 }[addressMap.notation];
  const inside = multiplexing === undefined ? [] : (['Rows', 'Columns'] as const);
  return (
    <View>
      <Table
        caption="Failing bits"
        columns={[
          { key: 'bit', header: 'Bit', share: 2, cell: ({ lane }) => sentenceCase(index.laneWords(lane)) },
          { key: 'chip', header: 'Chip', mono: true, cell: ({ lane }) => chipsOf(index, lane) },
          {
            key: 'words',
            header: 'Failing words',
            align: 'right',
            cell: ({ words, atLeast }) => `${atLeast ? 'at least ' : ''}${counted(words)}`,
          },
          { key: 'direction', header: 'Direction', cell: directionWords },
          ...inside.map((header) => ({
            key: header,
            header: `${header} in the chip`,
            cell: (lane: LaneSummary) =>
              header === 'Rows'
                ? linesWords(lane.rows, lane.worstRows, radix)
                : linesWords(lane.columns, lane.worstColumns, radix),
          })),
          {
            key: 'lines',
            header: 'Lines of the log',
            cell: ({ first, last }) => `${counted(first)} to ${counted(last)}`,
          },
        ]}
        rows={all ? lanes : lanes.slice(0, mostLanes)}
        rowKey={({ lane }) => String(lane)}
      />
      {lanes.length > mostLanes && !all ? (
        <Button kind="quiet" label={`Show all ${counted(lanes.length)}`} onPress={() => setAll(true)} />
      ) : null}
    </View>
  );
}

/** Lines by number with the reason, the first few at once. */
function LineList({ title, lines, count }: { title: string; lines: readonly UnreadLine[]; count: number }) {
  const styles = useStyles();
  const [all, setAll] = useState(false);
  if (lines.length === 0) return null;
  const shown = all ? lines : lines.slice(0, mostLines);
  const more = count - lines.length;
  return (
    <View style={styles.notes}>
      <Text variant="subheading" level={3}>
        {title}
      </Text>
      <View role="list" aria-label={title} style={styles.notes}>
        {shown.map(({ line, text, reason }) => (
          <View key={line} role="listitem">
            <Text variant="small">
              <Text variant="smallStrong">{`Line ${counted(line)}: `}</Text>
              {reason}
            </Text>
            {text === '' ? null : (
              <Text variant="mono" tone="soft" numberOfLines={1}>
                {text}
              </Text>
            )}
          </View>
        ))}
      </View>
      {lines.length > mostLines && !all ? (
        <Button kind="quiet" label={`Show ${counted(lines.length)} of them`} onPress={() => setAll(true)} />
      ) : null}
      {all && more > 0 ? <Text variant="small" tone="soft">{`and ${counted(more)} more`}</Text> : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.lg },
  notes: { gap: t.space.xs },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
