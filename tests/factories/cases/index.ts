import type { LayoutDocumentInput } from '@/shared';
import { boardA } from './board-a';
import { boardC } from './board-c';
import { boardE } from './board-e';
import { boardF } from './board-f';
import { boardG } from './board-g';
import { boardH } from './board-h';

/** The invented boards of the bench cases, by their letter. */
export const caseBoards = {
  A: boardA,
  C: boardC,
  E: boardE,
  F: boardF,
  G: boardG,
  H: boardH,
} as const satisfies Record<string, LayoutDocumentInput>;
