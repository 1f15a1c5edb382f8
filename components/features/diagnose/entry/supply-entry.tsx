import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Field } from '@/components/ui/field';
import { Text } from '@/components/ui/text';
import { supplyPins } from '@/lib';
import type { Bench } from '../bench';
import { readVolts, voltWords } from '../volt-words';
import { ChoiceList } from './choice-list';
import { readSupply, writeSupply, type SupplyDraft } from './small-drafts';
import { SocketField } from './socket-field';
import { limitWords, verdictOf } from './supply-words';

type SupplyEntryProps = { bench: Bench; text: string; onChange: (text: string) => void };

/** Volts at a supply pin of a socket, with what should be there; says at once when they are out of their limits. */
export function SupplyEntry({ bench, text, onChange }: SupplyEntryProps) {
  const styles = useStyles();
  const draft = readSupply(text);
  const socket = draft.socket.trim();
  const known = bench.index.socketByLabel.has(socket);
  const pins = known ? supplyPins(bench.index, socket) : [];
  const set = (next: Partial<SupplyDraft>) => onChange(writeSupply({ ...draft, ...next }));
  return (
    <View style={styles.all}>
      <Text variant="small" tone="soft">
        Measure with the power on, against 0 V, at the leg of the chip. Do not let the tip slip: it joins two pins.
      </Text>
      <SocketField bench={bench} label="Socket" value={draft.socket} onChange={(next) => set({ socket: next })} />
      {pins.length > 0 ? (
        <ChoiceList
          label={`Supply pins of ${socket}`}
          lines={pins.map((pin) => ({
            value: String(pin.pin),
            label: `Pin ${pin.pin}: ${pin.name}`,
            help: `${voltWords(pin.volts)} expected, ${limitWords(pin)} allowed`,
          }))}
          value={draft.pin}
          onChange={(pin) => set({ pin })}
        />
      ) : known ? (
        <Field
          label="Pin"
          hint="Nothing describes the pins of this socket."
          inputMode="numeric"
          value={draft.pin}
          onChangeText={(pin) => set({ pin })}
        />
      ) : null}
      {known ? <Volts draft={draft} pins={pins} onChange={(volts) => set({ volts })} /> : null}
    </View>
  );
}

type VoltsProps = {
  draft: SupplyDraft;
  pins: ReturnType<typeof supplyPins>;
  onChange: (volts: string) => void;
};

function Volts({ draft, pins, onChange }: VoltsProps) {
  const measured = readVolts(draft.volts);
  const pin = pins.find((one) => String(one.pin) === draft.pin);
  const verdict = pin === undefined || measured === null ? null : verdictOf(pin, measured);
  const wrong = draft.volts.trim() !== '' && measured === null;
  return (
    <View>
      <Field
        mono
        label="Volts measured"
        inputMode="decimal"
        value={draft.volts}
        onChangeText={onChange}
        error={wrong ? 'Write a number of volts up to 100, such as 4.72 or −5.' : undefined}
      />
      <View role="status">
        {verdict === null ? null : (
          <Text variant="smallStrong" tone={verdict.bad ? 'pencil' : 'tick'}>
            {verdict.words}
          </Text>
        )}
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({ all: { gap: t.space.md } }));
