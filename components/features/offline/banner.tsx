import type { ReactNode } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';

type BannerProps = {
  title: string;
  words: string;
  /** mark: take care. pen: a remark. */
  tone: 'mark' | 'pen';
  children?: ReactNode;
};

/** A strip under the head of every page. */
export function Banner({ title, words, tone, children }: BannerProps) {
  const styles = useStyles();
  return (
    <View style={[styles.banner, styles[tone]]}>
      <Text variant="smallStrong" tone={tone}>
        {title}
      </Text>
      <Text variant="small">{words}</Text>
      {children === undefined ? null : <View style={styles.actions}>{children}</View>}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  banner: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'center',
    columnGap: t.space.md,
    paddingHorizontal: t.space.lg,
    paddingVertical: t.space.sm,
    backgroundColor: t.colours.sheet,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.ruleStrong,
    borderLeftWidth: t.line.bar,
  },
  mark: { borderLeftColor: t.colours.mark },
  pen: { borderLeftColor: t.colours.pen },
  actions: { flexDirection: 'row', gap: t.space.sm },
}));
