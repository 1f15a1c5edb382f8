import { useMemo, useRef, useState, type Ref, useImperativeHandle } from 'react';
import { TextInput, View } from 'react-native';
import { makeStyles, useTheme } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { TextPlace } from './json-text';

/** What a list of problems asks of the text. */
export type TextAreaHandle = {
  /** Brings a place into sight, selects it and puts the cursor there. */ show: (place: TextPlace) => void;
};

type TextAreaProps = {
  label: string;
  value: string;
  onChange: (text: string) => void;
  describedBy?: string;
  invalid: boolean;
  ref?: Ref<TextAreaHandle>;
};

/** Lines that are in sight at once. */
const visibleLines = 18;

/** A tall field for a document, in fixed width, its lines numbered and never wrapped. */
export function TextArea({ label, value, onChange, describedBy, invalid, ref }: TextAreaProps) {
  const styles = useStyles();
  const { text: textStyles, colours, space } = useTheme();
  const input = useRef<TextInput>(null);
  const [scrolled, setScrolled] = useState(0);
  const numbers = useMemo(() => numbersOf(value), [value]);
  const { lineHeight } = textStyles.mono;
  useImperativeHandle(ref, () => ({
    show: ({ offset, length, line }) => {
      const field = input.current as unknown as HTMLTextAreaElement | null;
      if (field === null) return;
      field.focus({ preventScroll: true });
      field.setSelectionRange(offset, offset + Math.min(length, 200));
      field.scrollTop = Math.max(0, (line - visibleLines / 3) * lineHeight);
      field.scrollIntoView({ block: 'nearest' });
    },
  }));
  // The browser's own names: react-native knows neither the wrapping nor the scrolling of a field.
  const browser: object = {
    wrap: 'off',
    onScroll: ({ currentTarget }: { currentTarget: HTMLElement }) => setScrolled(currentTarget.scrollTop),
  };
  return (
    <View style={[styles.frame, invalid && styles.invalid]}>
      <View aria-hidden style={styles.gutter}>
        <Text variant="mono" tone="soft" align="right" style={{ marginTop: space.sm - scrolled }}>
          {numbers}
        </Text>
      </View>
      <TextInput
        ref={input}
        {...browser}
        aria-label={label}
        aria-describedby={describedBy}
        aria-invalid={invalid || undefined}
        multiline
        value={value}
        onChangeText={onChange}
        autoCapitalize="none"
        autoCorrect={false}
        spellCheck={false}
        autoComplete="off"
        selectionColor={colours.pencil}
        style={styles.input}
      />
    </View>
  );
}

function numbersOf(text: string): string {
  let lines = 1;
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) lines++;
  return Array.from({ length: lines }, (_, at) => at + 1).join('\n');
}

const useStyles = makeStyles((t) => ({
  frame: {
    flexDirection: 'row',
    height: visibleLines * t.text.mono.lineHeight + t.space.sm * 2,
    overflow: 'hidden',
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderColor: t.colours.rule,
    borderBottomWidth: t.line.ink,
    borderBottomColor: t.colours.ink,
  },
  invalid: { borderBottomColor: t.colours.pencil },
  gutter: {
    minWidth: t.target,
    paddingHorizontal: t.space.sm,
    overflow: 'hidden',
    backgroundColor: t.colours.faded,
    borderRightWidth: t.line.thin,
    borderRightColor: t.colours.rule,
  },
  input: {
    ...t.text.mono,
    flex: 1,
    minWidth: 0,
    padding: t.space.sm,
    color: t.colours.ink,
    // Lines of a document are longer than a phone is wide; wrapped, the numbers would not fit.
    whiteSpace: 'pre',
    overflow: 'scroll',
  } as object,
}));
