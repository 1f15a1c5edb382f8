import { useCallback, useEffect, useLayoutEffect, useRef } from 'react';
import type { View } from 'react-native';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { Box, Point } from './geometry';
import type { Fit } from './geometry-fit';

type OpeningInput = {
  fit: Fit;
  /** Changes when the board is turned or mirrored, so that the old middle means nothing. */
  lie: string;
  /** What to look at when the view says so: the suspect, in sketch units. */
  aim: Box | null;
  /** Counts how often one asked for it. */
  aims: number;
  factor: number;
  onFactor: (factor: number) => void;
};

/** The element behind a view on the web; null where there is none. */
function elementOf(view: View | null): HTMLElement | null {
  return typeof HTMLElement !== 'undefined' && view instanceof HTMLElement ? view : null;
}

function centre(element: HTMLElement, at: Point) {
  element.scrollLeft = at.x - element.clientWidth / 2;
  element.scrollTop = at.y - element.clientHeight / 2;
}

/**
 * The opening through which an enlarged sketch is seen: keeps its middle when the size changes, goes to what it is told
 * to look at, and enlarges under a pinch. It jumps rather than glides, so there is no motion to spare anyone.
 */
export function useOpening({ fit, lie, aim, aims, factor, onFactor }: OpeningInput) {
  const ref = useRef<View>(null);
  const wanted = useRef<Box | null>(null);
  const last = useRef<{ fit: Fit; lie: string; aim: Box | null; aims: number } | null>(null);

  useLayoutEffect(() => {
    const element = elementOf(ref.current);
    const before = last.current;
    last.current = { fit, lie, aim, aims };
    if (!element) return;
    const asked = aim !== before?.aim || aims !== before?.aims || fit !== before?.fit;
    const target = wanted.current ?? (asked ? aim : null);
    wanted.current = null;
    if (target) centre(element, fit.toPx(target));
    else if (before && before.fit !== fit && before.lie === lie) {
      const middle = before.fit.toUnits({
        x: element.scrollLeft + element.clientWidth / 2,
        y: element.scrollTop + element.clientHeight / 2,
      });
      centre(element, fit.toPx({ ...middle, width: 0, height: 0 }));
    }
  }, [fit, lie, aim, aims]);

  useEffect(() => {
    const element = elementOf(ref.current);
    if (!element) return;
    // A pinch on a track pad arrives as a wheel with the control key. React's own listener could not prevent the page's zoom.
    const onWheel = (event: WheelEvent) => {
      if (!event.ctrlKey) return;
      event.preventDefault();
      onFactor(factor * Math.exp(-event.deltaY * 0.01));
    };
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  }, [factor, onFactor]);

  /** Looks at a box at the next change of size. */
  const lookAtNext = useCallback((box: Box) => {
    wanted.current = box;
  }, []);

  /** Scrolls as little as needed to bring a box into sight. */
  const reveal = useCallback(
    (box: Box) => {
      const element = elementOf(ref.current);
      if (!element) return;
      const { x, y, width, height } = fit.toPx(box);
      const room = sketchScale.margin;
      const into = (start: number, { size, middle, half }: { size: number; middle: number; half: number }) =>
        Math.max(middle + half + room - size, Math.min(start, middle - half - room));
      element.scrollLeft = into(element.scrollLeft, { size: element.clientWidth, middle: x, half: width / 2 });
      element.scrollTop = into(element.scrollTop, { size: element.clientHeight, middle: y, half: height / 2 });
    },
    [fit],
  );

  /** A point of the page as a place on the drawing, px. */
  const toDrawing = useCallback(({ clientX, clientY }: { clientX: number; clientY: number }): Point => {
    const element = elementOf(ref.current);
    const rect = element?.getBoundingClientRect();
    return {
      x: clientX - (rect?.left ?? 0) - (element?.clientLeft ?? 0) + (element?.scrollLeft ?? 0),
      y: clientY - (rect?.top ?? 0) - (element?.clientTop ?? 0) + (element?.scrollTop ?? 0),
    };
  }, []);

  return { ref, lookAtNext, reveal, toDrawing };
}
