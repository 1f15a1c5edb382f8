import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import type { BenchCase } from './bench-case';
import { after, allThatFailed, line, onlyLanes, readings, seen, span, swap, volts } from './entries';

const board = caseBoards.A;

const bankOne = (read: number) => allThatFailed([span({ from: 0x4000, to: 0x7fff }, 0x00, read)]);
const before = seen(bankOne(0x20));
const bankOneOnly = (read: number) => readings([span({ from: 0x4000, to: 0x7fff }, 0x00, read)]);
const maskOfOne = (mask: number) => ({ kind: 'mask' as const, bank: '1', mask });
const bankNoughtPassed = { kind: 'pass' as const, banks: ['0'] };
const beforeLanes = seen(onlyLanes({ bank: '1', bit: 5 }));
const everyLane = ['0', '1'].flatMap((bank) => upTo(8).map((bit) => ({ bank, bit })));
const minusFiveGone = [volts('U13', 1, -0.4), volts('U13', 8, 11.9), volts('U13', 9, 5.02)];
const otherEachPass = { kind: 'sign', sign: 'changes-each-pass' } as const;

const otherFamily = { kind: 'replace', socket: 'U12', with: 'untested', family: 'dynamic-64k-1' } as const;
const hotTwelve = { kind: 'sign', sign: 'hot', socket: 'U12' } as const;
const bitTwoLow = allThatFailed([span({ from: 0x0000, to: 0x3fff }, 0xff, 0xfb)]);

/** Cases in which something was done to the board, or measured. */
export const handlingCases: BenchCase[] = [
  {
    id: '17a',
    title: 'the fault moved with the chip',
    board,
    runs: [before, after(swap('U25', 'U24'), bankOne(0x10))],
    alsoAs: {
      lanes: [beforeLanes, after(swap('U25', 'U24'), onlyLanes({ bank: '1', bit: 4 }))],
      'readings of the bank alone': [seen(bankOneOnly(0x20)), after(swap('U25', 'U24'), bankOneOnly(0x10))],
      masks: [seen(maskOfOne(0x20)), after(swap('U24', 'U25'), maskOfOne(0x10))],
    },
    expect: {
      outcome: ['place'],
      top: ['chip:U25'],
      mustNotLead: ['position:U25', 'U25'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['replace'], sockets: ['U24'] }],
      says: [/now in U24/],
    },
  },
  {
    id: '17b',
    title: 'the fault stayed with the place',
    board,
    runs: [before, after(swap('U25', 'U24'), bankOne(0x20))],
    alsoAs: {
      lanes: [beforeLanes, after(swap('U25', 'U24'), onlyLanes({ bank: '1', bit: 5 }))],
      'readings, and the other bank passed': [
        seen(bankOneOnly(0x20), bankNoughtPassed),
        after(swap('U25', 'U24'), bankOneOnly(0x20), bankNoughtPassed),
      ],
    },
    expect: {
      outcome: ['place'],
      top: ['position:U25'],
      alsoListed: [/trace|track/i],
      mustNotLead: ['chip:U25', 'shared:U30'],
      sure: ['likely'],
      checks: [{ actions: ['measure'], says: [/power off/i, /U25/, /U15/, /pin 14/, /\bleg\b/i] }],
    },
  },
  {
    id: '17c',
    title: 'the fault went away: not repaired',
    board,
    runs: [before, after(swap('U25', 'U24'), { kind: 'pass' })],
    alsoAs: {
      lanes: [beforeLanes, after(swap('U25', 'U24'), { kind: 'pass' })],
      'readings of the bank alone': [seen(bankOneOnly(0x20)), after(swap('U25', 'U24'), { kind: 'pass' })],
      masks: [seen(maskOfOne(0x20)), after(swap('U25', 'U24'), { kind: 'pass' })],
    },
    expect: {
      top: ['position:U25', 'chip:U25'],
      sure: ['not sure'],
      checks: [{ actions: ['soak', 'reseat'], says: [/clean/i, /warm|hours/i] }],
    },
  },
  {
    id: '17d',
    title: 'worse than before: the swap itself comes first',
    board,
    runs: [before, after(swap('U25', 'U24'), bankOne(0x30))],
    alsoAs: {
      lanes: [beforeLanes, after(swap('U25', 'U24'), onlyLanes({ bank: '1', bit: 4 }, { bank: '1', bit: 5 }))],
      'readings of the bank alone': [seen(bankOneOnly(0x20)), after(swap('U25', 'U24'), bankOneOnly(0x30))],
    },
    expect: {
      top: ['fitting:any'],
      pairs: [['chip:U25', 'position:U25']],
      sure: ['not sure'],
      checks: [{ actions: ['reseat'], says: [/power off/i, /leg/i, /revers|turned|wrong way/i] }],
      says: [/bent|folded/i],
    },
  },
  {
    id: '18a',
    title: 'a supply is missing: no chip is named',
    board,
    runs: [seen({ kind: 'lanes', failing: everyLane }, otherEachPass, ...minusFiveGone)],
    alsoAs: {
      'no lanes noted': [seen(otherEachPass, ...minusFiveGone)],
      'readings of one pass': [
        seen(
          readings([line(0x0001, 0x00, 0x5a), line(0x4020, 0xff, 0x13), line(0x7120, 0x00, 0xe4)]),
          otherEachPass,
          ...minusFiveGone,
        ),
      ],
      'the measurement alone': [seen(...minusFiveGone)],
    },
    expect: {
      outcome: ['supply'],
      top: ['rail:-5 V'],
      mustNotLead: ['U13', 'chip:U13'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['rails'], says: [/power off/i, /[-−]5 V/] }],
      says: [/chips out/i],
    },
  },
  {
    id: '18b',
    title: 'a part of another supply was fitted',
    board,
    runs: [after(otherFamily, hotTwelve, bitTwoLow)],
    alsoAs: {
      'nothing felt': [after(otherFamily, bitTwoLow)],
      'a failure before as well': [
        seen(bitTwoLow),
        after({ ...otherFamily, with: 'known-good' }, hotTwelve, bitTwoLow),
      ],
    },
    expect: {
      top: ['chip:U12#2'],
      alsoListed: ['rail:+12 V'],
      mustNotLead: ['shared:U30'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['replace', 'rails'], sockets: ['U12'], says: [/power off/i] }],
      says: [/three/i, /\+12 V/],
    },
  },
  {
    id: '18c',
    title: 'dead, and nothing measured: no reading',
    board,
    runs: [seen({ kind: 'sign', sign: 'dead' })],
    expect: {
      outcome: ['no-evidence'],
      top: [],
      alsoListed: [/supply|rail|\+5 V/i, /reset/i, /clock/i],
      mustNotLead: ['U10'],
      sure: ['no reading'],
      checks: [{ actions: ['rails'], says: [/[-−]5/, /\+5/, /\+12/, /\b1\b/, /\b9\b/, /\b8\b/] }],
    },
  },
];
