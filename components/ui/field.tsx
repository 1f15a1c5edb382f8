import { useId, useState, type ReactNode, type Ref } from 'react';
import { TextInput, View, type TextInputProps } from 'react-native';
import { makeStyles, useTheme } from '@/components/theme';
import { createDomElement } from './dom-element';
import { Text } from './text';

/** Props of Field. */
export type FieldProps = Omit<TextInputProps, 'style' | 'placeholder' | 'editable' | 'id'> & {
  label: string;
  /** What is expected, always in sight under the label. */
  hint?: string;
  /** What is wrong, in words; shown under the field and tied to it. */
  error?: string;
  /** Says "(optional)" beside the label. */
  optional?: boolean;
  disabled?: boolean;
  /** Codes and socket labels: fixed width, no correction, no capital put in. */
  mono?: boolean;
  /** A control at the end of the field's line: show the password, clear. */
  trailing?: ReactNode;
  ref?: Ref<TextInput>;
};

/** A line to write on: label over it, hint and error tied to it. */
export function Field({
  label,
  hint,
  error,
  optional,
  disabled,
  mono,
  trailing,
  ref,
  onFocus,
  onBlur,
  ...input
}: FieldProps) {
  const styles = useStyles();
  const { colours } = useTheme();
  const [focused, setFocused] = useState(false);
  const id = useId();
  const hintId = `${id}-hint`;
  const errorId = `${id}-error`;
  const describedBy = [error && errorId, hint && hintId].filter(Boolean).join(' ') || undefined;
  return (
    <View style={styles.field}>
      {createDomElement('label', {
        htmlFor: id,
        style: styles.label,
        children: (
          <>
            <Text variant="label">{label}</Text>
            {optional ? (
              <Text variant="small" tone="soft">
                {' (optional)'}
              </Text>
            ) : null}
          </>
        ),
      })}
      <View
        style={[
          styles.line,
          focused && styles.lineFocused,
          error !== undefined && styles.lineWrong,
          disabled && styles.lineDisabled,
        ]}
      >
        <TextInput
          {...(mono ? { autoCapitalize: 'none', autoCorrect: false, spellCheck: false } : {})}
          {...input}
          ref={ref}
          id={id}
          readOnly={disabled ?? input.readOnly}
          aria-disabled={disabled || undefined}
          aria-invalid={error !== undefined || undefined}
          aria-describedby={describedBy}
          selectionColor={colours.pencil}
          style={[styles.input, mono && styles.mono, input.multiline && styles.multiline]}
          onFocus={(event) => {
            setFocused(true);
            onFocus?.(event);
          }}
          onBlur={(event) => {
            setFocused(false);
            onBlur?.(event);
          }}
        />
        {trailing}
      </View>
      {error === undefined ? null : (
        <Text id={errorId} variant="smallStrong" tone="pencil">
          {error}
        </Text>
      )}
      {hint === undefined ? null : (
        <Text id={hintId} variant="small" tone="soft">
          {hint}
        </Text>
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  field: { gap: t.space.xs },
  label: { alignSelf: 'flex-start' },
  line: {
    minHeight: t.target,
    flexDirection: 'row',
    alignItems: 'center',
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderColor: t.colours.rule,
    borderBottomWidth: t.line.ink,
    borderBottomColor: t.colours.ink,
  },
  lineFocused: { borderBottomColor: t.colours.pen },
  lineWrong: { borderBottomColor: t.colours.pencil },
  lineDisabled: { backgroundColor: t.colours.faded, borderBottomColor: t.colours.ruleStrong },
  input: {
    ...t.text.body,
    flex: 1,
    minWidth: 0,
    minHeight: t.target,
    paddingHorizontal: t.space.md,
    paddingVertical: t.space.sm,
    color: t.colours.ink,
  },
  mono: t.text.code,
  multiline: { minHeight: t.target * 2 },
}));
