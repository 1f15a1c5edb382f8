import { useId, useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import type { Bench } from '../bench';
import { CodeDisplay } from './code-display';
import { NotSure } from './not-sure';
import { ReadingNote, saysMore } from './reading-note';
import type { Entry } from './use-entry';

/** A code in one of the board's formats, with what it means while it is typed. Nothing in the tabs without a format. */
export function CodeEntry({ bench, entry }: { bench: Bench; entry: Entry }) {
  const styles = useStyles();
  const noteId = useId();
  const [unsure, setUnsure] = useState(false);
  const { format, compiled, code } = entry;
  if (format === null || compiled === null || code === null) return null;
  return (
    <View>
      <CodeDisplay
        format={compiled}
        code={code}
        onChange={entry.setCode}
        onSubmit={() => entry.submit(entry.lists && !entry.editing ? 'more' : 'answer')}
        describedBy={noteId}
      />
      <View style={styles.expects}>
        <View style={styles.words}>
          <ReadingNote id={noteId} bench={bench} entry={entry} />
          {saysMore(entry) ? null : (
            <Text variant="small" tone="soft">
              {code.prefix.expects}
            </Text>
          )}
        </View>
        <Button kind="quiet" label="Not sure?" aria-haspopup="dialog" onPress={() => setUnsure(true)} />
      </View>
      <NotSure open={unsure} onClose={() => setUnsure(false)} {...{ bench, format, entry }} />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  expects: { flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: t.space.sm },
  words: { flexShrink: 1, paddingVertical: t.space.xs },
}));
