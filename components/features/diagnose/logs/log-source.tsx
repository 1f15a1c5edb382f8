import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { createDomElement } from '@/components/ui/dom-element';
import { FileButton } from '@/components/ui/file-button';
import { Field } from '@/components/ui/field';
import { Text } from '@/components/ui/text';
import type { LogSource } from './log-store';

type LogSourceProps = {
  problem: string | null;
  onTake: (source: LogSource) => void;
};

type Dragged = { preventDefault: () => void; dataTransfer: DataTransfer };

/** Where a log comes from: a file that is chosen or dropped here, or lines that are pasted. */
export function LogSourceChoice({ problem, onTake }: LogSourceProps) {
  const styles = useStyles();
  const [over, setOver] = useState(false);
  const takeFile = (file: File) => onTake({ blob: file, name: file.name });
  const area = (
    <View style={[styles.area, over && styles.over]}>
      <Text variant="strong">{over ? 'Let go to read it' : 'A file of the memory test'}</Text>
      <Text variant="small" tone="soft">
        Text, or text packed as gzip, up to 1 GB. It is read on this device and not sent anywhere. It can be dropped
        here.
      </Text>
      <View style={styles.row}>
        <FileButton kind="primary" label="Choose a log file" inputLabel="Log as a file" onFile={takeFile} />
      </View>
    </View>
  );
  return (
    <View style={styles.all}>
      {problem === null ? null : (
        <Text role="alert" variant="smallStrong" tone="pencil">
          {problem}
        </Text>
      )}
      {createDomElement('div', {
        onDragOver: (event: Dragged) => {
          event.preventDefault();
          setOver(true);
        },
        onDragLeave: () => setOver(false),
        onDrop: (event: Dragged) => {
          event.preventDefault();
          setOver(false);
          const file = event.dataTransfer.files[0];
          if (file) takeFile(file);
        },
        children: area,
      })}
      <Pasted onTake={onTake} />
    </View>
  );
}

function Pasted({ onTake }: Pick<LogSourceProps, 'onTake'>) {
  const styles = useStyles();
  const [text, setText] = useState('');
  const empty = text.trim() === '';
  return (
    <View style={styles.pasted}>
      <Field mono multiline numberOfLines={4} label="Or paste lines of it" value={text} onChangeText={setText} />
      <View style={styles.row}>
        <Button
          label="Take these lines"
          disabled={empty}
          onPress={() => onTake({ blob: new Blob([text], { type: 'text/plain' }), name: 'Pasted lines' })}
        />
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.lg },
  area: {
    gap: t.space.sm,
    padding: t.space.lg,
    borderWidth: t.line.ink,
    borderStyle: 'dashed',
    borderColor: t.colours.ruleStrong,
    borderRadius: t.radius.md,
    backgroundColor: t.colours.sheet,
  },
  over: { borderColor: t.colours.pen, backgroundColor: t.colours.faded },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
  pasted: { gap: t.space.sm },
}));
