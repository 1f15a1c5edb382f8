import { useEffect, useId, useRef, type ReactNode } from 'react';
import { Modal, Pressable, ScrollView, View } from 'react-native';
import { makeStyles, useBreakpoint } from '@/components/theme';
import { Button } from './button';
import { Text } from './text';

/** Props of Dialog. */
export type DialogProps = {
  open: boolean;
  title: string;
  /** Called by Escape, by a press outside and by the close button. */
  onClose: () => void;
  children: ReactNode;
  /** Buttons at its foot; the first is the one that is meant. */
  actions?: ReactNode;
  /** Words of the close button. */
  closeLabel?: string;
};

/** A sheet over the page that must be answered or closed. Keeps the focus inside and gives it back. */
export function Dialog({ open, title, onClose, children, actions, closeLabel = 'Close' }: DialogProps) {
  const styles = useStyles();
  const phone = useBreakpoint() === 'phone';
  const titleId = useId();
  const sheet = useRef<View>(null);
  useEffect(() => {
    if (open) sheet.current?.focus();
  }, [open]);
  return (
    <Modal visible={open} transparent animationType="none" onRequestClose={onClose} aria-labelledby={titleId}>
      <View style={[styles.veil, phone && styles.veilPhone]}>
        <Pressable aria-hidden tabIndex={-1} style={styles.outside} onPress={onClose} />
        <View ref={sheet} tabIndex={-1} style={[styles.sheet, phone && styles.sheetPhone]}>
          <View style={styles.head}>
            <View style={styles.title}>
              <Text id={titleId} variant="heading">
                {title}
              </Text>
            </View>
            <Button kind="quiet" label={closeLabel} onPress={onClose} />
          </View>
          <ScrollView style={styles.body} contentContainerStyle={styles.content}>
            {children}
          </ScrollView>
          {actions === undefined ? null : <View style={styles.actions}>{actions}</View>}
        </View>
      </View>
    </Modal>
  );
}

const useStyles = makeStyles((t) => ({
  veil: {
    flex: 1,
    justifyContent: 'center',
    alignItems: 'center',
    padding: t.space.lg,
    backgroundColor: t.colours.veil,
  },
  veilPhone: { justifyContent: 'flex-end', padding: t.space.none },
  outside: { position: 'absolute', top: 0, bottom: 0, left: 0, right: 0, cursor: 'auto' },
  sheet: {
    width: '100%',
    maxWidth: t.measure.prose,
    maxHeight: '90%',
    backgroundColor: t.colours.sheet,
    borderWidth: t.line.ink,
    borderColor: t.colours.ink,
    borderRadius: t.radius.md,
  },
  sheetPhone: { borderWidth: 0, borderTopWidth: t.line.heavy, borderRadius: t.radius.none },
  head: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: t.space.md,
    paddingLeft: t.space.lg,
    paddingRight: t.space.sm,
    paddingVertical: t.space.xs,
    borderBottomWidth: t.line.thin,
    borderBottomColor: t.colours.ink,
  },
  title: { flex: 1 },
  body: { flexGrow: 0, flexShrink: 1 },
  content: { padding: t.space.lg, gap: t.space.md },
  actions: {
    flexDirection: 'row-reverse',
    flexWrap: 'wrap',
    gap: t.space.sm,
    padding: t.space.lg,
    borderTopWidth: t.line.thin,
    borderTopColor: t.colours.rule,
  },
}));
