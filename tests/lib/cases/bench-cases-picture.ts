import { caseBoards } from '../../factories/cases';
import type { BenchCase } from './bench-case';
import { seen } from './entries';
import type { PictureMark } from '@/shared';

type Where = Pick<PictureMark, 'x' | 'y' | 'everyX'>;

const green = (looks: PictureMark['looks'], where: Where) =>
  seen({ kind: 'picture', marks: [{ looks, planes: ['green'], ...where }] });

/** The same whether it was marked as missing or only as wrong. */
const missingGreen = (where: Where) => ({
  runs: [green('missing', where)],
  alsoAs: { 'a wrong colour': [green('wrong', where)] },
});

/** Cases that the picture tells, on a white screen. */
export const pictureCases: BenchCase[] = [
  {
    id: '14a',
    title: 'magenta lines over the full height: the plane and the bit are sure, the part is not',
    board: caseBoards.H,
    ...missingGreen({ x: [2, 2], everyX: 8, y: [0, 191] }),
    expect: {
      outcome: ['group'],
      top: ['shared:SG', 'GU5', 'GL5'],
      alsoListed: ['line:5'],
      mustNotLead: ['GU2', 'GL2', 'together:GU5+GL5'],
      sure: ['not sure'],
      together: { holds: 0.7, eachAtMost: 0.6 },
      checks: [
        { actions: ['pattern'], says: [/green/i, /read/i] },
        { actions: ['pull-in-turn'], sockets: ['GU5', 'GL5'] },
      ],
    },
  },
  {
    id: '14b',
    title: 'magenta lines in the lower half only: the chip of that half',
    board: caseBoards.H,
    ...missingGreen({ x: [2, 2], everyX: 8, y: [96, 191] }),
    expect: {
      top: ['GL5'],
      alsoListed: ['position:GL5'],
      mustNotLead: ['shared:SG', 'GU5', 'GL2'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['swap'], sockets: ['GL5', 'GL4'], sees: /\b3\b.*\b11\b.*\b19\b/ }],
    },
  },
  {
    id: '14c',
    title: 'the whole screen magenta: what the green plane shares, no chip',
    board: caseBoards.H,
    ...missingGreen({ x: [0, 255], y: [0, 191] }),
    expect: {
      outcome: ['shared'],
      top: ['shared:SG'],
      mustNotLead: ['GU5', 'GL5'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['pattern'], says: [/green/i, /read/i] }],
      says: [/SG/, /output|wire|lead/i],
    },
  },
];
