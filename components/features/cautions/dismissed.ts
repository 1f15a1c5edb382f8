import { useSyncExternalStore } from 'react';
import type { CautionId } from './cautions';

// For the session of this page only: the next visit shows every caution again.
let dismissed: ReadonlySet<CautionId> = new Set();
const listeners = new Set<() => void>();

const subscribe = (changed: () => void) => {
  listeners.add(changed);
  return () => {
    listeners.delete(changed);
  };
};

/** The cautions that were put away in this session, and how to put one away. */
export function useDismissedCautions(): { dismissed: ReadonlySet<CautionId>; dismiss: (id: CautionId) => void } {
  const current = useSyncExternalStore(
    subscribe,
    () => dismissed,
    () => dismissed,
  );
  return { dismissed: current, dismiss };
}

function dismiss(id: CautionId) {
  dismissed = new Set([...dismissed, id]);
  for (const changed of listeners) changed();
}
