import { useEffect, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from './button';
import { Text } from './text';
import { VisuallyHidden } from './visually-hidden';

type Words = { title: string; children?: ReactNode };

function Explanation({ children }: { children?: ReactNode }) {
  return typeof children === 'string' ? <Text tone="soft">{children}</Text> : <>{children}</>;
}

/** Nothing is here yet: says why, and offers what can be done. `children`: words, or elements. */
export function EmptyState({ title, children, action }: Words & { action?: ReactNode }) {
  const styles = useStyles();
  return (
    <View style={styles.empty}>
      <View aria-hidden style={styles.blanks}>
        <View style={styles.blank} />
        <View style={styles.blank} />
        <View style={styles.blank} />
      </View>
      <Text variant="heading" level={null}>
        {title}
      </Text>
      <Explanation>{children}</Explanation>
      {action === undefined ? null : <View style={styles.actions}>{action}</View>}
    </View>
  );
}

/** It did not work: what happened, whether anything was lost, and the way to try again. */
export function ErrorState({
  title,
  children,
  onRetry,
  retryLabel = 'Try again',
}: Words & { onRetry?: () => void; retryLabel?: string }) {
  const styles = useStyles();
  return (
    <View role="alert" style={styles.error}>
      <Text variant="heading" level={null}>
        {title}
      </Text>
      <Explanation>{children}</Explanation>
      {onRetry === undefined ? null : (
        <View style={styles.actions}>
          <Button label={retryLabel} onPress={onRetry} />
        </View>
      )}
    </View>
  );
}

/** Time in ms before a loading state shows: what arrives sooner should not flicker. */
const patience = 250;

/** Something is on its way: empty ruled lines, and words for a screen reader. Shows after a quarter of a second. */
export function Loading({ label = 'Loading', lines = 4 }: { label?: string; lines?: number }) {
  const styles = useStyles();
  const [late, setLate] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLate(true), patience);
    return () => clearTimeout(timer);
  }, []);
  return (
    <View role="status" aria-busy style={styles.loading}>
      {late ? (
        <>
          <VisuallyHidden>{`${label}…`}</VisuallyHidden>
          {Array.from({ length: lines }, (_, at) => (
            <View key={at} style={styles.skeletonLine}>
              <View style={[styles.skeletonWord, at % 3 === 1 && styles.skeletonShort]} />
            </View>
          ))}
        </>
      ) : null}
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  empty: { gap: t.space.sm, paddingVertical: t.space.xl, alignItems: 'flex-start' },
  blanks: { flexDirection: 'row', gap: t.space.sm, marginBottom: t.space.xs },
  blank: {
    width: t.space.xxl,
    height: t.target,
    borderWidth: t.line.thin,
    borderStyle: 'dashed',
    borderColor: t.colours.ruleStrong,
    borderRadius: t.radius.sm,
  },
  actions: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm, marginTop: t.space.xs },
  error: {
    gap: t.space.sm,
    padding: t.space.lg,
    backgroundColor: t.colours.sheet,
    borderLeftWidth: t.line.bar,
    borderLeftColor: t.colours.pencil,
    alignItems: 'flex-start',
  },
  loading: { minHeight: t.target },
  skeletonLine: {
    height: t.target,
    justifyContent: 'center',
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.rule,
  },
  skeletonWord: { height: t.space.md, width: '62%', backgroundColor: t.colours.faded, borderRadius: t.radius.sm },
  skeletonShort: { width: '38%' },
}));
