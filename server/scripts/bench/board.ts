import { layoutDocument, type LayoutDocument } from '@/shared';

const bitsOfWord = 8;
const wordsOfChip = 65_536;

const upTo = (count: number) => Array.from({ length: count }, (_, at) => at);

/**
 * An invented board for measuring: `sockets` one-bit chips in banks of eight bits, with a buffer, strobe drivers and a
 * multiplexer, and two formats: one that stops at the first failure and one that lists every lane.
 */
export const benchBoard = (sockets: number): LayoutDocument => {
  const banks = upTo(sockets / bitsOfWord).map((bank) => `B${bank}`);
  const code = [
    { field: 'bank', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
    { text: '-' },
    { field: 'bit', notation: 'decimal' },
  ];
  return layoutDocument.parse({
    format: 'rowcall.layout/1',
    board: { maker: 'Bench Works', name: `Array of ${sockets}`, revision: 'A' },
    memory: { dataBits: bitsOfWord, banks: banks.map((id) => ({ id, words: wordsOfChip })) },
    multiplexing: { row: upTo(8), column: upTo(8).map((bit) => bit + 8) },
    sockets: banks.flatMap((bank, row) =>
      upTo(bitsOfWord).map((bit) => ({
        label: `U${row * bitsOfWord + bit + 1}`,
        x: bit * 12,
        y: row * 14,
        family: 'dynamic-64k-1',
        holds: [{ pin: 0, bank, bit }],
      })),
    ),
    sharedParts: [
      { label: 'D1', role: 'data-buffer', serves: {} },
      { label: 'D2', role: 'multiplexer', serves: {} },
      ...upTo(Math.ceil(banks.length / 4)).map((at) => ({
        label: `S${at + 1}`,
        role: 'strobe-driver',
        serves: { banks: banks.slice(at * 4, at * 4 + 4) },
      })),
    ],
    reportFormats: [
      { id: 'first', name: 'Stops at the first', parts: code, after: 'stops' },
      { id: 'list', name: 'Lists every lane', parts: [{ text: 'BAD ' }, ...code], after: 'lists-lanes' },
    ],
  });
};
