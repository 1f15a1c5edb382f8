import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Table, type Column } from '@/components/ui/table';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { sentenceCase } from '@/lib/layout/words';
import { keyOf, type TargetKey } from './geometry-scene';
import { isSuspect } from './part-glyph';
import type { PickTarget, SketchMarks } from './sketch-types';
import { heldWords, markWords, partWordings } from './words';

type SketchTableProps = {
  index: LayoutIndex;
  marks: SketchMarks;
  picked: PickTarget | null;
  onPick?: (target: PickTarget) => void;
};

interface Row {
  readonly key: TargetKey;
  readonly target: PickTarget;
  readonly holds: string;
  readonly state: string;
  readonly rank: number | undefined;
}

/** Rows that are shown before one asks for more. */
const firstRows = 100;

function rowsOf(index: LayoutIndex, marks: SketchMarks): readonly Row[] {
  const sockets = index.document.sockets.map((socket, at): Row => {
    const target: PickTarget = { kind: 'socket', label: socket.label };
    const mark = marks.sockets.get(socket.label);
    const state = [markWords(mark), socket.soldered && 'soldered in'].filter(Boolean).join(', ');
    return { key: keyOf(target), target, holds: sentenceCase(heldWords(index, at)), state, rank: mark?.rank };
  });
  const parts = index.document.sharedParts.map((part): Row => {
    const target: PickTarget = { kind: 'shared-part', label: part.label };
    const mark = marks.sharedParts.get(part.label);
    const state = isSuspect(mark) ? 'Shared part, suspect' : 'Shared part';
    return { key: keyOf(target), target, holds: sentenceCase(partWordings(part)[0] ?? ''), state, rank: mark?.rank };
  });
  // Suspects first, by rank; the rest as the board names them.
  return [...sockets, ...parts].sort((a, b) => (a.rank ?? Infinity) - (b.rank ?? Infinity) || 0);
}

/** The sketch as a table: the same sockets and shared parts, the same states, the same choice. */
export function SketchTable({ index, marks, picked, onPick }: SketchTableProps) {
  const styles = useStyles();
  const [shown, setShown] = useState(firstRows);
  const rows = useMemo(() => rowsOf(index, marks), [index, marks]);
  const chosen = picked ? keyOf(picked) : null;
  const columns: Column<Row>[] = [
    {
      key: 'socket',
      header: 'Socket',
      mono: true,
      cell: (row) =>
        onPick ? (
          <View style={styles.pick}>
            <Button
              kind="plain"
              label={row.target.label}
              pressed={row.key === chosen}
              onPress={() => onPick(row.target)}
            />
          </View>
        ) : (
          row.target.label
        ),
    },
    { key: 'holds', header: 'Holds', share: 2, cell: (row) => row.holds },
    { key: 'state', header: 'State', share: 1.5, cell: (row) => row.state },
    { key: 'suspect', header: 'Suspect', share: 0.7, cell: (row) => (row.rank === undefined ? '' : String(row.rank)) },
  ];
  return (
    <View style={styles.table}>
      <Table
        caption={`Sockets and shared parts of ${index.document.board.name}`}
        columns={columns}
        rows={rows.slice(0, shown)}
        rowKey={(row) => row.key}
        isMarked={(row) => row.rank === 1}
      />
      {rows.length > shown ? <Button label={`Show all ${rows.length}`} onPress={() => setShown(rows.length)} /> : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  table: { gap: t.space.md },
  pick: { alignItems: 'flex-start' },
}));
