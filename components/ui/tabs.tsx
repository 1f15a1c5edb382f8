import { useId, type ReactNode } from 'react';
import { Pressable, ScrollView, View } from 'react-native';
import { makeStyles, useBreakpoint } from '@/components/theme';
import type { Choice } from './segmented-control';
import { Text } from './text';
import { useRovingFocus } from './use-roving-focus';

/** Props of Tabs. */
export type TabsProps<Value extends string> = {
  /** What the tabs are parts of, for a screen reader. */
  label: string;
  tabs: readonly Choice<Value>[];
  value: Value;
  onChange: (value: Value) => void;
  /** On a page without room around it: the rule runs from edge to edge, and the panel brings room of its own. */
  bleed?: boolean;
  /** The panel of the chosen tab. */
  children: ReactNode;
};

/** Tabs with a red underline under the current one, and the panel of the current one below an ink rule. */
export function Tabs<Value extends string>({ label, tabs, value, onChange, bleed, children }: TabsProps<Value>) {
  const phone = useBreakpoint() === 'phone';
  const styles = useStyles();
  const id = useId();
  const index = tabs.findIndex((tab) => tab.value === value);
  const choose = (at: number) => {
    const tab = tabs[at];
    if (tab && !tab.disabled) onChange(tab.value);
  };
  const roving = useRovingFocus({ count: tabs.length, index, move: choose });
  return (
    <View style={bleed && styles.bleed}>
      <ScrollView horizontal showsHorizontalScrollIndicator={false} style={styles.strip}>
        <View
          role="tablist"
          aria-label={label}
          style={[styles.row, bleed && (phone ? styles.roomPhone : styles.room)]}
          onKeyDown={roving.onKeyDown}
        >
          {tabs.map((tab, at) => {
            const selected = at === index;
            return (
              <Pressable
                key={tab.value}
                ref={roving.itemRef(at)}
                id={`${id}-tab-${tab.value}`}
                role="tab"
                aria-selected={selected}
                aria-controls={`${id}-panel`}
                disabled={tab.disabled}
                tabIndex={selected ? 0 : -1}
                onPress={() => choose(at)}
                style={[styles.tab, selected && styles.current]}
              >
                <Text variant={selected ? 'label' : 'body'} tone={tab.disabled ? 'soft' : 'ink'}>
                  {tab.label}
                </Text>
              </Pressable>
            );
          })}
        </View>
      </ScrollView>
      <View
        role="tabpanel"
        id={`${id}-panel`}
        aria-labelledby={`${id}-tab-${value}`}
        style={bleed ? styles.bleed : styles.panel}
      >
        {children}
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  strip: { flexGrow: 0, flexShrink: 0, borderBottomWidth: t.line.thin, borderBottomColor: t.colours.ink },
  row: { flexDirection: 'row', gap: t.space.xl },
  tab: {
    minHeight: t.target,
    minWidth: t.target,
    alignItems: 'center',
    justifyContent: 'center',
    borderBottomWidth: t.line.underline,
    borderBottomColor: 'transparent',
    paddingTop: t.line.underline,
  },
  current: { borderBottomColor: t.colours.pencil },
  room: { paddingHorizontal: t.space.xl },
  roomPhone: { paddingHorizontal: t.space.lg },
  panel: { paddingTop: t.space.lg },
  bleed: { flexGrow: 1 },
}));
