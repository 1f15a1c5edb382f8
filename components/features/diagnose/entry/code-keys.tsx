import { View } from 'react-native';
import { makeStyles, sticky } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Keypad } from './keypad';
import { erase, press } from './typed-code';
import { noBits } from './failing-bits';
import type { Entry } from './use-entry';

/** The keys under the thumb: those of the format, erase, and the way to the answer. */
export function CodeKeys({ entry, atFoot }: { entry: Entry; atFoot: boolean }) {
  const styles = useStyles();
  const { format, code, ready } = entry;
  const listing = entry.lists && !entry.editing;
  const empty = code === null ? entry.bits.failing.length === 0 : code.text === '';
  return (
    <View style={[styles.keys, atFoot && styles.atFoot]}>
      {format !== null && code !== null ? (
        <Keypad keys={code.prefix.keys} onKey={(key) => entry.setCode(press(format.compiled, code.text, key))} />
      ) : null}
      <View style={styles.row}>
        <View style={styles.cell}>
          <Button
            wide
            label={code === null ? 'Clear' : 'Erase'}
            disabled={empty}
            onPress={() => {
              if (format !== null && code !== null) entry.setCode(erase(format.compiled, code.text));
              else entry.setBits(noBits);
            }}
          />
        </View>
        {listing ? (
          <View style={styles.cell}>
            <Button wide label="Next line" disabled={ready === null} onPress={() => entry.submit('more')} />
          </View>
        ) : null}
        <View style={styles.cell}>
          <Button
            wide
            kind="primary"
            label={entry.editing ? 'Keep' : 'Find the chip'}
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
