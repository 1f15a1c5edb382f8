import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { ReportFormat } from '@/shared';
import { DetailLines } from './detail-lines';

/** Texts of a report format that name no lane of this board, and what they mean. */
export function WordsOfTables({ definition }: { definition: ReportFormat }) {
  const styles = useStyles();
  const texts = definition.parts.flatMap((part) =>
    'field' in part ? part.table.flatMap(({ text, means }) => (means === undefined ? [] : [{ text, means }])) : [],
  );
  if (texts.length === 0) return null;
  return (
    <View style={styles.part}>
      <Text variant="subheading">Texts that name no chip here</Text>
      <DetailLines
        label="Texts that name no chip here"
        lines={texts.map(({ text, means }) => ({ key: text, name: text, value: means }))}
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({ part: { gap: t.space.sm } }));
