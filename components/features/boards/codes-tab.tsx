import { View } from 'react-native';
import type { Bench, BenchFormat } from '@/components/features/diagnose/bench';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { SelectField } from '@/components/ui/select-field';
import { Split } from '@/components/ui/split';
import { EmptyState } from '@/components/ui/states';
import { Text } from '@/components/ui/text';
import type { ReportFormat } from '@/shared';
import { useBoardLink } from './board-link';
import { CodeMeaning } from './code-meaning';
import { CodeTable } from './code-table';
import { DetailLines } from './detail-lines';
import { WordsOfTables } from './words-of-tables';

type CodesTabProps = { bench: Bench; slug: string };

/** What the machine reports: every code of a report format with its socket, and a field to try one. */
export function CodesTab({ bench, slug }: CodesTabProps) {
  const styles = useStyles();
  const wide = useBreakpoint() === 'wide';
  const { format: chosen, change } = useBoardLink();
  const format = bench.formats.find(({ definition }) => definition.id === chosen) ?? bench.formats[0];
  if (format === undefined) {
    return (
      <View style={styles.empty}>
        <EmptyState title="No report format of this board is known.">
          The sketch still tells which socket holds which bit: use “failing bits” in the look-up.
        </EmptyState>
      </View>
    );
  }
  const { id } = format.definition;
  const ask = (
    <>
      <FormatChoice formats={bench.formats} value={id} onChange={(next) => change({ format: next })} />
      <CodeMeaning key={id} bench={bench} format={format} slug={slug} />
    </>
  );
  return (
    <Split
      mainLabel="Codes"
      asideLabel="The report format"
      main={
        <>
          {wide ? null : ask}
          <CodeTable key={id} bench={bench} format={format} />
        </>
      }
      aside={
        <View style={styles.aside}>
          {wide ? ask : null}
          <View style={styles.part}>
            <Text variant="subheading">How it reports</Text>
            <DetailLines label="How it reports" lines={formatLines(format)} />
          </View>
          <WordsOfTables definition={format.definition} />
        </View>
      }
    />
  );
}

type FormatChoiceProps = { formats: readonly BenchFormat[]; value: string; onChange: (id: string) => void };

/** Report formats that stand side by side; more are folded away. */
const mostChips = 5;

function FormatChoice({ formats, value, onChange }: FormatChoiceProps) {
  const options = formats.map(({ definition }) => ({ value: definition.id, label: definition.name }));
  if (options.length === 1) return <Text variant="heading">{options[0]?.label}</Text>;
  return options.length > mostChips ? (
    <SelectField label="Report format" options={options} value={value} onChange={onChange} />
  ) : (
    <SegmentedControl label="Report format" options={options} value={value} onChange={onChange} />
  );
}

const afterWords: Record<ReportFormat['after'], string> = {
  stops: 'It ends at the first failure: what comes later was not tested.',
  'lists-lanes': 'It reports every failing bit, and goes on.',
  'lists-banks': 'It reports every failing bank once, with all its failing bits.',
};

function formatLines({ definition, open }: BenchFormat) {
  const { where, after, notes, testOrder } = definition;
  const line = (name: string, value: string | undefined) => (value === undefined ? [] : [{ key: name, name, value }]);
  return [
    ...line('where', where),
    ...line('after a failure', afterWords[after]),
    ...line('order of test', testOrder?.banks && `banks ${testOrder.banks.join(', ')}`),
    ...line('not known', open.length === 0 ? undefined : open.map(([a, b]) => `${a} or ${b}`).join('; ')),
    ...line('notes', notes),
  ];
}

const useStyles = makeStyles((t) => ({
  aside: { gap: t.space.xl },
  part: { gap: t.space.sm },
  empty: { paddingHorizontal: t.space.xl },
}));
