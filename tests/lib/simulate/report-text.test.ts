import { addressMapOf, buildLayoutIndex, compiledFormats, encodeAddress, type Lane } from '@/lib';
import { addressesOf } from '@/lib/simulate/addresses';
import { inFormat } from '@/lib/simulate/emit';
import { patternBit, type TestResult } from '@/lib/simulate/self-test';
import { wiringOf } from '@/lib/simulate/wiring';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { buildLayout } from '../../factories/layout';

const boards = [
  ...demoBoards.map(({ slug, document }) => [slug, layoutDocument.parse(document)] as const),
  [
    'four banks of bytes, all formats',
    buildLayout({ formats: ['code', 'lane-number', 'mask', 'address-mask', 'log'] }),
  ],
  [
    'interleaved',
    buildLayout({ interleave: true, bits: 16, byteLanes: 'big-endian', formats: ['log', 'address-mask'] }),
  ],
  ['little-endian', buildLayout({ bits: 16, byteLanes: 'little-endian', formats: ['log', 'socket', 'flashes'] })],
  ['nibbles, two deep', buildLayout({ chipWidth: 4, deep: 2, parity: 4, first: 1, bitOrder: 'high-first' })],
] as const;

/** One failing lane: what was written is the background 0, and it read 1 there. */
const failing = (lane: number, bits: number): TestResult => ({
  lanes: [lane],
  words: [{ bank: Math.floor(lane / bits), word: 0, written: { background: 0, value: 0 }, bits: [lane % bits] }],
  waited: 0,
});

describe.each(boards)('the simulated machine on %s', (_, document) => {
  const index = buildLayoutIndex(document);
  const wiring = wiringOf(document);
  const map = addressMapOf(index);

  it('finds the words at the addresses of the look-up', () => {
    for (const lane of wiring.lanes) {
      const [bank, bit] = [Math.floor(lane / wiring.bits), lane % wiring.bits];
      for (const word of [0, 1, 5, (document.memory.banks[bank]?.words ?? 1) - 1]) {
        const own = addressesOf(wiring, bank, word).filter(({ bits }) => bits.includes(bit));
        const looked = encodeAddress(map, { bank: bank as never, word, bit: bit as never });
        expect(own.map(({ address, register }) => ({ address, register }))).toEqual(looked);
      }
    }
  });

  it('says of every lane what the look-up reads back as that lane', () => {
    for (const format of document.reportFormats) {
      const compiled = compiledFormats(index).get(format.id);
      if (!compiled) throw new RangeError(`${format.id} does not compile`);
      for (const lane of wiring.lanes) {
        const { evidence } = inFormat(wiring, format, failing(lane, wiring.bits));
        if (evidence.length === 0) {
          expect(compiled.write([lane as Lane]).ok).toBe(false);
          continue;
        }
        for (const each of evidence) {
          if (each.kind !== 'code') throw new RangeError('not a code');
          const read = compiled.read(each.text);
          const lanes = read.ok ? read.readings.flatMap((one) => one.failing.map((f): number => f.lane)) : [];
          expect({ text: each.text, lanes: lanes.includes(lane) }).toEqual({ text: each.text, lanes: true });
        }
      }
    }
  });
});

describe('a data background', () => {
  it('holds groups of one, two and four bits in turn', () => {
    const word = (background: number, value: 0 | 1) =>
      [7, 6, 5, 4, 3, 2, 1, 0].map((bit) => patternBit({ background, value }, bit)).join('');
    expect([0, 1, 2, 3].map((background) => word(background, 0))).toEqual([
      '00000000',
      '10101010',
      '11001100',
      '11110000',
    ]);
    expect(word(1, 1)).toBe('01010101');
  });
});
