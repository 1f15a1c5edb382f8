import { breakpoints } from './scale';
import { useMediaQuery } from './use-media-query';

/** How much room the window gives: one column, two, or three. */
export type Breakpoint = 'phone' | 'medium' | 'wide';

/**
 * The window's breakpoint. The only place that asks the window for its width;
 * a part that sizes itself from its container uses onLayout instead.
 */
export function useBreakpoint(): Breakpoint {
  const medium = useMediaQuery(`(min-width: ${breakpoints.medium}px)`);
  const wide = useMediaQuery(`(min-width: ${breakpoints.wide}px)`);
  if (wide) return 'wide';
  return medium ? 'medium' : 'phone';
}
