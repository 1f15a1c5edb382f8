import { findFamily } from '../chips/families';
import { fitCheck, railsAtSocket } from '../chips/fit';
import type { FitCheck } from '../chips/fit-types';
import type { LayoutIndex } from '../layout/layout-index';
import { labelOf, type Chip } from './timeline';

/** Whether the chip that was fitted may lie in its socket; null where it is of the socket's own family or unknown. */
export function fitOf(index: LayoutIndex, chip: Pick<Chip, 'family' | 'cameFrom'>): FitCheck | null {
  const { document } = index;
  const wired = index.familyOfSocket[chip.cameFrom];
  if (chip.family === null || !wired || chip.family === wired.id) return null;
  const fitted = findFamily(document, chip.family);
  if (!fitted) return null;
  return fitCheck(wired, fitted, railsAtSocket(document.rails, labelOf(index, chip.cameFrom)));
}

/** The sockets that now hold a chip which they break. */
export function breakingSockets(index: LayoutIndex, chips: readonly Chip[]): string[] {
  return chips.flatMap((chip) => {
    const now = chip.socketInRun.at(-1) ?? null;
    return now !== null && isDestroyed(index, chip) ? [labelOf(index, now)] : [];
  });
}

/** True where the socket breaks the chip that was fitted. */
export function isDestroyed(index: LayoutIndex, chip: Pick<Chip, 'family' | 'cameFrom'>): boolean {
  return fitOf(index, chip)?.verdict === 'destroyed';
}
