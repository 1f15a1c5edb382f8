import type { LayoutDocumentInput } from '@/shared';
import { brathvikHs3 } from './brathvik-hs3';
import { corvaneSix } from './corvane-six';
import { ferrowHy128 } from './ferrow-hy128';
import { hallebroSx40 } from './hallebro-sx40';
import { kestrupLc2 } from './kestrup-lc2';
import { penhallowFormset2 } from './penhallow-formset2';
import { rimstadCt7 } from './rimstad-ct7';
import { sandvoeTg3 } from './sandvoe-tg3';
import { skarvikLadle16 } from './skarvik-ladle16';
import { tarnvallT64RevB } from './tarnvall-t64-rev-b';
import { tarnvallT64RevC } from './tarnvall-t64-rev-c';
import { vossbergPraestant } from './vossberg-praestant';
import { wrayburnGr5 } from './wrayburn-gr5';

/** A board that the product shows before anybody has added one; the slug is its address. */
interface DemoBoard {
  readonly slug: string;
  readonly document: LayoutDocumentInput;
}

/** All demo boards. Makers, boards, revisions, sources and repairs are invented. */
export const demoBoards: readonly DemoBoard[] = [
  { slug: 'tarnvall-t-64-rev-b', document: tarnvallT64RevB },
  { slug: 'tarnvall-t-64-rev-c', document: tarnvallT64RevC },
  { slug: 'sandvoe-tg-3-issue-2', document: sandvoeTg3 },
  { slug: 'kestrup-lc-2-rev-d', document: kestrupLc2 },
  { slug: 'vossberg-praestant-iii-1-2', document: vossbergPraestant },
  { slug: 'hallebro-sx-40-04', document: hallebroSx40 },
  { slug: 'skarvik-ladle-16-rev-e', document: skarvikLadle16 },
  { slug: 'penhallow-formset-2-pd-3', document: penhallowFormset2 },
  { slug: 'ferrow-hy-128-mod-6', document: ferrowHy128 },
  { slug: 'rimstad-ct-7-rev-3', document: rimstadCt7 },
  { slug: 'wrayburn-gr-5-2b', document: wrayburnGr5 },
  { slug: 'corvane-six-a1', document: corvaneSix },
  { slug: 'brathvik-hs-3-rev-f', document: brathvikHs3 },
];
