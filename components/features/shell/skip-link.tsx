import { useState } from 'react';
import { Pressable } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';

/** The first stop of the Tab key: past the head, to the page. Seen only while it has the focus. */
export function SkipLink({ onSkip }: { onSkip: () => void }) {
  const styles = useStyles();
  const [focused, setFocused] = useState(false);
  return (
    <Pressable
      role="button"
      dataSet={{ print: 'hide' }}
      onFocus={() => setFocused(true)}
      onBlur={() => setFocused(false)}
      onPress={onSkip}
      style={[styles.link, !focused && styles.away]}
    >
      <Text variant="label" tone="onInk">
        Skip to the page
      </Text>
    </Pressable>
  );
}

const useStyles = makeStyles((t) => ({
  link: {
    position: 'absolute',
    top: t.space.sm,
    left: t.space.sm,
    zIndex: t.layer.toast,
    minHeight: t.target,
    paddingHorizontal: t.space.lg,
    justifyContent: 'center',
    backgroundColor: t.colours.ink,
    borderRadius: t.radius.md,
  },
  away: { transform: [{ translateY: -2 * t.target }] },
}));
