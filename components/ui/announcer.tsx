import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { View } from 'react-native';
import { fixed, makeStyles } from '@/components/theme';
import { Button } from './button';
import { Text } from './text';
import { VisuallyHidden } from './visually-hidden';

type Toast = { text: string; kind?: 'good' | 'problem'; action?: { label: string; onPress: () => void } };

type Announcer = {
  /** Says something to a screen reader only. */
  announce: (text: string) => void;
  /** Shows a slip at the foot of the page, and says it. One at a time; it leaves by itself unless it holds an action. */
  toast: (toast: Toast) => void;
};

const AnnouncerContext = createContext<Announcer>({ announce: () => undefined, toast: () => undefined });

/** Time in ms that a toast stays: long enough to read with a screen magnifier. */
const stay = 7000;

/** Holds the one live region and the one toast of the application. */
export function AnnouncerProvider({ children }: { children: ReactNode }) {
  const styles = useStyles();
  const [said, setSaid] = useState('');
  const [shown, setShown] = useState<Toast | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout> | undefined>(undefined);

  const announce = useCallback((text: string) => {
    // The same words twice in a row are a change only if they were taken away between.
    setSaid('');
    setTimeout(() => setSaid(text), 50);
  }, []);
  const hide = useCallback(() => {
    clearTimeout(timer.current);
    setShown(null);
  }, []);
  const toast = useCallback((next: Toast) => {
    clearTimeout(timer.current);
    setShown(next);
    if (!next.action) timer.current = setTimeout(() => setShown(null), stay);
  }, []);
  useEffect(() => () => clearTimeout(timer.current), []);

  const value = useMemo(() => ({ announce, toast }), [announce, toast]);
  return (
    <AnnouncerContext.Provider value={value}>
      {children}
      <VisuallyHidden role="status">{said}</VisuallyHidden>
      <View role="status" style={styles.place}>
        {shown === null ? null : (
          <View style={[styles.slip, shown.kind && styles[shown.kind]]}>
            <View style={styles.words}>
              <Text variant="small">{shown.text}</Text>
            </View>
            {shown.action ? (
              <Button
                kind="quiet"
                label={shown.action.label}
                onPress={() => {
                  shown.action?.onPress();
                  hide();
                }}
              />
            ) : null}
            <Button kind="quiet" label="Dismiss" onPress={hide} />
          </View>
        )}
      </View>
    </AnnouncerContext.Provider>
  );
}

/** How to say something that has no place on the page. */
export function useAnnouncer(): Announcer {
  return useContext(AnnouncerContext);
}

const useStyles = makeStyles((t) => ({
  place: {
    position: fixed,
    zIndex: t.layer.toast,
    left: t.space.lg,
    right: t.space.lg,
    bottom: t.space.lg + t.headerHeight.phone,
    alignItems: 'center',
    pointerEvents: 'box-none',
  },
  slip: {
    maxWidth: t.measure.prose,
    flexDirection: 'row',
    alignItems: 'center',
    gap: t.space.sm,
    paddingVertical: t.space.xs,
    paddingLeft: t.space.lg,
    paddingRight: t.space.sm,
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.ink,
    borderColor: t.colours.ink,
    borderRadius: t.radius.md,
  },
  words: { flexShrink: 1 },
  good: { borderLeftWidth: t.line.bar, borderLeftColor: t.colours.tick },
  problem: { borderLeftWidth: t.line.bar, borderLeftColor: t.colours.pencil },
}));
