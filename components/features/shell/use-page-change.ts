import { usePathname } from 'expo-router';
import { useEffect, useRef, type RefObject } from 'react';
import type { View } from 'react-native';

/**
 * When another page is shown, starts it at its top and moves the focus to it, as a browser does for a new document.
 * Going back keeps the place where the reader was.
 */
export function usePageChange(main: RefObject<View | null>): void {
  const pathname = usePathname();
  const shown = useRef(pathname);
  const wentBack = useRef(false);

  useEffect(() => {
    const back = () => {
      wentBack.current = true;
    };
    window.addEventListener('popstate', back);
    return () => window.removeEventListener('popstate', back);
  }, []);

  useEffect(() => {
    if (shown.current === pathname) return;
    shown.current = pathname;
    if (!wentBack.current) window.scrollTo(0, 0);
    wentBack.current = false;
    (main.current as unknown as HTMLElement | null)?.focus({ preventScroll: true });
  }, [pathname, main]);
}
