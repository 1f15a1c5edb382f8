import fc from 'fast-check';
import { type LayoutDocument, type LayoutDocumentInput, layoutDocument } from '@/shared';
import { buildLayoutInput } from '@/tests/factories/layout';

type ScreenInput = NonNullable<LayoutDocumentInput['screenMap']>;

/** One bit of one word as the plain formula names it. */
interface PlainPlace {
  readonly bank: number;
  readonly word: number;
  readonly bit: number;
}

const upTo = (n: number) => Array.from({ length: n }, (_, i) => i);

/** The place of a pixel, worked out bit by bit from the document alone: nothing of lib is used. */
export function plainPlace(
  document: LayoutDocument,
  plane: number,
  pixel: { x: number; y: number },
): PlainPlace | null {
  const screen = document.screenMap!;
  const { base, bits, register } = screen.planes[plane]!;
  const unit = Math.floor(pixel.x / screen.pixelsPerUnit);
  let address = (base ?? screen.base) + unit;
  screen.lineWeights.forEach((weight, n) => {
    if (Math.floor(pixel.y / 2 ** n) % 2 === 1) address += weight;
  });
  const binary = (n: number) => n.toString(2).padStart(40, '0');
  const bitOf = (n: number, bit: number) => Number(binary(n)[39 - bit]);
  for (const window of document.addressMap.windows) {
    if (address < window.range.from || address > window.range.to) continue;
    if (window.register && window.register.value !== register?.value) continue;
    const steps = window.lanes?.length ?? 1;
    const offset = address - window.range.from;
    let chosen = 0;
    window.interleave.forEach((select, n) => {
      chosen += (select.filter((bit) => bitOf(address, bit) === 1).length % 2) * 2 ** n;
    });
    const closed = window.interleave.map(([first]) => first!);
    const left = [...binary(offset)].filter((_, at) => !closed.includes(39 - at)).join('');
    const whole = parseInt(left, 2);
    const word = window.firstWord + Math.floor(whole / steps);
    const carried = window.lanes?.[offset % steps] ?? upTo(document.memory.dataBits);
    const asked = bits[pixel.x % screen.pixelsPerUnit]!;
    const bit = bits.every((each) => carried.includes(each)) ? asked : carried[asked]!;
    const bank = document.memory.banks.findIndex(({ id }) => id === window.banks[chosen]);
    return { bank, word, bit };
  }
  return null;
}

const shuffled = <T>(items: readonly T[]) => fc.shuffledSubarray([...items], { minLength: items.length });

/** Screens of every kind: lines in any order, packed pixels, planes by base, by register and by bits, byte lanes, interleave. */
export const anyScreen: fc.Arbitrary<LayoutDocument> = fc
  .record({
    lineBits: fc.integer({ min: 1, max: 5 }),
    cut: fc.integer({ min: 0, max: 3 }),
    unitBits: fc.integer({ min: 0, max: 4 }),
    wide: fc.constantFrom(1, 2, 4, 8),
    kind: fc.constantFrom('one', 'base', 'register', 'packed', 'byte-lanes', 'interleave', 'crossed', 'odd'),
    start: fc.integer({ min: 0, max: 500 }),
    turn: fc.constantFrom(0 as const, 1 as const, 2 as const, 3 as const),
  })
  .chain(({ lineBits, ...rest }) =>
    fc.record({
      order: shuffled(upTo(lineBits)),
      bits: shuffled(upTo(8)),
      twice: fc.boolean(),
      given: fc.constant({ lineBits, ...rest }),
    }),
  )
  .map(({ order, bits, twice, given }) => {
    const { lineBits, cut, unitBits, wide, kind, start, turn } = given;
    const unitsPerLine = kind === 'odd' ? 2 ** unitBits + (2 ** unitBits > 2 ? -1 : 0) : 2 ** unitBits;
    const size = 2 ** unitBits * 2 ** lineBits;
    const weights = order.map((at) => 2 ** unitBits * 2 ** at);
    if (twice) weights.unshift(0);
    const banks = kind === 'interleave' || kind === 'crossed' || kind === 'base' || kind === 'register' ? 2 : 1;
    const layout = buildLayoutInput({
      banks,
      bits: kind === 'byte-lanes' ? 16 : 8,
      interleave: kind === 'interleave' || kind === 'crossed',
      ...(kind === 'byte-lanes' ? { byteLanes: 'big-endian' } : {}),
    });
    const pixels = kind === 'packed' ? Math.min(wide, 4) : wide;
    const planes: ScreenInput['planes'] = [{ name: 'first', colour: 'green', bits: bits.slice(0, pixels) }];
    if (kind === 'base')
      planes.push({ name: 'second', colour: 'red', base: start + size, bits: bits.slice(0, pixels) });
    if (kind === 'packed') planes.push({ name: 'second', colour: 'red', bits: bits.slice(4, 4 + pixels) });
    if (kind === 'register') {
      planes[0]!.register = { name: 'P', value: 0 };
      planes.push({ name: 'second', colour: 'red', register: { name: 'P', value: 1 }, bits: bits.slice(0, pixels) });
      layout.addressMap!.windows = ['A', 'B'].map((bank, value) => ({
        range: { from: 0, to: 0xffff },
        register: { name: 'P', value },
        banks: [bank],
      }));
    }
    if (kind === 'crossed') layout.addressMap!.windows![0]!.interleave = [[1, 3]];
    if (kind === 'base')
      layout.addressMap!.windows = [
        { range: { from: 0, to: start + size - 1 }, banks: ['A'] },
        { range: { from: start + size, to: start + 2 * size + 1000 }, banks: ['B'], firstWord: 7 },
      ];
    const screenMap: ScreenInput = {
      width: Math.max(1, unitsPerLine * pixels - cut),
      height: 2 ** weights.length,
      base: start,
      unitsPerLine,
      pixelsPerUnit: pixels,
      lineWeights: weights,
      planes,
      turn,
    };
    return layoutDocument.parse({ ...layout, screenMap });
  });
