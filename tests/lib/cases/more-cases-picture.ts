import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import type { BenchCase } from './bench-case';
import { seen } from './entries';

const { H } = caseBoards;

/** Faults seen in the picture. Each reading is common practice, no source. */
export const screenCases: BenchCase[] = [
  {
    id: 'one plane dark in one half',
    title: 'red is missing in the lower half: what selects that bank, not eight chips',
    board: H,
    runs: [seen({ kind: 'picture', marks: [{ looks: 'missing', planes: ['red'], x: [0, 255], y: [96, 191] }] })],
    expect: {
      outcome: ['shared'],
      top: ['bank:RL'],
      mustNotLead: ['shared:SR', ...upTo(8).map((bit) => `RL${bit}`)],
      sure: ['likely', 'strong', 'sure'],
    },
  },
  {
    id: 'lines of a wrong colour',
    title: 'blue lines on black at the right end of each byte, upper half: bit 0 of that bank',
    board: H,
    runs: [seen({ kind: 'picture', marks: [{ looks: 'lit', planes: ['blue'], x: [7, 7], everyX: 8, y: [0, 95] }] })],
    expect: {
      outcome: ['place'],
      top: ['BU0'],
      mustNotLead: ['shared:SB', 'BU7', 'BL0'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['swap'], sockets: ['BU0', 'BU1'] }],
    },
  },
  {
    id: 'one dot',
    title: 'one green dot is dark on a picture that is right: a cell of the lower green bank',
    board: H,
    runs: [seen({ kind: 'picture', marks: [{ looks: 'missing', planes: ['green'], x: [100, 100], y: [150, 150] }] })],
    expect: {
      outcome: ['place'],
      top: ['chip:GL3'],
      mustNotLead: ['position:GL3', 'GU3', 'GL4', 'shared:SG'],
      sure: ['likely', 'strong', 'sure'],
    },
  },
];
