import fc from 'fast-check';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { addressMapOf, decodeAddress, decodeSpan, encodeAddress } from '@/lib/place/address';
import { type LayoutDocumentInput, layoutDocument } from '@/shared';
import { type LayoutOptions, buildLayout, buildLayoutInput } from '@/tests/factories/layout';

const mapOf = (options: LayoutOptions) => addressMapOf(buildLayoutIndex(buildLayout(options)));
const withWindows = (options: LayoutOptions, windows: NonNullable<LayoutDocumentInput['addressMap']>['windows']) =>
  addressMapOf(buildLayoutIndex(layoutDocument.parse({ ...buildLayoutInput(options), addressMap: { windows } })));

describe('CPU addresses', () => {
  it('lead to the bank whose window holds them, and to the word counted from its start', () => {
    const map = mapOf({ banks: 2 });
    expect(decodeAddress(map, 0x12345)).toMatchObject([{ bank: 1, word: 0x2345 }]);
    expect(decodeAddress(map, 0x20000)).toEqual([]);
  });

  it('carry one byte of a wider word, the high one at the even address where the high byte comes first', () => {
    const map = mapOf({ banks: 1, bits: 16, byteLanes: 'big-endian' });
    expect(decodeAddress(map, 6)).toMatchObject([{ word: 3, bits: [8, 9, 10, 11, 12, 13, 14, 15] }]);
    expect(decodeAddress(map, 7)).toMatchObject([{ word: 3, bits: [0, 1, 2, 3, 4, 5, 6, 7] }]);
  });

  it('of interleaved banks are closed up over the bit that picks the bank', () => {
    const map = mapOf({ banks: 2, interleave: true });
    expect(decodeAddress(map, 0x12a0b)).toMatchObject([{ bank: 1, word: 0x9505 }]);
    expect(decodeAddress(map, 0x12a0c)).toMatchObject([{ bank: 0, word: 0x9506 }]);
  });

  it('can pick the bank by the exclusive-or of two bits', () => {
    const map = withWindows({ banks: 2 }, [
      { range: { from: 0, to: 0x1ffff }, banks: ['A', 'B'], interleave: [[0, 8]] },
    ]);
    expect(decodeAddress(map, 0x100)).toMatchObject([{ bank: 1, word: 0x80 }]);
    expect(decodeAddress(map, 0x101)).toMatchObject([{ bank: 0, word: 0x80 }]);
  });

  it('mean a word for each value of a register that is not known', () => {
    const windows = [3, 4].map((value, n) => ({
      range: { from: 0x8000, to: 0xbfff },
      register: { name: 'page', value },
      banks: ['AB'[n]!],
    }));
    const map = withWindows({ banks: 2 }, windows);
    expect(decodeAddress(map, 0x8010).map(({ bank, register }) => [bank, register?.value])).toEqual([
      [0, 3],
      [1, 4],
    ]);
  });

  it('that are shortened mean every bank in their span', () => {
    expect(decodeSpan(mapOf({ banks: 4, interleave: true }), 0x10000, 0x10fff).map(({ bank }) => bank)).toEqual([
      0, 1, 2, 3,
    ]);
    expect(decodeSpan(mapOf({ banks: 4 }), 0x10000, 0x10fff)).toMatchObject([{ bank: 1, word: null }]);
    expect(decodeSpan(mapOf({ banks: 1, bits: 16, byteLanes: 'little-endian' }), 6, 7)).toMatchObject([
      { bank: 0, word: 3, bits: { length: 16 } },
    ]);
  });

  const boards = fc.record({
    banks: fc.constantFrom(1, 2, 4, 8),
    bits: fc.constantFrom(8, 16, 32),
    interleave: fc.boolean(),
    byteLanes: fc.constantFrom<LayoutOptions['byteLanes']>(undefined, 'big-endian', 'little-endian'),
    deep: fc.constantFrom(1, 2),
  });

  it('lead back from every bit of every word to that word', () => {
    fc.assert(
      fc.property(boards, fc.nat(), fc.nat(), fc.nat(), (options, b, w, n) => {
        const map = mapOf(options);
        const { memory } = map.index.document;
        const bank = b % memory.banks.length;
        const target = {
          bank: map.index.bankByName.get(memory.banks[bank]!.id)!,
          word: w % memory.banks[bank]!.words,
          bit: n % memory.dataBits,
        };
        const addresses = encodeAddress(map, target);
        expect(addresses).toHaveLength(1);
        const [place] = decodeAddress(map, addresses[0]!.address);
        expect(place).toMatchObject({ bank: target.bank, word: target.word });
        expect(place!.bits).toContain(target.bit);
      }),
      { seed: 11, numRuns: 300 },
    );
  });

  it('of a window with exclusive-or interleave reach every word of every bank once', () => {
    const map = withWindows({ banks: 4 }, [
      {
        range: { from: 0, to: 0x3ffff },
        banks: ['A', 'B', 'C', 'D'],
        interleave: [
          [1, 9],
          [0, 1, 5],
        ],
      },
    ]);
    const seen = new Set<string>();
    for (let address = 0; address < 4096; address++) {
      const [place] = decodeAddress(map, address);
      seen.add(`${place!.bank} ${place!.word}`);
      expect(encodeAddress(map, { bank: place!.bank, word: place!.word, bit: 0 }).map((to) => to.address)).toEqual([
        address,
      ]);
    }
    expect(seen.size).toBe(4096);
  });
});
