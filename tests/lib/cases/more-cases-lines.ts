import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import type { BenchCase } from './bench-case';
import { allThatFailed, line, onlyLanes, readings, seen, span } from './entries';

const { A } = caseBoards;

const chipsOfA = [10, 20].flatMap((ten) => upTo(8).map((bit) => `U${ten + bit}`));
const allOfA = { from: 0x0000, to: 0x7fff };

/** Data lines and address lines at fault. Each reading is common practice, no source. */
export const lineCases: BenchCase[] = [
  {
    id: 'one bit in all banks',
    title: 'the channel of the buffer or one chip that holds the line, told as a group',
    board: A,
    // Each chip that holds the line is a little likelier than the channel; no single one leads.
    runs: [seen(allThatFailed([span(allOfA, 0xff, 0xdf)]))],
    alsoAs: { lanes: [seen(onlyLanes({ bank: '0', bit: 5 }, { bank: '1', bit: 5 }))] },
    expect: {
      outcome: ['group'],
      top: ['shared:U30', 'U15', 'U25'],
      mustNotLead: ['U12', 'together:U15+U25'],
      sure: ['not sure'],
      together: { holds: 0.85, eachAtMost: 0.6 },
      checks: [{ actions: ['pull-in-turn'], sockets: ['U15', 'U25'], says: [/power off/i] }],
    },
  },
  {
    id: 'a short that is high',
    title: 'two data lines joined, high wins: each reads 1 when its neighbour was written 1',
    board: A,
    runs: [
      seen(
        readings([
          line(0x0000, 0x55, 0x5d),
          line(0x0000, 0xaa, 0xae),
          line(0x0000, 0xff, 0xff),
          line(0x0000, 0x00, 0x00),
          line(0x4000, 0x55, 0x5d),
          line(0x4000, 0xaa, 0xae),
        ]),
      ),
    ],
    expect: {
      outcome: ['shared'],
      top: ['short:2-3'],
      mustNotLead: ['U12', 'U13', 'U22', 'U23'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['measure'], says: [/power off/i, /2/, /3/] }],
    },
  },
  {
    id: 'a short between lines that are no neighbours',
    title: 'bits 1 and 4 joined, low wins',
    board: A,
    runs: [
      seen(
        readings([
          line(0x0000, 0x55, 0x45),
          line(0x0000, 0xaa, 0xa8),
          line(0x0000, 0xff, 0xff),
          line(0x0000, 0x00, 0x00),
          line(0x4000, 0x55, 0x45),
          line(0x4000, 0xaa, 0xa8),
        ]),
      ),
    ],
    expect: {
      outcome: ['shared'],
      top: ['short:1-4'],
      mustNotLead: ['U11', 'U14', 'U21', 'U24', 'short:1-2', 'short:3-4'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['measure'], says: [/power off/i, /1/, /4/] }],
    },
  },
  {
    id: 'addresses in pairs, all bits',
    title: 'two addresses are one in every bit of both banks: the multiplexer that carries the bit',
    board: A,
    runs: [
      seen(
        { kind: 'alias', addresses: [0x0000, 0x0008] },
        { kind: 'alias', addresses: [0x1230, 0x1238] },
        { kind: 'alias', addresses: [0x4000, 0x4008] },
      ),
    ],
    expect: {
      outcome: ['shared'],
      top: ['shared:U32'],
      mustNotLead: ['shared:U33', 'shared:U30', ...chipsOfA],
      sure: ['not sure', 'likely', 'strong', 'sure'],
      checks: [{ actions: ['probe', 'rails'] }, { actions: ['probe'], says: [/U32/] }],
    },
  },
  {
    id: 'addresses in pairs, one bit',
    title: 'two addresses are one in one bit only: the address pin or its contact at that chip',
    board: A,
    runs: [
      seen(
        { kind: 'alias', addresses: [0x0000, 0x0008], bits: [2] },
        { kind: 'alias', addresses: [0x1230, 0x1238], bits: [2] },
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['U12'],
      alsoListed: ['position:U12'],
      mustNotLead: ['shared:U32', 'U22', 'U11', 'U13'],
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['reseat', 'swap'], sockets: ['U12'] }],
    },
  },
];
