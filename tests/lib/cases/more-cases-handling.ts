import { caseBoards } from '../../factories/cases';
import type { BenchCase } from './bench-case';
import { after, allThatFailed, line, onlyLanes, readings, seen, span, swap } from './entries';

const { A, E } = caseBoards;

/** Evidence of the hand: what is hot, what is pressed, what was moved. Each reading is common practice, no source. */
export const handCases: BenchCase[] = [
  {
    id: 'pressing a chip',
    title: 'the fault comes and goes when a chip is pressed: its contact before the chip',
    board: A,
    runs: [seen(readings([line(0x4100, 0xff, 0xbf)]), { kind: 'sign', sign: 'touch', socket: 'U26' })],
    expect: {
      outcome: ['place'],
      top: ['position:U26'],
      alsoListed: ['chip:U26'],
      mustNotLead: ['U16', 'shared:U30'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['reseat', 'measure'], sockets: ['U26'] }],
    },
  },
  {
    id: 'a hot chip',
    title: 'one bit fails and its chip is hotter than its neighbours',
    board: A,
    runs: [seen(readings([line(0x0200, 0xff, 0xef)]), { kind: 'sign', sign: 'hot', socket: 'U14' })],
    expect: {
      outcome: ['place'],
      top: ['chip:U14'],
      mustNotLead: ['position:U14', 'U24'],
      sure: ['likely', 'strong', 'sure'],
    },
  },
  {
    id: 'fails when warm',
    title: 'one bit that fails only when the board is warm: the place, contact and chip both open',
    board: A,
    runs: [
      seen(allThatFailed([span({ from: 0x4000, to: 0x7fff }, 0xff, 0xbf)]), {
        kind: 'sign',
        sign: 'grows-with-warmth',
      }),
    ],
    expect: {
      outcome: ['place'],
      top: ['U26'],
      alsoListed: ['position:U26', 'chip:U26'],
      mustNotLead: ['U16', 'shared:U30'],
      sure: ['likely', 'strong', 'sure'],
    },
  },
  {
    id: 'four bits moved',
    title: 'two chips of four bits exchanged, and the mask went along: the chip',
    board: E,
    runs: [
      seen(allThatFailed([span({ from: 0x1c00, to: 0x1cff }, 0x00, 0x14)])),
      after(swap('U7', 'U8'), allThatFailed([span({ from: 0x1c00, to: 0x1cff }, 0x00, 0x28)])),
    ],
    expect: {
      outcome: ['place'],
      top: ['chip:U7'],
      mustNotLead: ['position:U7', 'position:U8', 'chip:U8'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['replace'], sockets: ['U8'] }],
      says: [/now in U8/],
    },
  },
  {
    id: 'a good chip does not help',
    title: 'the same bit fails with a chip that is known to be good: the place',
    board: A,
    runs: [
      seen(onlyLanes({ bank: '1', bit: 5 })),
      after({ kind: 'replace', socket: 'U25', with: 'known-good' }, onlyLanes({ bank: '1', bit: 5 })),
    ],
    expect: {
      outcome: ['place'],
      top: ['position:U25'],
      mustNotLead: ['chip:U25#2', 'chip:U25', 'shared:U30'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['measure'], says: [/power off/i, /\bleg\b/i] }],
    },
  },
  {
    id: 'reseated and gone',
    title: 'the fault went away when the chip was reseated: contact likely, and a soak',
    board: A,
    runs: [seen(onlyLanes({ bank: '1', bit: 5 })), after({ kind: 'reseat', socket: 'U25' }, { kind: 'pass' })],
    expect: {
      top: ['position:U25'],
      alsoListed: ['chip:U25'],
      sure: ['not sure'],
      checks: [{ actions: ['soak', 'reseat'], says: [/hours|warm/i] }],
      says: [/not (yet )?repaired/i],
    },
  },
  {
    id: 'gone by itself',
    title: 'the fault went away though nothing was done: the place stays suspected',
    board: A,
    runs: [seen(onlyLanes({ bank: '1', bit: 5 })), seen({ kind: 'pass' })],
    expect: {
      top: ['U25'],
      mustNotLead: ['shared:U30', 'U15'],
      sure: ['not sure'],
    },
  },
];
