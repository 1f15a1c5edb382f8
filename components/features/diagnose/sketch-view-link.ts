import type { SketchView } from '@/components/board/sketch-types';
import { initialSketchView } from '@/components/board/use-sketch-view';
import type { LayoutIndex } from '@/lib';

/** How the sketch is turned as text of a link: quarter turns, `s` for the solder side, `t` for the table. Null as it was drawn. */
export function writeView(view: SketchView, index: LayoutIndex): string | null {
  const usual = initialSketchView(index);
  const text = `${view.turn}${view.solderSide ? 's' : 'c'}${view.table ? 't' : ''}`;
  return text === `${usual.turn}${usual.solderSide ? 's' : 'c'}` ? null : text;
}

/** The view that a link says; what it does not say is as the board was drawn. */
export function readView(text: string | null, index: LayoutIndex): SketchView {
  const usual = initialSketchView(index);
  const [, turn, side, table] = /^([0-3])([cs])(t?)$/.exec(text ?? '') ?? [];
  if (turn === undefined) return usual;
  return { ...usual, turn: Number(turn) as SketchView['turn'], solderSide: side === 's', table: table === 't' };
}
