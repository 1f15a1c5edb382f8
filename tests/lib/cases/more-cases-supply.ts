import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import type { BenchCase } from './bench-case';
import { allThatFailed, line, onlyLanes, readings, seen, span, volts } from './entries';

const { A } = caseBoards;

const chipsOfA = [10, 20].flatMap((ten) => upTo(8).map((bit) => `U${ten + bit}`));
const everyLane = ['0', '1'].flatMap((bank) => upTo(8).map((bit) => ({ bank, bit })));
const allOfA = { from: 0x0000, to: 0x7fff };
const otherEachPass = { kind: 'sign', sign: 'changes-each-pass' } as const;

/** Signs of the supply, and of what only looks like it. Each reading is common practice, no source. */
export const supplyCases: BenchCase[] = [
  {
    id: 'a rail that is low',
    title: '+12 V a fifth too low comes before the one bit that fails',
    board: A,
    runs: [
      seen(readings([line(0x52a7, 0x00, 0x20)]), volts('U20', 1, -5.0), volts('U20', 8, 9.6), volts('U20', 9, 5.0)),
    ],
    expect: {
      outcome: ['supply'],
      top: ['rail:+12 V'],
      mustNotLead: ['U25', 'U20', 'rail:-5 V'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['rails'], says: [/\+12 V/] }],
    },
  },
  {
    id: 'random errors, rails good',
    title: 'all bits, other ones each pass, with the supply measured good: address multiplexer, refresh, timing',
    board: A,
    runs: [
      seen(
        { kind: 'lanes', failing: everyLane },
        otherEachPass,
        volts('U13', 1, -5.1),
        volts('U13', 8, 12.1),
        volts('U13', 9, 4.98),
      ),
    ],
    expect: {
      outcome: ['shared'],
      top: ['all'],
      mustNotLead: chipsOfA,
      sure: ['not sure', 'likely', 'strong', 'sure'],
      checks: [{ actions: ['probe'] }],
    },
  },
  {
    id: 'everything fails',
    title: 'all bits of all banks: the supply is measured before anything else, and no chip is named',
    board: A,
    runs: [seen(allThatFailed([span(allOfA, 0x00, 0xff)]))],
    alsoAs: { lanes: [seen(onlyLanes(...everyLane))] },
    expect: {
      outcome: ['shared', 'supply'],
      top: ['all'],
      mustNotLead: chipsOfA,
      sure: ['not sure', 'likely', 'strong', 'sure'],
      checks: [{ actions: ['rails'] }],
    },
  },
  {
    id: 'several hot chips',
    title: 'several chips run hot and several bits fail: the supply is measured first',
    board: A,
    runs: [
      seen(
        allThatFailed([span({ from: 0x0000, to: 0x3fff }, 0xff, 0xe3)]),
        { kind: 'sign', sign: 'hot', socket: 'U12' },
        { kind: 'sign', sign: 'hot', socket: 'U13' },
        { kind: 'sign', sign: 'hot', socket: 'U14' },
      ),
    ],
    expect: {
      sure: ['not sure', 'likely', 'strong', 'sure'],
      checks: [{ actions: ['rails'] }],
    },
  },
];
