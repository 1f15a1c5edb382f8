import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Panel } from '@/components/ui/panel';
import { Text } from '@/components/ui/text';
import type { LayoutDocument } from '@/shared';

/** What to look for on the board before a socket is believed. */
export function MarksToCompare({ board }: { board: LayoutDocument['board'] }) {
  const styles = useStyles();
  return (
    <Panel
      title={`Is it revision ${board.revision}?`}
      note="On another revision the same code can mean another socket. Compare before you pull."
    >
      {board.marks.length === 0 ? (
        <Text tone="soft">Nobody has noted what to look for. Read the revision off the board itself.</Text>
      ) : (
        <View role="list" aria-label="Marks to compare" style={styles.list}>
          {board.marks.map((mark) => (
            <View key={mark} role="listitem" style={styles.mark}>
              <Text aria-hidden tone="pencil">
                –
              </Text>
              <Text style={styles.words}>{mark}</Text>
            </View>
          ))}
        </View>
      )}
    </Panel>
  );
}

const useStyles = makeStyles((t) => ({
  list: { gap: t.space.xs },
  mark: { flexDirection: 'row', gap: t.space.sm },
  words: { flexShrink: 1 },
}));
