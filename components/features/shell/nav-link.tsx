import { Link } from 'expo-router';
import { useState } from 'react';
import { Pressable, StyleSheet } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import type { Place } from './places';

type NavLinkProps = {
  place: Place;
  current: boolean;
  /** head: in the header, with the red underline on its rule. foot: in the bar under the thumb. */
  where: 'head' | 'foot';
};

/** One place of the navigation; red underline under the current one. */
export function NavLink({ place, current, where }: NavLinkProps) {
  const styles = useStyles();
  const [hovered, setHovered] = useState(false);
  return (
    <Link href={place.href} asChild>
      <Pressable
        role="link"
        aria-current={current ? 'page' : undefined}
        onHoverIn={() => setHovered(true)}
        onHoverOut={() => setHovered(false)}
        style={StyleSheet.flatten([styles.link, styles[where], current ? styles.current : hovered && styles.hovered])}
      >
        <Text variant={current ? 'label' : where === 'foot' ? 'small' : 'body'} align="center">
          {place.label}
        </Text>
      </Pressable>
    </Link>
  );
}

const useStyles = makeStyles((t) => ({
  link: {
    minWidth: t.target,
    alignItems: 'center',
    justifyContent: 'center',
    borderColor: 'transparent',
  },
  head: {
    height: t.headerHeight.wide,
    paddingTop: t.line.underline,
    borderBottomWidth: t.line.underline,
  },
  foot: {
    // By the length of its word: five places fit on a phone only so.
    flexGrow: 1,
    flexShrink: 1,
    minHeight: t.headerHeight.phone - t.space.sm,
    paddingBottom: t.line.underline,
    borderTopWidth: t.line.underline,
  },
  current: { borderColor: t.colours.pencil },
  hovered: { borderColor: t.colours.ruleStrong },
}));
