import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { useAnnouncer } from '@/components/ui/announcer';
import { Button, ButtonLink } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Tabs } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';

const kinds = ['primary', 'secondary', 'plain', 'quiet', 'danger'] as const;
const ways = [
  { value: 'code', label: 'Lamp code' },
  { value: 'readings', label: 'Readings' },
  { value: 'log', label: 'Log', disabled: true },
] as const;

type Way = (typeof ways)[number]['value'];

/** Everything that is pressed or written on. */
export function ControlSamples() {
  const styles = useStyles();
  const { toast } = useAnnouncer();
  const [way, setWay] = useState<Way>('code');
  const [on, setOn] = useState(true);
  const [open, setOpen] = useState(false);
  const nothing = () => undefined;
  return (
    <>
      {kinds.map((kind) => (
        <View key={kind} style={styles.row}>
          <Button kind={kind} label={kind} onPress={nothing} />
          <Button kind={kind} label="Disabled" disabled onPress={nothing} />
          <Button kind={kind} label="Save" busy busyLabel="Saving…" onPress={nothing} />
          <ButtonLink kind={kind} label="Link" href="/gallery" />
        </View>
      ))}
      <View style={styles.row}>
        <Button label="Solder side" pressed={on} onPress={() => setOn(!on)} />
        <Chip label="Filter" selected={on} onPress={() => setOn(!on)} />
        <Chip label="Recent board" onPress={nothing} />
        <Chip label="Cannot" disabled onPress={nothing} />
      </View>
      <SegmentedControl label="Way of reporting" options={ways} value={way} onChange={setWay} />
      <Tabs label="Parts" tabs={ways} value={way} onChange={setWay}>
        <Text>{`The panel of ${way}.`}</Text>
      </Tabs>
      <Field label="Board" hint="Maker, name or label on the board." defaultValue="Tarnvall" />
      <Field label="Code" mono error="Bank E is not on this board: A to D." defaultValue="E5" />
      <Field
        label="Remark"
        optional
        multiline
        defaultValue="Two lines of words that somebody wrote here, long enough to wrap at the edge of the field."
      />
      <Field label="Locked" disabled defaultValue="cannot be changed" />
      <View style={styles.row}>
        <Button label="Open a dialog" onPress={() => setOpen(true)} />
        <Button label="Show a toast" onPress={() => toast({ text: 'Saved on this device.', kind: 'good' })} />
        <Button
          label="Toast with action"
          onPress={() => toast({ text: 'Run 2 removed.', action: { label: 'Undo', onPress: nothing } })}
        />
      </View>
      <Dialog
        open={open}
        title="Remove run 2?"
        onClose={() => setOpen(false)}
        actions={<Button kind="danger" label="Remove the run" onPress={() => setOpen(false)} />}
      >
        <Text>Its three readings go with it.</Text>
      </Dialog>
    </>
  );
}

const useStyles = makeStyles((t) => ({ row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm } }));
