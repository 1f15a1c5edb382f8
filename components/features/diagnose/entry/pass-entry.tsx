import { useState } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Chip } from '@/components/ui/chip';
import { Text } from '@/components/ui/text';
import type { LayoutDocument } from '@/shared';

/** The test ended without a failure, of all banks or of some. */
export function PassEntry({ document, onPass }: { document: LayoutDocument; onPass: (banks?: string[]) => void }) {
  const styles = useStyles();
  const [chosen, setChosen] = useState<readonly string[]>([]);
  const { banks } = document.memory;
  const toggle = (id: string) =>
    setChosen(chosen.includes(id) ? chosen.filter((other) => other !== id) : [...chosen, id]);
  return (
    <View style={styles.all}>
      <Text>The test ran to its end and reported no failure.</Text>
      {banks.length > 1 ? (
        <>
          <Text variant="small" tone="soft">
            Only some banks? Choose the ones that passed.
          </Text>
          <View style={styles.row}>
            {banks.map(({ id }) => (
              <Chip key={id} label={`Bank ${id}`} selected={chosen.includes(id)} onPress={() => toggle(id)} />
            ))}
          </View>
        </>
      ) : null}
      <Button
        kind="primary"
        label={
          chosen.length === 0
            ? 'Everything passed'
            : `${chosen.length === 1 ? 'Bank' : 'Banks'} ${chosen.join(', ')} passed`
        }
        onPress={() => onPass(chosen.length === 0 ? undefined : [...chosen])}
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  all: { gap: t.space.md },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
