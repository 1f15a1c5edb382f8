import { Pressable, View } from 'react-native';
import { useChipStyles } from './chip';
import { Text } from './text';
import { useRovingFocus } from './use-roving-focus';

/** One of the choices of a segmented control or of tabs. */
export type Choice<Value extends string> = { value: Value; label: string; disabled?: boolean };

/** Props of SegmentedControl. */
export type SegmentedControlProps<Value extends string> = {
  /** What is being chosen, for a screen reader. */
  label: string;
  options: readonly Choice<Value>[];
  value: Value;
  onChange: (value: Value) => void;
  /** filled: the choice in ink, for what a page turns on. outlined: an ink edge, for what stands back. */
  kind?: 'filled' | 'outlined';
};

/** One choice of a few, all in sight: a radio group drawn as chips. */
export function SegmentedControl<Value extends string>({
  label,
  options,
  value,
  onChange,
  kind = 'filled',
}: SegmentedControlProps<Value>) {
  const styles = useChipStyles();
  const index = options.findIndex((option) => option.value === value);
  const choose = (at: number) => {
    const option = options[at];
    if (option && !option.disabled) onChange(option.value);
  };
  const roving = useRovingFocus({ count: options.length, index, move: choose });
  return (
    <View role="radiogroup" aria-label={label} style={styles.row} onKeyDown={roving.onKeyDown}>
      {options.map((option, at) => {
        const selected = at === index;
        return (
          <Pressable
            key={option.value}
            ref={roving.itemRef(at)}
            role="radio"
            aria-checked={selected}
            disabled={option.disabled}
            tabIndex={selected || (index < 0 && at === 0) ? 0 : -1}
            onPress={() => choose(at)}
            style={(state) => [
              styles.chip,
              (state.hovered || state.pressed) && styles.held,
              selected && (kind === 'filled' ? styles.selected : styles.outlined),
              option.disabled && styles.faded,
            ]}
          >
            <Text
              variant={selected ? 'smallStrong' : 'small'}
              tone={selected && kind === 'filled' ? 'onInk' : option.disabled ? 'soft' : 'ink'}
            >
              {option.label}
            </Text>
          </Pressable>
        );
      })}
    </View>
  );
}
