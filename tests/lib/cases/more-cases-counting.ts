import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import { buildLayoutInput } from '../../factories/layout';
import type { BenchCase } from './bench-case';
import { code, line, seen } from './entries';
import type { LayoutDocumentInput } from '@/shared';

const { C, F } = caseBoards;

// Bank A of these lies in U10 to U17, bank B in U18 to U25.
const twoBanks = { banks: 2, bits: 8 } as const;
const maskBoard = buildLayoutInput({ ...twoBanks, bitOrder: 'unknown', formats: ['mask'], after: 'lists-banks' });
const countBoard = buildLayoutInput({ ...twoBanks, first: 'unknown', formats: ['code'] });
const orderBoard = buildLayoutInput({
  banks: 4,
  formats: ['code'],
  after: 'stops',
  testOrder: { bits: 'ascending', outer: 'bank' },
});
const deepBoard = buildLayoutInput({ banks: 1, deep: 2, formats: ['code'] });

const rowBoard = (bitOrder: 'unknown' | 'high-first'): LayoutDocumentInput => ({
  ...buildLayoutInput(twoBanks),
  reportFormats: [
    {
      id: 'position',
      name: 'Position',
      parts: [
        {
          field: 'bank',
          notation: 'words',
          table: [
            { text: 'UPPER', bank: 'A' },
            { text: 'LOWER', bank: 'B' },
          ],
        },
        { text: ' ROW CHIP ' },
        { field: 'bit', first: 1, bitOrder },
      ],
      after: 'stops',
    },
  ],
});

/** A machine that raises an alarm for wrong parity: it tells the address and compares nothing. */
const alarmBoard: LayoutDocumentInput = {
  ...F,
  reportFormats: [
    {
      id: 'alarm',
      name: 'Parity alarm',
      parts: [{ text: 'PARITY ' }, { field: 'address', notation: 'hexadecimal', digits: { min: 5, max: 5 } }],
      after: 'stops',
    },
  ],
};

/** Codes that leave something open, or nearly so. Each reading is common practice, no source. */
export const countingCases: BenchCase[] = [
  {
    id: 'mask of unknown order',
    title: 'which end of a mask is bit 0 is not known: both places, and the question',
    board: maskBoard,
    runs: [seen(code('mask', 'B 04'))],
    expect: {
      outcome: ['group'],
      top: ['U20', 'U23'],
      mustNotLead: ['U12', 'U15', 'U21', 'U22'],
      sure: ['not sure'],
      together: { holds: 0.7, eachAtMost: 0.6 },
      checks: [{ actions: ['ask'] }],
    },
  },
  {
    id: 'mask that reads alike from both ends',
    title: 'bits 3 and 4 from either end: two places in one bank, each mask bit its own chip',
    board: maskBoard,
    runs: [seen(code('mask', 'B 18'))],
    expect: {
      outcome: ['place'],
      top: ['U21', 'U22'],
      mustNotLead: ['U13', 'U14', 'shared:B1'],
      sure: ['likely', 'strong', 'sure'],
    },
  },
  {
    id: 'counting from 0 or 1, settled by itself',
    title: 'a bit 8 cannot be of a board that counts its bits from 0',
    board: countBoard,
    runs: [seen(code('code', 'B-8'))],
    expect: { outcome: ['place'], top: ['U25'], mustNotLead: ['U24', 'U17'], sure: ['likely'] },
  },
  {
    id: 'counting from 0 or 1, open',
    title: 'a bit 3 may be the third or the fourth: both places lead',
    board: countBoard,
    runs: [seen(code('code', 'B-3'))],
    expect: {
      outcome: ['group'],
      top: ['U20', 'U21'],
      mustNotLead: ['U19', 'U22', 'U12', 'U13'],
      sure: ['not sure'],
      checks: [{ actions: ['ask'] }],
    },
  },
  {
    id: 'third chip of the lower row',
    title: 'a machine that counts from the left, where bit 7 lies',
    board: rowBoard('high-first'),
    runs: [seen(code('position', 'LOWER ROW CHIP 3'))],
    expect: { outcome: ['place'], top: ['U23'], mustNotLead: ['U20', 'U15', 'U12'], sure: ['likely'] },
  },
  {
    id: 'third chip of the lower row, from which end',
    title: 'from which end it counts is not known: the third from either end',
    board: rowBoard('unknown'),
    runs: [seen(code('position', 'LOWER ROW CHIP 3'))],
    expect: {
      outcome: ['group'],
      top: ['U20', 'U23'],
      mustNotLead: ['U12', 'U15'],
      sure: ['not sure'],
      checks: [{ actions: ['ask'] }],
    },
  },
  {
    id: 'octal or hexadecimal',
    title: 'a log whose radix nobody knows: the place of each, and nothing between',
    board: C,
    runs: [
      seen({
        kind: 'either',
        ways: [
          {
            takes: 'the log is octal',
            evidence: {
              kind: 'readings',
              unit: 'word',
              shows: 'word',
              lines: [line(0o013052, 0, 0o400)],
              rest: 'unknown',
            },
          },
          {
            takes: 'the log is hexadecimal, with byte addresses',
            evidence: {
              kind: 'readings',
              unit: 'address',
              shows: 'word',
              lines: [line(0x013052, 0, 0x400)],
              rest: 'unknown',
            },
          },
        ],
      }),
    ],
    expect: {
      outcome: ['group'],
      top: ['J9', 'J11'],
      mustNotLead: ['J10', 'J3'],
      sure: ['not sure'],
      together: { holds: 0.7, eachAtMost: 0.6 },
    },
  },
  {
    id: 'a parity alarm',
    title: 'an alarm that compares nothing: any of the nine chips of the bank',
    board: alarmBoard,
    runs: [seen(code('alarm', 'PARITY 2A000'))],
    expect: {
      outcome: ['group'],
      top: upTo(9).map((bit) => `U${30 + bit}`),
      mustNotLead: ['U40', 'U20', 'U28'],
      sure: ['not sure'],
    },
  },
  {
    id: 'two chips deep, bit alone',
    title: 'bank and bit alone leave both chips behind one another',
    board: deepBoard,
    runs: [{ ...seen(code('code', 'A-2')), complete: false }],
    expect: {
      outcome: ['group'],
      top: ['U12', 'U20'],
      mustNotLead: ['U13', 'U21'],
      sure: ['not sure'],
    },
  },
  {
    id: 'only the first failure',
    title: 'a test that stops at the first failure: what comes later is not tested',
    board: orderBoard,
    runs: [seen(code('code', 'B-5'))],
    expect: {
      outcome: ['place'],
      top: ['U23'],
      alsoListed: ['position:U23'],
      mustNotLead: ['U15', 'shared:B1'],
      sure: ['likely', 'strong'],
      says: [/not tested|untested/i],
    },
  },
  {
    id: 'only the first failure, in the first bank',
    title: 'the first bank fails and no other was tested: its chip before the line',
    board: orderBoard,
    runs: [seen(code('code', 'A-5'))],
    expect: {
      outcome: ['place'],
      top: ['U15'],
      alsoListed: ['position:U15', 'shared:B1'],
      mustNotLead: ['U23', 'shared:B1'],
      sure: ['likely'],
      says: [/not tested|untested/i],
    },
  },
];
