import { useId } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { createDomElement } from './dom-element';
import { Text } from './text';

type SelectFieldProps = {
  label: string;
  /** What can be chosen; the value '' stands for no choice. */
  options: readonly { value: string; label: string }[];
  value: string;
  onChange: (value: string) => void;
  disabled?: boolean;
};

/** One choice of many, folded away: the browser's own list, which every phone and screen reader knows. */
export function SelectField({ label, options, value, onChange, disabled = false }: SelectFieldProps) {
  const styles = useStyles();
  const id = useId();
  return (
    <View style={styles.field}>
      {createDomElement('label', {
        htmlFor: id,
        style: styles.label,
        children: (
          <Text variant="small" tone="soft">
            {label}
          </Text>
        ),
      })}
      {createDomElement('select', {
        id,
        value,
        disabled,
        onChange: (event: { target: { value: string } }) => onChange(event.target.value),
        style: [styles.select, value !== '' && styles.chosen],
        children: options.map((option) =>
          createDomElement('option', { key: option.value, value: option.value, children: option.label }),
        ),
      })}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  field: { gap: t.space.hair },
  label: { alignSelf: 'flex-start' },
  select: {
    ...t.text.body,
    width: '100%',
    minHeight: t.target,
    paddingHorizontal: t.space.sm,
    color: t.colours.ink,
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderStyle: 'solid',
    borderColor: t.colours.ruleStrong,
    borderRadius: t.radius.md,
  },
  chosen: { ...t.text.strong, borderColor: t.colours.ink },
}));
