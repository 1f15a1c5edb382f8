import { View } from 'react-native';
import { makeStyles, sticky } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Keypad } from './keypad';
import { erase, press } from './typed-code';
import { aliasTab, signTab, supplyTab } from './entry-tabs';
import type { Entry } from './use-entry';

/** What the way on is called where it leads to no chip by itself. */
const ways: Readonly<Record<string, string>> = {
  [signTab]: 'Use this sign',
  [supplyTab]: 'Use this value',
  [aliasTab]: 'Use this pair',
};

/** The keys under the thumb: those of the format, erase, and the way to the answer. */
export function CodeKeys({ entry, atFoot }: { entry: Entry; atFoot: boolean }) {
  const styles = useStyles();
  const { compiled, code, ready, tab } = entry;
  const listing = entry.lists && !entry.editing;
  const empty = entry.text === '';
  return (
    <View style={[styles.keys, atFoot && styles.atFoot]}>
      {compiled !== null && code !== null ? (
        <Keypad keys={code.prefix.keys} onKey={(key) => entry.setCode(press(compiled, code.text, key))} />
      ) : null}
      <View style={styles.row}>
        <View style={styles.cell}>
          <Button
            wide
            label={code === null ? 'Clear' : 'Erase'}
            disabled={empty}
            onPress={() => {
              if (compiled !== null && code !== null) entry.setCode(erase(compiled, code.text));
              else entry.setText('');
            }}
          />
        </View>
        {listing ? (
          <View style={styles.cell}>
            <Button
              wide
              label={tab === supplyTab ? 'Next pin' : 'Next line'}
              disabled={ready === null}
              onPress={() => entry.submit('more')}
            />
          </View>
        ) : null}
        <View style={styles.cell}>
          <Button
            wide
            kind="primary"
            label={entry.editing ? 'Keep' : (ways[tab] ?? 'Find the chip')}
            disabled={ready === null}
            onPress={() => entry.submit('answer')}
          />
        </View>
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  keys: { gap: t.space.sm },
  atFoot: {
    position: sticky,
    bottom: t.space.none,
    zIndex: t.layer.header,
    marginTop: 'auto',
    marginHorizontal: -t.space.lg,
    paddingHorizontal: t.space.lg,
    paddingVertical: t.space.md,
    backgroundColor: t.colours.paper,
    borderTopWidth: t.line.ink,
    borderTopColor: t.colours.ink,
  },
  row: { flexDirection: 'row', gap: t.space.sm },
  cell: { flexGrow: 1, flexShrink: 1, flexBasis: 'auto' },
}));
