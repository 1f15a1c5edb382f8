import type { ReactNode } from 'react';
import {
  StyleSheet,
  Text as NativeText,
  type StyleProp,
  type TextProps as NativeTextProps,
  type TextStyle,
} from 'react-native';
import { useTheme, type Colours, type TextVariant } from '@/components/theme';

type Level = 1 | 2 | 3 | 4;

/** Props of Text. */
export type TextProps = Pick<NativeTextProps, 'id' | 'numberOfLines' | 'selectable' | 'testID' | 'role'> & {
  children: ReactNode;
  variant?: TextVariant;
  /** Colour by its meaning; ink where nothing is said. Inside another Text, that one's colour. */
  tone?: keyof Colours;
  /** Makes it a heading of this level. `title`, `heading` and `subheading` are levels 1, 2 and 3; null: no heading. */
  level?: Level | null;
  align?: 'left' | 'center' | 'right';
  style?: StyleProp<TextStyle>;
  'aria-hidden'?: boolean;
  'aria-label'?: string;
  'aria-live'?: 'polite' | 'assertive' | 'off';
  tabIndex?: 0 | -1;
};

const defaultLevel: Partial<Record<TextVariant, Level>> = { display: 1, title: 1, heading: 2, subheading: 3 };

const breaks = StyleSheet.create({
  // A label or code of fifty characters must wrap inside its cell, not push the page sideways.
  anywhere: { overflowWrap: 'anywhere' } as TextStyle,
});

/** Words in one of the theme's styles; a heading where the style is one. */
export function Text({ variant = 'body', tone = 'ink', level, align, style, children, ...rest }: TextProps) {
  const { colours, text } = useTheme();
  const headingLevel = level === undefined ? defaultLevel[variant] : level;
  const heading = headingLevel ? { role: 'heading' as const, 'aria-level': headingLevel } : {};
  return (
    <NativeText
      {...heading}
      {...rest}
      style={[text[variant], breaks.anywhere, { color: colours[tone], textAlign: align }, style]}
    >
      {children}
    </NativeText>
  );
}
