import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import { makeStyles, ruledPaper, useBreakpoint } from '@/components/theme';
import { Text } from './text';
import { useDocumentTitle } from './use-document-title';

/** Props of Page. */
export type PageProps = {
  /** Name of the page in the tab, and its first heading. */
  title: string;
  /** Keeps the title for the tab; the page then brings a level 1 heading of its own. */
  hideTitle?: boolean;
  /** Small words over the title: where this belongs. */
  over?: string;
  /** Words under the title. */
  lead?: string;
  /** Buttons at the end of the title's line. */
  actions?: ReactNode;
  /** Greatest width: a form, a column of prose, the page, or edge to edge without padding. */
  width?: 'form' | 'prose' | 'page' | 'full';
  children: ReactNode;
  style?: StyleProp<ViewStyle>;
};

/**
 * A page's frame: its title in the tab and on the sheet, its width, and room around it.
 * On a wide window a form or a column of prose is a sheet at the left of ruled paper.
 */
export function Page({ title, hideTitle, over, lead, actions, width = 'page', children, style }: PageProps) {
  const styles = useStyles();
  const breakpoint = useBreakpoint();
  const phone = breakpoint === 'phone';
  const column = width === 'form' || width === 'prose';
  useDocumentTitle(title);
  const content = (
    <View style={[styles.frame, width !== 'full' && (phone ? styles.roomPhone : styles.room), styles[width], style]}>
      {hideTitle ? null : (
        <View style={styles.head}>
          <View style={styles.words}>
            {over === undefined ? null : (
              <Text variant="fine" tone="soft">
                {over}
              </Text>
            )}
            <Text variant={phone ? 'title' : 'display'} level={1}>
              {title}
            </Text>
            {lead === undefined ? null : <Text tone="soft">{lead}</Text>}
          </View>
          {actions === undefined ? null : <View style={styles.actions}>{actions}</View>}
        </View>
      )}
      {children}
    </View>
  );
  if (!column || phone) return content;
  return (
    <View style={styles.ruled}>
      <View style={styles.column}>{content}</View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  frame: { width: '100%', gap: t.space.lg },
  room: { paddingHorizontal: t.space.xl, paddingVertical: t.space.xl, gap: t.space.xl },
  roomPhone: { paddingHorizontal: t.space.lg, paddingVertical: t.space.lg },
  form: { width: t.measure.form + t.space.xl * 2, maxWidth: '100%' },
  prose: { width: t.measure.prose + t.space.xl * 2, maxWidth: '100%' },
  page: { maxWidth: t.measure.page },
  full: { gap: t.space.none, flexGrow: 1 },
  ruled: {
    flexGrow: 1,
    flexDirection: 'row',
    ...ruledPaper(t),
  },
  column: {
    flexShrink: 1,
    backgroundColor: t.colours.sheet,
    borderRightWidth: t.line.thin,
    borderRightColor: t.colours.ruleStrong,
  },
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'flex-end',
    justifyContent: 'space-between',
    gap: t.space.md,
  },
  words: { flexShrink: 1, gap: t.space.xs },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm },
}));
