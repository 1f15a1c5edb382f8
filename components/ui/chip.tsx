import { Pressable } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from './text';

/** Props of Chip. */
export type ChipProps = {
  label: string;
  onPress: () => void;
  /** For a chip that stays on: a filter. Leave out for one that only acts. */
  selected?: boolean;
  disabled?: boolean;
  'aria-label'?: string;
};

/** A small button in a row of its like: a filter, a recent board. */
export function Chip({ label, onPress, selected, disabled, ...aria }: ChipProps) {
  const styles = useChipStyles();
  return (
    <Pressable
      role="button"
      {...aria}
      aria-pressed={selected}
      disabled={disabled}
      onPress={onPress}
      style={(state) => [
        styles.chip,
        (state.hovered || state.pressed) && styles.held,
        selected && styles.selected,
        disabled && styles.faded,
      ]}
    >
      <Text variant={selected ? 'smallStrong' : 'small'} tone={selected ? 'onInk' : disabled ? 'soft' : 'ink'}>
        {label}
      </Text>
    </Pressable>
  );
}

/** The look of a chip, shared with the segmented control. */
export const useChipStyles = makeStyles((t) => ({
  row: { flexDirection: 'row', flexWrap: 'wrap', flexShrink: 1, maxWidth: '100%', gap: t.space.sm },
  chip: {
    minHeight: t.target,
    minWidth: t.target,
    paddingHorizontal: t.space.md,
    alignItems: 'center',
    justifyContent: 'center',
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderColor: t.colours.ruleStrong,
    borderRadius: t.radius.md,
  },
  held: { borderColor: t.colours.ink },
  selected: { backgroundColor: t.colours.ink, borderColor: t.colours.ink },
  outlined: { borderColor: t.colours.ink },
  faded: { backgroundColor: t.colours.faded },
}));
