import { Link as RouterLink, type Href } from 'expo-router';
import { useState, type ReactNode } from 'react';
import { Pressable, StyleSheet, type StyleProp, type ViewStyle } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from './text';

type ButtonKind = 'primary' | 'secondary' | 'plain' | 'quiet' | 'danger';

type Look = {
  /** What it does, in words; also its name for a screen reader. Never empty. */
  label: string;
  /**
   * primary: the one next thing. secondary: another way. plain: a tool among others.
   * quiet: words alone. danger: takes something away.
   */
  kind?: ButtonKind;
  /** A small drawing before the words; decoration only. */
  icon?: ReactNode;
  /** Draws the icon alone and keeps the label for a screen reader. */
  iconOnly?: boolean;
  /** Takes the whole width of its container. */
  wide?: boolean;
  /** A longer name for a screen reader, beginning with the visible label. */
  'aria-label'?: string;
  'aria-current'?: 'page';
  style?: StyleProp<ViewStyle>;
};

/** Props of Button. */
export type ButtonProps = Look & {
  onPress: () => void;
  disabled?: boolean;
  /** Work is under way: it cannot be pressed again, keeps the focus, and says so. */
  busy?: boolean;
  /** Words while busy; the label where nothing is said. */
  busyLabel?: string;
  /** For a button that stays pressed. */
  pressed?: boolean;
  'aria-expanded'?: boolean;
  'aria-controls'?: string;
  'aria-haspopup'?: 'dialog' | 'menu' | 'listbox';
};

/** A button. It cannot be made without a label. */
export function Button({ onPress, disabled = false, busy = false, busyLabel, pressed, ...look }: ButtonProps) {
  const styles = useStyles();
  const { label, kind = 'secondary', icon, iconOnly, wide, style, ...aria } = look;
  const words = busy ? (busyLabel ?? label) : label;
  return (
    <Pressable
      role="button"
      {...aria}
      aria-label={aria['aria-label'] ?? (iconOnly ? label : undefined)}
      aria-busy={busy || undefined}
      aria-pressed={pressed}
      aria-disabled={disabled || busy || undefined}
      disabled={disabled}
      onPress={() => {
        if (!busy) onPress();
      }}
      style={(state) => [
        frame(styles, { kind, held: Boolean(state.pressed || state.hovered), pressed, wide }),
        (disabled || busy) && styles.faded,
        style,
      ]}
    >
      {icon}
      {iconOnly ? null : (
        <Text variant={wordStyle(kind)} align="center" tone={wordTone({ kind, pressed, faded: disabled || busy })}>
          {words}
        </Text>
      )}
    </Pressable>
  );
}

/** A link that looks like a button: it goes somewhere, so it is a link for a screen reader and for a middle click. */
export function ButtonLink({ href, ...look }: Look & { href: Href }) {
  const styles = useStyles();
  const [hovered, setHovered] = useState(false);
  const { label, kind = 'secondary', icon, iconOnly, wide, style, ...aria } = look;
  // Through `asChild` a style goes as an object only; a style function would be dropped.
  return (
    <RouterLink href={href} asChild>
      <Pressable
        role="link"
        {...aria}
        aria-label={aria['aria-label'] ?? (iconOnly ? label : undefined)}
        onHoverIn={() => setHovered(true)}
        onHoverOut={() => setHovered(false)}
        style={StyleSheet.flatten([frame(styles, { kind, held: hovered, wide }), style])}
      >
        {icon}
        {iconOnly ? null : (
          <Text variant={wordStyle(kind)} align="center" tone={wordTone({ kind })}>
            {label}
          </Text>
        )}
      </Pressable>
    </RouterLink>
  );
}

type FrameState = { kind: ButtonKind; held: boolean; pressed?: boolean; wide?: boolean };

function frame(styles: ReturnType<typeof useStyles>, { kind, held, pressed, wide }: FrameState) {
  return [
    styles.frame,
    styles[kind],
    held && (kind === 'primary' ? styles.primaryHeld : styles.held),
    pressed && styles.primary,
    wide && styles.wide,
  ];
}

function wordStyle(kind: ButtonKind) {
  return kind === 'plain' ? 'small' : 'label';
}

function wordTone({ kind, pressed, faded }: { kind: ButtonKind; pressed?: boolean; faded?: boolean }) {
  if (faded) return 'soft';
  if (kind === 'primary' || pressed) return 'onInk';
  if (kind === 'danger') return 'pencil';
  return kind === 'quiet' ? 'pen' : 'ink';
}

const useStyles = makeStyles((t) => ({
  frame: {
    minHeight: t.target,
    minWidth: t.target,
    paddingHorizontal: t.space.lg,
    paddingVertical: t.space.sm,
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'center',
    gap: t.space.sm,
    borderWidth: t.line.thin,
    borderRadius: t.radius.md,
  },
  wide: { alignSelf: 'stretch' },
  primary: { backgroundColor: t.colours.ink, borderColor: t.colours.ink },
  primaryHeld: { opacity: 0.88 },
  secondary: { backgroundColor: t.colours.sheet, borderColor: t.colours.ink },
  plain: { backgroundColor: t.colours.sheet, borderColor: t.colours.ruleStrong, paddingHorizontal: t.space.md },
  quiet: { backgroundColor: 'transparent', borderColor: 'transparent', paddingHorizontal: t.space.sm },
  danger: { backgroundColor: t.colours.sheet, borderColor: t.colours.pencil },
  held: { backgroundColor: t.colours.faded },
  faded: { backgroundColor: t.colours.faded, borderColor: t.colours.ruleStrong, cursor: 'auto' },
}));
