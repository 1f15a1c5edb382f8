import { useId, type ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Rule } from './rule';
import { Text } from './text';

type PanelProps = {
  title: string;
  /** Level of its title in the page, 2 where nothing is said. */
  level?: 2 | 3;
  /** Small words under the title. */
  note?: string;
  /** Buttons at the end of the title's line. */
  actions?: ReactNode;
  children: ReactNode;
  style?: StyleProp<ViewStyle>;
};

/** A part of a page under its own title and ink rule; a landmark with the title's name. */
export function Panel({ title, level = 2, note, actions, children, style }: PanelProps) {
  const styles = useStyles();
  const titleId = useId();
  return (
    <View role="region" aria-labelledby={titleId} style={[styles.panel, style]}>
      <View style={styles.head}>
        <View style={styles.words}>
          <Text id={titleId} variant="heading" level={level}>
            {title}
          </Text>
          {note === undefined ? null : (
            <Text variant="small" tone="soft">
              {note}
            </Text>
          )}
        </View>
        {actions === undefined ? null : <View style={styles.actions}>{actions}</View>}
      </View>
      <Rule weight="strong" />
      {children}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  panel: { gap: t.space.sm },
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'flex-end',
    justifyContent: 'space-between',
    gap: t.space.sm,
  },
  words: { flexGrow: 1, flexShrink: 1 },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
