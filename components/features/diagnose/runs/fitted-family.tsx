import { useMemo } from 'react';
import { View } from 'react-native';
import { familyChoice } from '@/components/features/parts/family-words';
import { FitNote } from '@/components/features/parts/fit-note';
import { makeStyles } from '@/components/theme';
import { SelectField } from '@/components/ui/select-field';
import { Text } from '@/components/ui/text';
import { builtInFamilies, findFamily, railsAtSocket } from '@/lib';
import type { ChipFamily } from '@/shared';
import type { Bench } from '../bench';

type FittedFamilyProps = {
  bench: Bench;
  /** As it is written so far; nothing is asked before it is a socket of the board. */
  socket: string;
  family: string | undefined;
  /** Undefined for the family of the socket. */
  onFamily: (family: string | undefined) => void;
};

/** Which family the fitted chip is of, and at once whether the socket bears it: before it is pushed in. */
export function FittedFamily({ bench, socket, family, onFamily }: FittedFamilyProps) {
  const styles = useStyles();
  const { document, index } = bench;
  const at = index.socketByLabel.get(socket);
  const own = at === undefined ? null : (index.familyOfSocket[at] ?? null);
  const rails = useMemo(() => railsAtSocket(document.rails, socket), [document, socket]);
  const others = useMemo(() => otherFamilies(bench, own), [bench, own]);
  if (at === undefined) return null;
  const same = own === null ? 'as the socket' : `as the socket: ${familyChoice(own)}`;
  const fitted = family === undefined ? null : findFamily(document, family);
  return (
    <View style={styles.all}>
      <SelectField
        label="Family of the chip"
        options={[
          { value: '', label: same },
          ...others.map((other) => ({ value: other.id, label: familyChoice(other) })),
        ]}
        value={family ?? ''}
        onChange={(chosen) => onFamily(chosen === '' ? undefined : chosen)}
      />
      {fitted === null ? null : own === null ? (
        <Text variant="small" tone="soft">
          Nobody has described what this socket is wired for, so nobody can tell whether it fits. Compare the data
          sheets.
        </Text>
      ) : (
        <FitNote socketFamily={own} fittedFamily={fitted} rails={rails} />
      )}
    </View>
  );
}

/** Every family but the socket's own: those of the layout first, then the known ones. */
function otherFamilies({ document }: Bench, own: ChipFamily | null): ChipFamily[] {
  const described = new Set(document.families.map(({ id }) => id));
  const all = [...document.families, ...builtInFamilies.filter(({ id }) => !described.has(id))];
  return all.filter(({ id }) => id !== own?.id);
}

const useStyles = makeStyles((t) => ({ all: { gap: t.space.sm } }));
