import { useState } from 'react';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import type { SketchView } from './sketch-types';

/** The board as its contributor drew it: that side up, whole, as a drawing. */
export function initialSketchView(index?: LayoutIndex): SketchView {
  return { turn: 0, solderSide: index?.document.board.view.side === 'solder', zoom: 'whole', table: false };
}

/** A view of the sketch that lasts as long as its component, and how to change it. */
export function useSketchView(index?: LayoutIndex): [view: SketchView, setView: (view: SketchView) => void] {
  return useState(() => initialSketchView(index));
}
