import type { ReactNode } from 'react';
import { View } from 'react-native';
import { makeStyles, useBreakpoint } from '@/components/theme';

type SplitProps = {
  /** The sheet at the left, or above on a narrow window. */
  main: ReactNode;
  /** What stands beside it on the page, or under it. */
  aside: ReactNode;
  /** Names of both parts for a screen reader. */
  mainLabel: string;
  asideLabel: string;
};

/** A sheet with a narrower column beside it, ruled off; one under the other where the window is not wide. */
export function Split({ main, aside, mainLabel, asideLabel }: SplitProps) {
  const styles = useStyles();
  const breakpoint = useBreakpoint();
  const wide = breakpoint === 'wide';
  const room = breakpoint === 'phone' ? styles.roomPhone : styles.room;
  const sheet = (
    <View role="region" aria-label={mainLabel} style={[styles.main, wide && styles.mainWide, room]}>
      {main}
    </View>
  );
  const beside = (
    <View role="region" aria-label={asideLabel} style={[wide && styles.asideWide, styles.aside, room]}>
      {aside}
    </View>
  );
  return (
    <View style={[styles.split, wide && styles.splitWide]}>
      {sheet}
      {beside}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  split: { flexGrow: 1 },
  splitWide: { flexDirection: 'row', alignItems: 'stretch' },
  room: { padding: t.space.xl },
  roomPhone: { padding: t.space.lg },
  main: { gap: t.space.lg, minWidth: 0, backgroundColor: t.colours.sheet },
  mainWide: { flexBasis: 0, flexGrow: 62 },
  aside: { gap: t.space.xl, minWidth: 0 },
  asideWide: {
    flexBasis: 0,
    flexGrow: 38,
    borderLeftWidth: t.line.thin,
    borderLeftColor: t.colours.ruleStrong,
  },
}));
