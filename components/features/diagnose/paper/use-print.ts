import { useCallback, useEffect, useState } from 'react';
import { flushSync } from 'react-dom';

/**
 * Whether the page is being printed, and how to print it. What is only for paper is drawn for as long as that
 * takes, however the printing began.
 */
export function usePrint(): { printing: boolean; print: () => void } {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    // The browser takes its picture of the page as soon as the event has been handled.
    const before = () => flushSync(() => setPrinting(true));
    const after = () => setPrinting(false);
    window.addEventListener('beforeprint', before);
    window.addEventListener('afterprint', after);
    return () => {
      window.removeEventListener('beforeprint', before);
      window.removeEventListener('afterprint', after);
    };
  }, []);
  const print = useCallback(() => {
    setPrinting(true);
    // A frame later the sketch on paper knows its width.
    requestAnimationFrame(() => requestAnimationFrame(() => window.print()));
  }, []);
  return { printing, print };
}
