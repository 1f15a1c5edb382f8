import { useEffect, useRef, useState } from 'react';
import { TextInput, View } from 'react-native';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { erase, typeSign, type TypedCode } from './typed-code';
import type { CompiledFormat } from '@/lib';

type CodeDisplayProps = {
  format: CompiledFormat;
  code: TypedCode;
  onChange: (text: string) => void;
  /** The Enter key. */
  onSubmit: () => void;
  /** Ids of the words that say what is expected and what is wrong. */
  describedBy: string;
};

/** Sizes of the code by its length in characters: short codes are read across the bench. */
const sizeOf = (length: number) => (length <= 8 ? 'answer' : length <= 16 ? 'codeLarge' : 'code');

/**
 * The code as it is typed, large, with a pencil mark where the next sign goes. A line to write on lies over it,
 * so that real keys, paste and a screen reader work; on a phone the keypad below takes the place of the phone's own.
 */
export function CodeDisplay({ format, code, onChange, onSubmit, describedBy }: CodeDisplayProps) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const input = useRef<TextInput>(null);
  const [focused, setFocused] = useState(false);
  const shown = code.text.length > 120 ? `${code.text.slice(0, 120)}…` : code.text;
  const variant = sizeOf(shown.length + code.ghost.length);
  useEffect(() => {
    if (!phone) (input.current as unknown as HTMLElement | null)?.focus({ preventScroll: true });
  }, [phone, format]);

  const type = (next: string) => {
    if (next.length === code.text.length + 1 && next.startsWith(code.text)) {
      return onChange(typeSign(format, code.text, next.slice(-1)));
    }
    if (next.length === code.text.length - 1 && code.text.startsWith(next)) return onChange(erase(format, code.text));
    onChange(next);
  };
  return (
    <View style={[styles.line, focused && styles.focused, code.prefix.reason !== null && styles.wrong]}>
      <View aria-hidden style={styles.shown}>
        <Text variant={variant}>
          {shown}
          <Text variant={variant} style={styles.ghost}>
            {code.ghost}
          </Text>
        </Text>
        <View style={[styles.cursor, variant === 'code' && styles.cursorSmall]} />
      </View>
      <TextInput
        ref={input}
        aria-label={`${format.name}: what the board reports`}
        aria-describedby={describedBy}
        aria-invalid={code.prefix.reason !== null || undefined}
        value={code.text}
        onChangeText={type}
        onSubmitEditing={onSubmit}
        submitBehavior="submit"
        inputMode="none"
        autoCapitalize="none"
        autoCorrect={false}
        autoComplete="off"
        spellCheck={false}
        caretHidden
        onFocus={() => setFocused(true)}
        onBlur={() => setFocused(false)}
        style={styles.input}
      />
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  line: {
    minHeight: t.text.answer.lineHeight + t.space.sm,
    justifyContent: 'flex-end',
    borderBottomWidth: t.line.heavy,
    borderBottomColor: t.colours.ink,
  },
  focused: { borderBottomColor: t.colours.pen },
  wrong: { borderBottomColor: t.colours.pencil },
  shown: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'flex-end',
    columnGap: t.space.sm,
    paddingBottom: t.space.xs,
    pointerEvents: 'none',
  },
  ghost: { color: t.colours.ruleStrong },
  cursor: { width: t.space.xxl, height: t.line.bar, marginBottom: t.space.md, backgroundColor: t.colours.pencil },
  cursorSmall: { width: t.space.lg, marginBottom: t.space.xs },
  input: {
    ...t.text.codeLarge,
    position: 'absolute',
    top: 0,
    bottom: 0,
    left: 0,
    right: 0,
    opacity: 0,
    cursor: 'text' as 'auto',
  },
}));
