import { useMemo } from 'react';
import { View } from 'react-native';
import type { Bench } from '@/components/features/diagnose/bench';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { runExample } from './code-reading';

/** Worked examples of a layout, each run now: the code, what it names, and where it was seen. */
export function ExampleList({ bench }: { bench: Bench }) {
  const styles = useStyles();
  const { examples } = bench.document;
  const outcomes = useMemo(() => examples.map((example) => runExample(bench, example)), [bench, examples]);
  if (examples.length === 0) {
    return <Text tone="soft">There is no worked example: nothing was checked against a repair.</Text>;
  }
  const failed = outcomes.filter(({ passed }) => !passed).length;
  return (
    <View>
      <Text variant="small" tone={failed === 0 ? 'soft' : 'pencil'} role="status">
        {failed === 0
          ? `${examples.length === 1 ? 'The one example comes' : `All ${examples.length} examples come`} out as the source says.`
          : `${failed} of ${examples.length} do not come out as the source says.`}
      </Text>
      <View role="list" aria-label="Worked examples">
        {examples.map((example, at) => {
          const outcome = outcomes[at];
          return (
            <View key={`${example.format}${example.text}${at}`} role="listitem" style={styles.example}>
              <View style={styles.words}>
                <Text variant="code">{example.text}</Text>
                <Text variant="small">{`${bench.formatName(example.format) ?? example.format}. ${outcome?.words ?? ''}`}</Text>
                {example.source === undefined ? null : (
                  <Text variant="small" tone="soft">
                    {example.source}
                  </Text>
                )}
              </View>
              <Text variant="label" tone={outcome?.passed ? 'tick' : 'pencil'}>
                {outcome?.passed ? '✓ passes' : '! fails'}
              </Text>
            </View>
          );
        })}
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  example: {
    flexDirection: 'row',
    gap: t.space.md,
    paddingVertical: t.space.sm,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
}));
