import { useCallback, useEffect, useRef, useState } from 'react';
import { useDebounced } from '@/components/ui/use-debounced';
import { keepText, readKeptText, type KeptText } from './kept-text';

/** Time in ms after the last key before the text is kept on the device. */
const pause = 500;

const blank: KeptText = { text: '', instead: null };

/** A document that is being written, and what it takes the place of. */
export interface Writing extends KeptText {
  /** False until it is known whether a text was left here before. */
  readonly ready: boolean;
  readonly type: (text: string) => void;
  /** Puts another text into the field. Gives what was there, so that it can be put back. */
  readonly replace: (next: KeptText) => KeptText;
}

/** The text of one person on this device: kept while it is written, and there again after the page was left. */
export function useWriting(personId: string): Writing {
  const [kept, setKept] = useState<KeptText>(blank);
  const [ready, setReady] = useState(false);
  const current = useRef(kept);
  const put = useCallback((next: KeptText) => {
    current.current = next;
    setKept(next);
  }, []);

  useEffect(() => {
    let left = false;
    void readKeptText(personId).then((found) => {
      if (left) return;
      // Whoever was quicker than the device keeps what was typed.
      if (found !== undefined && current.current.text === '') put(found);
      setReady(true);
    });
    return () => {
      left = true;
    };
  }, [personId, put]);

  const settled = useDebounced(kept, pause);
  useEffect(() => {
    if (ready) void keepText(personId, settled);
  }, [personId, ready, settled]);

  const type = useCallback((text: string) => put({ ...current.current, text }), [put]);
  const replace = useCallback(
    (next: KeptText) => {
      const before = current.current;
      put(next);
      return before;
    },
    [put],
  );
  return { ...kept, ready, type, replace };
}
