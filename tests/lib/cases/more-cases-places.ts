import { caseBoards } from '../../factories/cases';
import { upTo } from '../../factories/cases/rows';
import { buildLayoutInput } from '../../factories/layout';
import type { BenchCase } from './bench-case';
import { allThatFailed, code, line, readings, seen } from './entries';
import type { LayoutDocumentInput } from '@/shared';

const { A } = caseBoards;

// Bank A of these lies in U10 to U17, bank B in U18 to U25.
const twoBanks = { banks: 2, bits: 8 } as const;
const deepBoard = buildLayoutInput({ banks: 1, deep: 2, formats: ['log'] });
const nibbleBoard = buildLayoutInput({ banks: 2, chipWidth: 4, formats: ['log'] });
const littleEndian = buildLayoutInput({ banks: 2, bits: 16, parity: 2, byteLanes: 'little-endian', formats: ['log'] });

/** Two banks that a register brings into one window. */
const pagedBoard: LayoutDocumentInput = {
  ...buildLayoutInput(twoBanks),
  addressMap: {
    windows: ['A', 'B'].map((bank, value) => ({
      range: { from: 0, to: 0xffff },
      register: { name: 'PAGE', value },
      banks: [bank],
    })),
  },
  reportFormats: [],
};

/** Banks that the exclusive-or of A0 and A8 picks. */
const scrambledBoard: LayoutDocumentInput = {
  ...buildLayoutInput(twoBanks),
  addressMap: { windows: [{ range: { from: 0, to: 0x1ffff }, banks: ['A', 'B'], interleave: [[0, 8]] }] },
  reportFormats: [],
};

/** A text screen of 40 × 25 characters in eight 1K × 1 chips. */
const textBoard: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: { maker: 'Test Works', name: 'Text screen', revision: '1', kind: 'terminal' },
  memory: { dataBits: 8, banks: [{ id: 'SCREEN', words: 1024 }] },
  addressMap: { digits: 4, windows: [{ range: { from: 0x8000, to: 0x83ff }, banks: ['SCREEN'] }] },
  sockets: upTo(8).map((bit) => ({
    label: `Z${bit + 1}`,
    x: bit * 12,
    y: 0,
    family: 'static-1k-1',
    holds: [{ bank: 'SCREEN', bit }],
  })),
  sharedParts: [{ label: 'Z20', name: 'character generator', role: 'other', channels: 'bit', serves: {} }],
};

/** Readings that lead to a place, or to a few. Each reading is common practice, no source. */
export const placeCases: BenchCase[] = [
  {
    id: 'low byte first',
    title: 'an odd address of a board that puts the low byte first carries bits 8 to 15',
    board: littleEndian,
    runs: [seen(readings([line(0x00101, 0x00, 0x02)]))],
    alsoAs: { code: [{ ...seen(code('log', '101 W 00 R 02')), complete: false }] },
    expect: {
      outcome: ['place'],
      top: ['U19'],
      mustNotLead: ['U11', 'U37'],
      sure: ['likely'],
      detail: { bank: 'A', word: 0x80, mask: 0x200 },
    },
  },
  {
    id: 'two chips deep, with the address',
    title: 'the address tells which of two chips behind one another',
    board: deepBoard,
    runs: [seen(readings([line(0x15000, 0x00, 0x04), line(0x1a001, 0x00, 0x04), line(0x00123, 0x00, 0x00)]))],
    expect: {
      outcome: ['place'],
      top: ['U20'],
      mustNotLead: ['U12'],
      sure: ['likely', 'strong'],
      detail: { bank: 'A', word: 0x15000, mask: 0x04 },
    },
  },
  {
    id: 'a nibble of one bank',
    title: 'four bits of one bank are one chip of four bits',
    board: nibbleBoard,
    runs: [
      seen(
        allThatFailed([
          line(0x10000, 0x00, 0x0f),
          line(0x10a31, 0x00, 0x09),
          line(0x1c123, 0x00, 0x06),
          line(0x1ffff, 0xff, 0xf3),
        ]),
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['U12'],
      alsoListed: ['position:U12'],
      mustNotLead: ['U10', 'U13', 'shared:B1'],
      sure: ['strong', 'sure'],
      checks: [{ actions: ['swap', 'replace'], sockets: ['U12'] }],
    },
  },
  {
    id: 'two bad chips in one bank',
    title: 'each mask occurs alone: two places lead together',
    board: A,
    runs: [
      seen(
        allThatFailed([
          line(0x0100, 0x00, 0x04),
          line(0x0233, 0x00, 0x20),
          line(0x0300, 0x00, 0x24),
          line(0x1abc, 0x00, 0x04),
          line(0x2def, 0x00, 0x20),
        ]),
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['U12', 'U15'],
      mustNotLead: ['U22', 'U25', 'shared:U30', 'shared:U31'],
      sure: ['likely', 'strong', 'sure'],
    },
  },
  {
    id: 'two bad chips side by side',
    title: 'neighbouring bits that fail each alone are two chips, not a short',
    board: A,
    runs: [
      seen(
        allThatFailed([
          line(0x0100, 0x00, 0x04),
          line(0x0233, 0x00, 0x08),
          line(0x0a10, 0x55, 0x5d),
          line(0x1abc, 0xff, 0xfb),
          line(0x2def, 0xff, 0xf7),
        ]),
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['U12', 'U13'],
      mustNotLead: ['short:2-3', 'U22', 'U23', 'shared:U30'],
      sure: ['likely', 'strong', 'sure'],
    },
  },
  {
    id: 'a cell',
    title: 'one address only after a whole test: a cell of one chip',
    board: A,
    runs: [seen(allThatFailed([line(0x52a7, 0x00, 0x20)]))],
    expect: {
      outcome: ['place'],
      top: ['chip:U25'],
      mustNotLead: ['position:U25', 'U15', 'shared:U30'],
      // Seen once, it may also have been a passing error.
      sure: ['likely', 'strong', 'sure'],
      checks: [{ actions: ['replace', 'swap'], sockets: ['U25'] }],
      signature: { shape: 'cell', row: 39, column: 37 },
    },
  },
  {
    id: 'wrong characters',
    title: 'E for A and $ for a space: bit 2 of the screen reads high',
    board: textBoard,
    runs: [
      seen(
        readings([
          line(0x8000, 0x41, 0x45),
          line(0x8001, 0x20, 0x24),
          line(0x8002, 0x42, 0x46),
          line(0x8003, 0x45, 0x45),
          line(0x8004, 0x54, 0x54),
        ]),
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['Z3'],
      alsoListed: ['position:Z3', 'shared:Z20'],
      mustNotLead: ['Z6', 'Z2', 'shared:Z20'],
      sure: ['likely'],
    },
  },
  {
    id: 'a page register',
    title: 'the register tells which bank an address means',
    board: pagedBoard,
    runs: [seen(readings([{ ...line(0x1234, 0x00, 0x08), register: { name: 'PAGE', value: 1 } }]))],
    expect: {
      outcome: ['place'],
      top: ['U21'],
      mustNotLead: ['U13'],
      sure: ['likely'],
      detail: { bank: 'B', word: 0x1234, mask: 0x08 },
    },
  },
  {
    id: 'a page register that nobody noted',
    title: 'the same address may mean either bank: both chips',
    board: pagedBoard,
    runs: [seen(readings([line(0x1234, 0x00, 0x08)]))],
    expect: { outcome: ['group'], top: ['U13', 'U21'], mustNotLead: ['U12', 'U22'], sure: ['not sure'] },
  },
  {
    id: 'banks by exclusive-or',
    title: 'failures at odd and even addresses that are one bank by the exclusive-or of two address bits',
    board: scrambledBoard,
    runs: [
      seen(
        readings([
          line(0x00001, 0x00, 0x80),
          line(0x00100, 0x00, 0x80),
          line(0x10303, 0x00, 0x00),
          line(0x00b02, 0, 0x80),
        ]),
      ),
    ],
    expect: {
      outcome: ['place'],
      top: ['U25'],
      mustNotLead: ['U17'],
      sure: ['likely', 'strong'],
      detail: { bank: 'B', word: 0, mask: 0x80 },
    },
  },
];
