import { useRef } from 'react';
import type { View } from 'react-native';

const steps: Partial<Record<string, number>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };

/**
 * Arrow keys, Home and End inside a row of controls of which only one is in the tab order.
 * `move` chooses the control at an index; the focus follows it.
 */
export function useRovingFocus({ count, index, move }: { count: number; index: number; move: (next: number) => void }) {
  const items = useRef<(View | null)[]>([]);
  const goTo = (next: number) => {
    move(next);
    items.current[next]?.focus();
  };
  return {
    itemRef: (at: number) => (element: View | null) => {
      items.current[at] = element;
    },
    onKeyDown: (event: { key: string; preventDefault: () => void }) => {
      const step = steps[event.key];
      const next =
        event.key === 'Home'
          ? 0
          : event.key === 'End'
            ? count - 1
            : step && (Math.max(index, 0) + step + count) % count;
      if (next === undefined) return;
      event.preventDefault();
      goTo(next);
    },
  };
}
