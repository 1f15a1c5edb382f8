import { Link as RouterLink, type Href } from 'expo-router';
import type { ReactNode } from 'react';
import type { StyleProp, TextStyle } from 'react-native';
import { useTheme, type TextVariant } from '@/components/theme';

type LinkProps = {
  href: Href;
  children: ReactNode;
  /** Style of the words; the same as the text around it where nothing is said. */
  variant?: TextVariant;
  /** Stands by itself, so its place to tap is full size. */
  standalone?: boolean;
  'aria-label'?: string;
  style?: StyleProp<TextStyle>;
};

/** A link in running words: pen blue and underlined, so that it does not rest on colour alone. */
export function Link({ href, children, variant = 'strong', standalone = false, style, ...rest }: LinkProps) {
  const { colours, text, target, space } = useTheme();
  const tall = standalone
    ? { display: 'flex' as const, minHeight: target, paddingVertical: (target - text[variant].lineHeight) / 2 }
    : null;
  return (
    <RouterLink
      href={href}
      {...rest}
      style={[
        text[variant],
        { color: colours.pen, textDecorationLine: 'underline', borderRadius: space.hair },
        tall,
        style,
      ]}
    >
      {children}
    </RouterLink>
  );
}
