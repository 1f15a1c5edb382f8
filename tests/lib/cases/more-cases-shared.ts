import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import type { BenchCase } from './bench-case';
import { allThatFailed, line, onlyLanes, readings, seen, span } from './entries';

const { A, G } = caseBoards;

const chipsOf = (...tens: number[]) => tens.flatMap((ten) => upTo(8).map((bit) => `U${ten + bit}`));
const chipsOfA = chipsOf(10, 20);
const waiting = { kind: 'sign', sign: 'grows-with-waiting' } as const;
const noWrites = { kind: 'sign', sign: 'writes-do-not-stick' } as const;
const allOfA = { from: 0x0000, to: 0x7fff };
const bankOne = { from: 0x4000, to: 0x7fff };

/** Selection, refresh and writing, which chips share, and the same in one chip. Each reading is common practice, no source. */
export const sharedCases: BenchCase[] = [
  {
    id: 'one bank dead',
    title: 'all bits of one bank read high: what selects the bank, before any of its chips',
    board: A,
    runs: [seen(allThatFailed([span(bankOne, 0x00, 0xff)]))],
    alsoAs: { lanes: [seen(onlyLanes(...upTo(8).map((bit) => ({ bank: '1', bit }))))] },
    expect: {
      outcome: ['shared'],
      top: ['shared:U31'],
      mustNotLead: chipsOfA,
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['probe'], says: [/strobe|CAS|select/i] }],
    },
  },
  {
    id: 'one bank dead, nothing listed',
    title: 'a layout that lists no decoder still blames what selects the bank',
    board: G,
    runs: [seen(readings(upTo(12).map((n) => line(n * 2 + 0x400 * n, 0x00, 0xff))), { kind: 'pass', banks: ['O'] })],
    expect: {
      outcome: ['shared'],
      top: ['bank:E'],
      mustNotLead: chipsOf(40, 50),
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['probe', 'rails'] }],
    },
  },
  {
    id: 'a bank that is never enabled',
    title: 'a bank that reads the high byte of its own address',
    board: A,
    runs: [
      seen(
        allThatFailed([
          line(0x4012, 0x00, 0x40),
          line(0x4013, 0xff, 0x40),
          line(0x52a7, 0x00, 0x52),
          line(0x52a8, 0xff, 0x52),
          line(0x7f00, 0x00, 0x7f),
          line(0x7f01, 0xff, 0x7f),
        ]),
      ),
    ],
    expect: {
      outcome: ['shared'],
      top: ['shared:U31'],
      mustNotLead: chipsOfA,
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['probe'], says: [/strobe|CAS|select|enable/i] }],
    },
  },
  {
    id: 'refresh lost',
    title: 'all bits decay while the test waits: the refresh counter',
    board: A,
    runs: [seen(waiting, readings([span(allOfA, 0xff, 0x00)], { rest: 'passed', waited: 10 }))],
    expect: {
      outcome: ['shared'],
      top: ['shared:U35'],
      alsoListed: ['shared:U34'],
      mustNotLead: ['shared:U30', ...chipsOfA],
      sure: ['not sure', 'likely', 'strong', 'sure'],
      checks: [{ actions: ['probe', 'rails'] }, { actions: ['probe'], says: [/RAS|refresh/i] }],
    },
  },
  {
    id: 'half the rows decay',
    title: 'all bits of every row with the top row bit set decay: one bit of the refresh counter',
    board: A,
    runs: [
      seen(
        waiting,
        readings(
          upTo(256).map((n) => span({ from: n * 0x80 + 0x40, to: n * 0x80 + 0x7f }, 0xff, 0x00)),
          { rest: 'passed', waited: 10 },
        ),
      ),
    ],
    expect: {
      outcome: ['shared'],
      top: ['shared:U35'],
      mustNotLead: chipsOfA,
      sure: ['not sure', 'likely', 'strong', 'sure'],
      checks: [{ actions: ['probe', 'rails'] }, { actions: ['probe'], says: [/RAS|refresh/i] }],
    },
  },
  {
    id: 'one bit decays',
    title: 'one bit of one bank decays, sooner when warm: a leaky chip, not the refresh',
    board: A,
    runs: [
      seen(
        waiting,
        { kind: 'sign', sign: 'grows-with-warmth' },
        readings(
          [0x4123, 0x4a77, 0x5c01, 0x6f3e, 0x7d90].map((address) => line(address, 0xff, 0xf7)),
          { rest: 'passed', waited: 10 },
        ),
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['chip:U23'],
      mustNotLead: ['position:U23', 'shared:U35', 'shared:U34', 'U13'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['replace', 'swap'], sockets: ['U23'] }],
    },
  },
  {
    id: 'writes never stick',
    title: 'old data stay in every bit of both banks: the write driver',
    board: A,
    runs: [
      seen(
        noWrites,
        readings([
          line(0x0100, 0x00, 0xa5),
          line(0x0100, 0xff, 0xa5),
          line(0x2222, 0x55, 0x3c),
          line(0x2222, 0xaa, 0x3c),
          line(0x4000, 0x00, 0x96),
          line(0x4000, 0xff, 0x96),
          line(0x7abc, 0x55, 0x69),
          line(0x7abc, 0xaa, 0x69),
        ]),
      ),
    ],
    expect: {
      outcome: ['shared'],
      top: ['shared:U34'],
      mustNotLead: ['shared:U30', ...chipsOfA],
      sure: ['not sure', 'likely', 'strong', 'sure'],
      checks: [{ actions: ['probe', 'rails'] }, { actions: ['probe'], says: [/\/WE|write/i] }],
    },
  },
  {
    id: 'writes never stick, one bit',
    title: 'old data stay in one bit of one bank: that chip or its write pin',
    board: A,
    runs: [
      seen(
        noWrites,
        readings([
          line(0x0100, 0x00, 0x40),
          line(0x0100, 0xff, 0xff),
          line(0x0101, 0xff, 0xbf),
          line(0x0101, 0x00, 0x00),
          line(0x4100, 0x00, 0x00),
          line(0x4100, 0xff, 0xff),
          line(0x4101, 0x00, 0x00),
          line(0x4101, 0xff, 0xff),
        ]),
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['U16'],
      alsoListed: ['position:U16'],
      mustNotLead: ['shared:U34', 'U26'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['swap', 'reseat', 'measure'], sockets: ['U16'] }],
    },
  },
];
