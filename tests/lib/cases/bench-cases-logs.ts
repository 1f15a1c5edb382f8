import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import type { BenchCase } from './bench-case';
import { allThatFailed, code, line, readings, seen, span } from './entries';

const { A, C, E, F, G } = caseBoards;

const shortedLines = [
  line(0x0000, 0x55, 0x51),
  line(0x0000, 0xaa, 0xa2),
  line(0x0000, 0xff, 0xff),
  line(0x0000, 0x00, 0x00),
  line(0x4000, 0x55, 0x51),
  line(0x4000, 0xaa, 0xa2),
];

const alternateBits = [line(0x1c00, 0x00, 0x14), line(0x1c01, 0x00, 0x04), line(0x1c02, 0x00, 0x10)];

const oddOnly = [
  line(0x01001, 0x00, 0x10),
  line(0x01003, 0x00, 0x10),
  line(0x01007, 0x00, 0x10),
  line(0x12a0b, 0x00, 0x10),
];

const noneEven = { kind: 'pass' as const, banks: ['E'] };

/** Cases that a code or a log of readings tells. */
export const logCases: BenchCase[] = [
  {
    id: '1',
    title: 'one line of a log: the bit of the bank, not yet what in its chip',
    board: A,
    runs: [seen(readings([line(0x52a7, 0x00, 0x20)]))],
    alsoAs: {
      'a code of which there may be more': [{ ...seen(code('log', '52A7 W 00 R 20')), complete: false }],
      'failing bits': [seen(readings([{ address: 0x52a7, mask: 0x20 }]))],
    },
    expect: {
      top: ['U25'],
      alsoListed: ['position:U25'],
      mustNotLead: ['U15', 'U22'],
      sure: ['likely'],
      checks: [{ actions: ['test-whole'] }, { actions: ['swap'], sockets: ['U25', 'U24'] }],
      detail: { bank: '1', word: 0x12a7, mask: 0x20, row: 39, column: 37 },
    },
  },
  {
    id: '3a',
    title: 'five or six beeps: the bank is sure, the bit is not',
    board: F,
    runs: [seen(code('beeps', '3 LONG 5 OR 6 SHORT'))],
    alsoAs: {
      'two ways to understand it': [
        seen({
          kind: 'either',
          ways: [
            { takes: 'five short', evidence: { kind: 'code', format: 'beeps', text: '3 LONG 5 SHORT' } },
            { takes: 'six short', evidence: { kind: 'code', format: 'beeps', text: '3 LONG 6 SHORT' } },
          ],
        }),
      ],
    },
    expect: {
      top: ['U34', 'U35'],
      mustNotLead: ['U44', 'U45', 'U36'],
      sure: ['not sure'],
      together: { holds: 0.7, eachAtMost: 0.6 },
      checks: [{ actions: ['read-again'] }],
    },
  },
  {
    id: '3b',
    title: 'six beeps are D5',
    board: F,
    runs: [seen(code('beeps', '3 LONG 6 SHORT'))],
    expect: {
      top: ['U35'],
      alsoListed: ['position:U35'],
      mustNotLead: ['U36', 'U45'],
      sure: ['likely'],
      checks: [{ actions: ['swap'], sockets: ['U35', 'U34'], sees: /3 LONG 5 SHORT/ }],
    },
  },
  {
    id: '3c',
    title: 'nine beeps are parity',
    board: F,
    runs: [seen(code('beeps', '3 LONG 9 SHORT'))],
    expect: {
      top: ['U38'],
      alsoListed: ['shared:U50'],
      mustNotLead: ['U37'],
      sure: ['likely'],
      checks: [{ actions: ['swap'], sockets: ['U38', 'U37'] }],
      says: [/U50/],
    },
  },
  {
    id: '5',
    title: 'an octal log of words',
    board: C,
    runs: [seen(readings([line(0o013052, 0o000000, 0o000400)], { unit: 'word', shows: 'word' }))],
    alsoAs: {
      'a code of which there may be more': [
        { ...seen(code('octal', 'AT 013052 WANT 000000 GOT 000400')), complete: false },
      ],
    },
    expect: {
      top: ['J9'],
      alsoListed: ['position:J9'],
      mustNotLead: ['J11', 'J3', 'J10'],
      sure: ['likely'],
      checks: [{ actions: ['test-whole', 'swap'] }, { actions: ['swap'], sockets: ['J9', 'J8'] }],
      detail: { bank: '0', word: 0x162a, mask: 0x100 },
    },
  },
  {
    id: '6a',
    title: 'two bits that are one chip',
    board: E,
    runs: [seen(readings(alternateBits))],
    alsoAs: {
      'all that failed': [seen(allThatFailed(alternateBits))],
      'one reading after the other': [seen(...alternateBits.map((each) => readings([each])))],
      codes: [
        {
          ...seen(...['1C00 W 00 R 14', '1C01 W 00 R 04', '1C02 W 00 R 10'].map((text) => code('log', text))),
          complete: false,
        },
      ],
    },
    expect: {
      top: ['U7'],
      alsoListed: ['position:U7'],
      mustNotLead: ['U8'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['replace', 'swap'], sockets: ['U7'] }],
    },
  },
  {
    id: '6b',
    title: 'two bits that are two chips, always together',
    board: E,
    runs: [seen(readings([line(0x1c00, 0x00, 0x0c), line(0x1d00, 0x00, 0x0c), line(0x1e00, 0xff, 0xff)]))],
    expect: {
      outcome: ['group', 'shared'],
      top: ['together:U7+U8', 'common:2+3'],
      alsoListed: ['U7', 'U8'],
      sure: ['not sure'],
      checks: [
        { actions: ['pattern'], says: [/\b04\b/, /\b08\b/] },
        { actions: ['measure'], says: [/2/, /3/, /power off/i] },
      ],
    },
  },
  {
    id: '8',
    title: 'two data lines shorted, low wins',
    board: A,
    runs: [seen(readings(shortedLines))],
    alsoAs: {
      'all that failed': [seen(allThatFailed(shortedLines))],
      'one reading after the other': [seen(...shortedLines.map((each) => readings([each])))],
      codes: [
        {
          ...seen(
            code('log', '0000 W 55 R 51'),
            code('log', '0000 W AA R A2'),
            code('log', '0000 W FF R FF'),
            code('log', '0000 W 00 R 00'),
            code('log', '4000 W 55 R 51'),
            code('log', '4000 W AA R A2'),
          ),
          complete: false,
        },
      ],
    },
    expect: {
      outcome: ['shared'],
      top: ['short:2-3'],
      alsoListed: ['shared:U30'],
      mustNotLead: ['U12', 'U13', 'U22', 'U23'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['measure'], says: [/power off/i, /2/, /3/] }],
      signature: { shape: 'follows-neighbour' },
    },
  },
  {
    id: '10a',
    title: 'a dead row: 128 addresses in steps, one chip',
    board: A,
    runs: [seen(allThatFailed([span({ from: 0x0035, to: 0x3fb5, step: 0x80 }, 0x00, 0x01)]))],
    alsoAs: {
      'each line by itself': [seen(allThatFailed(upTo(128).map((n) => line(0x0035 + n * 0x80, 0x00, 0x01))))],
      'lines, and the other bank passed': [
        seen(readings([span({ from: 0x0035, to: 0x3fb5, step: 0x80 }, 0x00, 0x01)]), { kind: 'pass', banks: ['1'] }),
      ],
    },
    expect: {
      top: ['U10'],
      mustNotLead: ['shared:U32', 'shared:U33'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['replace'], sockets: ['U10'] }],
      signature: { shape: 'row', row: 53, count: 128 },
    },
  },
  {
    id: '10b',
    title: 'a dead column: 128 addresses in one run, one chip',
    board: A,
    runs: [seen(allThatFailed([span({ from: 0x1a80, to: 0x1aff }, 0x00, 0x01)]))],
    alsoAs: {
      'each line by itself': [seen(allThatFailed(upTo(128).map((n) => line(0x1a80 + n, 0x00, 0x01))))],
      'lines, and the other bank passed': [
        seen(readings([span({ from: 0x1a80, to: 0x1aff }, 0x00, 0x01)]), { kind: 'pass', banks: ['1'] }),
      ],
    },
    expect: {
      top: ['U10'],
      mustNotLead: ['shared:U32', 'shared:U33'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['replace'], sockets: ['U10'] }],
      signature: { shape: 'column', column: 53, count: 128 },
    },
  },
  {
    id: '13',
    title: 'interleaved banks: only odd addresses fail, low and high',
    board: G,
    runs: [seen(readings(oddOnly), noneEven)],
    expect: {
      top: ['U54'],
      alsoListed: ['position:U54'],
      mustNotLead: ['U44'],
      sure: ['likely'],
      checks: [{ actions: ['swap'], sockets: ['U54', 'U55'] }],
      detail: { bank: 'O', word: 0x800, mask: 0x10 },
    },
  },
];
