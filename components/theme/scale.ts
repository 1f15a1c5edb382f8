/** Distances in px, on a grid of 4. */
export const space = { none: 0, hair: 2, xs: 4, sm: 8, md: 12, lg: 16, xl: 24, xxl: 32, huge: 56 } as const;

/** Widths of lines in px: a thin rule, an ink rule, a heavy rule, the red underline, the bar at a sheet's edge. */
export const line = { thin: 1, ink: 2, heavy: 3, underline: 4, bar: 6 } as const;

/** Corner radii in px. */
export const radius = { none: 0, sm: 4, md: 6, round: 999 } as const;

/** Least side of anything that is tapped, px. */
export const target = 48;

/**
 * Widths in px: at most a form, a column of prose, a whole page; a side column at least and at most;
 * a word or figure beside something, below which it goes under it.
 */
export const measure = { form: 440, prose: 680, page: 1440, sideLeast: 280, sideMost: 400, beside: 160 } as const;

/** Width in px from which a layout may use two columns, and from which three. */
export const breakpoints = { medium: 720, wide: 1080 } as const;

/** Height of the header of the page in px, for what sticks under it. */
export const headerHeight = { phone: 64, wide: 64 } as const;

/** Stacking order of what lies over the page. */
export const layer = { page: 0, header: 10, toast: 30 } as const;
