import { Fragment, useId, type ReactNode } from 'react';
import { View } from 'react-native';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Text } from './text';
import { VisuallyHidden } from './visually-hidden';

/** A column of a table of `Row`s. */
export type Column<Row> = {
  key: string;
  header: string;
  /** What stands in the cell. Words alone are drawn in the table's style; anything else as it is. */
  cell: (row: Row) => ReactNode;
  /** Share of the width against the other columns, 1 where nothing is said. */
  share?: number;
  align?: 'left' | 'right';
  /** Codes and socket labels. */
  mono?: boolean;
};

/** Props of Table. */
export type TableProps<Row> = {
  /** What the table shows: its caption and its name. */
  caption: string;
  /** Keeps the caption for a screen reader only, where a title stands above already. */
  hideCaption?: boolean;
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** A row to point out, with pencil wash. */
  isMarked?: (row: Row) => boolean;
  /** Few and short columns in which nothing is tapped: rows close together, and columns on a phone too. */
  dense?: boolean;
  /** What to show where there is no row. */
  empty?: ReactNode;
};

/** A ruled table. On a phone each row is stacked: the first column as its head, the others as named lines. */
export function Table<Row>(props: TableProps<Row>) {
  const styles = useStyles();
  const captionId = useId();
  const breakpoint = useBreakpoint();
  const { caption, hideCaption, rows, empty, dense } = props;
  const Body = breakpoint === 'phone' && !dense ? StackedRows : WideRows;
  return (
    <View style={styles.table}>
      {hideCaption ? (
        <VisuallyHidden id={captionId}>{caption}</VisuallyHidden>
      ) : (
        <Text id={captionId} variant="subheading" level={null}>
          {caption}
        </Text>
      )}
      {rows.length === 0 && empty !== undefined ? empty : <Body {...props} captionId={captionId} />}
    </View>
  );
}

type BodyProps<Row> = TableProps<Row> & { captionId: string };

function WideRows<Row>({ columns, rows, rowKey, isMarked, dense, captionId }: BodyProps<Row>) {
  const styles = useStyles();
  return (
    <View role="table" aria-labelledby={captionId} aria-rowcount={rows.length + 1}>
      <View role="rowgroup">
        <View role="row" style={[styles.row, styles.head]}>
          {columns.map((column) => (
            <View key={column.key} role="columnheader" style={[styles.cell, { flexGrow: column.share ?? 1 }]}>
              <Text variant="small" tone="soft" align={column.align}>
                {column.header}
              </Text>
            </View>
          ))}
        </View>
      </View>
      <View role="rowgroup">
        {rows.map((row) => (
          <View
            key={rowKey(row)}
            role="row"
            style={[styles.row, styles.entry, !dense && styles.tappable, isMarked?.(row) && styles.marked]}
          >
            {columns.map((column, at) => (
              <View
                key={column.key}
                role={at === 0 ? 'rowheader' : 'cell'}
                style={[styles.cell, column.align === 'right' && styles.right, { flexGrow: column.share ?? 1 }]}
              >
                <CellContent column={column} row={row} first={at === 0} />
              </View>
            ))}
          </View>
        ))}
      </View>
    </View>
  );
}

function StackedRows<Row>({ columns, rows, rowKey, isMarked, captionId }: BodyProps<Row>) {
  const styles = useStyles();
  const [first, ...others] = columns;
  return (
    <View role="list" aria-labelledby={captionId} style={styles.stack}>
      {rows.map((row) => (
        <View key={rowKey(row)} role="listitem" style={[styles.stacked, isMarked?.(row) && styles.marked]}>
          {first ? <CellContent column={first} row={row} first /> : null}
          {others.map((column) => {
            const content = column.cell(row);
            if (content === null || content === '') return <Fragment key={column.key} />;
            return (
              <View key={column.key} style={styles.pair}>
                <View style={styles.pairName}>
                  <Text variant="small" tone="soft">
                    {column.header}
                  </Text>
                </View>
                <View style={styles.pairValue}>
                  <CellContent column={{ ...column, align: 'left' }} row={row} />
                </View>
              </View>
            );
          })}
        </View>
      ))}
    </View>
  );
}

function CellContent<Row>({ column, row, first = false }: { column: Column<Row>; row: Row; first?: boolean }) {
  const content = column.cell(row);
  if (typeof content !== 'string' && typeof content !== 'number') return <>{content}</>;
  const variant = column.mono ? (first ? 'code' : 'mono') : first ? 'strong' : 'body';
  return (
    <Text variant={variant} align={column.align}>
      {content}
    </Text>
  );
}

const useStyles = makeStyles((t) => ({
  table: { gap: t.space.sm },
  row: { flexDirection: 'row', gap: t.space.lg, alignItems: 'center', paddingHorizontal: t.space.xs },
  head: { paddingVertical: t.space.sm, borderBottomWidth: t.line.thin, borderBottomColor: t.colours.ink },
  tappable: { minHeight: t.target },
  entry: {
    paddingVertical: t.space.xs,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  marked: { backgroundColor: t.colours.pencilWash },
  cell: { flexBasis: 0, flexShrink: 1, minWidth: 0 },
  right: { alignItems: 'flex-end' },
  stack: { borderTopWidth: t.line.thin, borderTopColor: t.colours.ink, margin: t.space.none, padding: t.space.none },
  stacked: {
    gap: t.space.xs,
    paddingVertical: t.space.md,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  pair: { flexDirection: 'row', gap: t.space.md },
  pairName: { flexBasis: 0, flexGrow: 2, minWidth: 0 },
  pairValue: { flexBasis: 0, flexGrow: 5, minWidth: 0 },
}));
