import { addressMapOf, buildLayoutIndex, decodeAddress } from '@/lib';
import { effectOf } from '@/lib/simulate/effect';
import { runsOfAddresses } from '@/lib/simulate/addresses';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { buildLayout } from '../../factories/layout';

const demo = (slug: string) => {
  const found = demoBoards.find((board) => board.slug === slug);
  if (!found) throw new RangeError(slug);
  return layoutDocument.parse(found.document);
};

describe('what the board reports when a chip fails', () => {
  it('is the code, the addresses, and a row and a column as the layout wires them', () => {
    const board = demo('tarnvall-t-64-rev-b');
    const effect = effectOf(
      board,
      board.sockets.findIndex(({ label }) => label === 'U31'),
    );
    expect(effect?.lanes).toEqual([{ bank: 'C', bit: 5 }]);
    expect(effect?.codes[0]).toEqual({ format: 'lamp', texts: ['C5'] });
    expect(effect?.codes[1]?.texts[0]).toBe('8000 wrote FF read DF');
    const all = { register: null, count: 128 };
    expect(effect?.whole).toEqual([{ first: 0x8000, last: 0xbfff, step: 1, count: 0x4000, register: null }]);
    // Row inputs take A0 to A6: a row is one address in 80, a column 80 in a row.
    expect(effect?.row).toEqual({ words: 128, spans: [{ ...all, first: 0x8000, last: 0xbf80, step: 0x80 }] });
    expect(effect?.column).toEqual({ words: 128, spans: [{ ...all, first: 0x8000, last: 0x807f, step: 1 }] });
  });

  it('counts every second word of the byte where banks take turns and the word has two bytes', () => {
    const board = demo('skarvik-ladle-16-rev-e');
    const effect = effectOf(
      board,
      board.sockets.findIndex(({ label }) => label === 'M125'),
    );
    expect(effect?.lanes).toEqual([{ bank: 'Y', bit: 11 }]);
    expect(effect?.whole).toEqual([{ first: 2, last: 0x3fffe, step: 4, count: 0x10000, register: null }]);
  });

  it('names the register that a paged bank needs', () => {
    const board = demo('rimstad-ct-7-rev-3');
    const [effect] = board.sockets.flatMap((socket, at) =>
      socket.holds.some(({ bank }) => bank === 'PG1') ? [effectOf(board, at)] : [],
    );
    expect(effect?.whole[0]?.register).toEqual({ name: 'PAGE', value: 1 });
  });

  it('says nothing of rows where the layout does not', () => {
    const board = demo('kestrup-lc-2-rev-d');
    expect(effectOf(board, 0)).toMatchObject({ row: null, column: null });
  });

  it.each([
    ...demoBoards.map(({ slug, document }) => [slug, layoutDocument.parse(document)] as const),
    ['interleaved', buildLayout({ interleave: true, bits: 16, byteLanes: 'little-endian' })] as const,
    ['two deep', buildLayout({ deep: 2, chipWidth: 4 })] as const,
  ])('gives addresses on %s that lead back to the chip', (_, board) => {
    const index = buildLayoutIndex(board);
    const map = addressMapOf(index);
    board.sockets.forEach((socket, at) => {
      const effect = effectOf(board, at);
      const spans = [...(effect?.whole ?? []), ...(effect?.row?.spans ?? []), ...(effect?.column?.spans ?? [])];
      for (const { first, last, register } of spans) {
        for (const address of [first, last]) {
          const holds = decodeAddress(map, address)
            .filter((place) => place.register?.value === register?.value)
            .some(({ bank, word, bits }) =>
              socket.holds.some((held) => {
                const { from, to } = held.words ?? { from: 0, to: Infinity };
                const named = index.bankByName.get(held.bank) === bank && bits.some((bit) => bit === held.bit);
                return named && word >= from && word <= to;
              }),
            );
          expect({ socket: socket.label, address, holds }).toEqual({ socket: socket.label, address, holds: true });
        }
      }
    });
  });
});

describe('runs of addresses', () => {
  it('are put together by even steps, each address in one', () => {
    expect(runsOfAddresses([])).toEqual([]);
    expect(runsOfAddresses([5])).toEqual([{ first: 5, last: 5, step: 0, count: 1 }]);
    expect(runsOfAddresses([0, 2, 4, 100, 102, 104])).toEqual([
      { first: 0, last: 4, step: 2, count: 3 },
      { first: 100, last: 104, step: 2, count: 3 },
    ]);
    expect(runsOfAddresses([1, 9])).toEqual([{ first: 1, last: 9, step: 8, count: 2 }]);
  });
});
