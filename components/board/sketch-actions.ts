import { asTurn } from './geometry';
import type { SketchView } from './sketch-types';

/** What decides whether an action is allowed. */
export interface ActionContext {
  readonly view: SketchView;
  /** How many times larger than whole the sketch is now, and can be at most. */
  readonly factor: number;
  readonly greatest: number;
  readonly hasSuspect: boolean;
}

/** One thing that can be done to the view: its button and its key do the same. */
export interface SketchAction {
  readonly id: 'turn' | 'solder-side' | 'table' | 'out' | 'in' | 'whole' | 'suspect';
  readonly label: string;
  /** A sign to draw in place of the words. */
  readonly sign?: string;
  /** Keys while the sketch has the focus. */
  readonly keys: readonly string[];
  readonly allowed: (context: ActionContext) => boolean;
  /** For what stays on; undefined for what only acts. */
  readonly pressed?: (view: SketchView) => boolean;
  readonly run: (context: ActionContext) => SketchView;
}

const step = 1.5;

/** Which side is up, how it lies, drawing or table. */
export const sideActions: readonly SketchAction[] = [
  {
    id: 'turn',
    label: 'Turn',
    keys: ['t'],
    allowed: ({ view }) => !view.table,
    run: ({ view }) => ({ ...view, turn: asTurn(view.turn + 1) }),
  },
  {
    id: 'solder-side',
    label: 'Solder side',
    keys: ['m'],
    allowed: ({ view }) => !view.table,
    pressed: ({ solderSide }) => solderSide,
    run: ({ view }) => ({ ...view, solderSide: !view.solderSide }),
  },
  {
    id: 'table',
    label: 'Table',
    keys: [],
    allowed: () => true,
    pressed: ({ table }) => table,
    run: ({ view }) => ({ ...view, table: !view.table }),
  },
];

/** How close. */
export const zoomActions: readonly SketchAction[] = [
  {
    id: 'out',
    label: 'Zoom out',
    sign: '−',
    keys: ['-', '_'],
    allowed: ({ factor }) => factor > 1,
    run: ({ view, factor }) => ({ ...view, zoom: factor / step <= 1.05 ? 'whole' : factor / step }),
  },
  {
    id: 'in',
    label: 'Zoom in',
    sign: '+',
    keys: ['+', '='],
    allowed: ({ factor, greatest }) => factor < greatest,
    run: ({ view, factor, greatest }) => ({ ...view, zoom: Math.min(greatest, factor * step) }),
  },
  {
    id: 'whole',
    label: 'Whole board',
    keys: ['0'],
    allowed: ({ view }) => view.zoom !== 'whole',
    run: ({ view }) => ({ ...view, zoom: 'whole' }),
  },
  {
    id: 'suspect',
    label: 'To the suspect',
    keys: ['s'],
    allowed: ({ hasSuspect, greatest }) => hasSuspect && greatest > 1,
    run: ({ view }) => ({ ...view, zoom: 'suspect' }),
  },
];
