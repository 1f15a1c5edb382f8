import type { ReactNode } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from './button';
import { Text } from './text';

/** Props of Notice. */
export type NoticeProps = {
  /** info: a remark. good: done. warning: take care. problem: something is wrong. */
  kind?: 'info' | 'good' | 'warning' | 'problem';
  title?: string;
  children?: ReactNode;
  action?: ReactNode;
  /** Shows a button that puts the notice away. */
  onDismiss?: () => void;
  /** Read out when it appears; for what comes as an answer to something the person did. */
  live?: boolean;
};

/** A slip laid on the page: a caution, a remark, the outcome of something. Its kind is said in words, its bar only repeats it. */
export function Notice({ kind = 'info', title, children, action, onDismiss, live = false }: NoticeProps) {
  const styles = useStyles();
  const role = live ? (kind === 'problem' ? 'alert' : 'status') : 'note';
  return (
    <View role={role} style={[styles.notice, styles[kind]]}>
      <View style={styles.words}>
        {title === undefined ? null : <Text variant="strong">{title}</Text>}
        {typeof children === 'string' ? <Text variant="small">{children}</Text> : children}
        {action === undefined ? null : <View style={styles.action}>{action}</View>}
      </View>
      {onDismiss === undefined ? null : (
        <Button kind="quiet" label="Dismiss" aria-label={`Dismiss${title ? `: ${title}` : ''}`} onPress={onDismiss} />
      )}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  notice: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'flex-start',
    justifyContent: 'space-between',
    gap: t.space.sm,
    padding: t.space.md,
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.thin,
    borderColor: t.colours.rule,
    borderLeftWidth: t.line.bar,
  },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: t.measure.form / 2, gap: t.space.xs },
  action: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm, marginTop: t.space.xs },
  info: { borderLeftColor: t.colours.pen },
  good: { borderLeftColor: t.colours.tick },
  warning: { borderLeftColor: t.colours.mark },
  problem: { borderLeftColor: t.colours.pencil },
}));
