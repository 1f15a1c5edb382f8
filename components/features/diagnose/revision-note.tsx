import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { Text } from '@/components/ui/text';
import type { LayoutDocument } from '@/shared';

/** Which revision the look-up is for, and how to know it: asked before a socket is named. */
export function RevisionNote({ document, slug }: { document: LayoutDocument; slug: string }) {
  const styles = useStyles();
  const { board } = document;
  return (
    <View style={styles.note}>
      <Text variant="subheading" level={2}>
        {`Is it revision ${board.revision}?`}
      </Text>
      <Text variant="small" tone="soft">
        {board.marks.length === 0
          ? 'Compare it with what is printed on the board before you pull anything.'
          : 'Compare the marks before you pull anything:'}
      </Text>
      <View role="list">
        {board.marks.map((mark) => (
          <View key={mark} role="listitem" style={styles.mark}>
            <Text aria-hidden variant="small" tone="pencil">
              –
            </Text>
            <Text variant="small" style={styles.words}>
              {mark}
            </Text>
          </View>
        ))}
      </View>
      <View style={styles.links}>
        <Link href={{ pathname: '/', params: { board: slug } }} variant="smallStrong" standalone>
          Another revision or board
        </Link>
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  note: { gap: t.space.xs },
  mark: { flexDirection: 'row', gap: t.space.sm },
  words: { flexShrink: 1 },
  links: { alignItems: 'flex-start' },
}));
