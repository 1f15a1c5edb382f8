import { faultyCells, type CellFault } from '@/lib/simulate/cell-faults';
import { runMarch } from '@/lib/simulate/march';
import { marchLength, marchNames, marchTest, parseMarch, type MarchName } from '@/lib/simulate/march-tests';

type Bit = 0 | 1;
type FaultClass = 'SAF' | 'TF' | 'AF' | 'CFin' | 'CFid' | 'CFst';

const cells = [0, 1, 2, 3];
const bits: readonly Bit[] = [0, 1];
const pairs = cells.flatMap((a) => cells.filter((v) => v !== a).map((v) => [a, v] as const));

const faults: Record<FaultClass, CellFault[]> = {
  SAF: cells.flatMap((cell) => bits.map((value) => ({ kind: 'stuck' as const, cell, value }))),
  TF: cells.flatMap((cell) => bits.map((to) => ({ kind: 'transition' as const, cell, to }))),
  AF: [
    ...cells.flatMap((address) => bits.map((reads) => ({ kind: 'no-cell' as const, address, reads }))),
    ...pairs.map(([address, cell]) => ({ kind: 'other-cell' as const, address, cell })),
    ...pairs.flatMap(([address, cell]) =>
      (['and', 'or'] as const).map((join) => ({ kind: 'also-cell' as const, address, cell, join })),
    ),
  ],
  CFin: pairs.flatMap(([aggressor, victim]) =>
    bits.map((to) => ({ kind: 'inversion' as const, aggressor, victim, to })),
  ),
  CFid: pairs.flatMap(([aggressor, victim]) =>
    bits.flatMap((to) => bits.map((value) => ({ kind: 'idempotent' as const, aggressor, victim, to, value }))),
  ),
  CFst: pairs.flatMap(([aggressor, victim]) =>
    bits.flatMap((when) => bits.map((value) => ({ kind: 'state' as const, aggressor, victim, while: when, value }))),
  ),
};

const contents = Array.from({ length: 16 }, (_, n) => cells.map((cell) => ((n >> cell) & 1) as Bit));

/** Faults of a class that a test detects whatever was in the cells before. */
const detected = (name: MarchName, of: FaultClass) =>
  faults[of].filter((fault) =>
    contents.every((content) => runMarch(marchTest(name), faultyCells(content, fault)).length > 0),
  ).length;

/**
 * A. J. van de Goor, Testing Semiconductor Memories, Wiley 1991, and M. L. Bushnell, V. D. Agrawal, Essentials of
 * Electronic Testing, Kluwer 2000, chapter 9: which classes each test covers (from memory). The counts are those of an
 * enumeration of every single and two-cell fault in a memory of four cells.
 */
const table: Record<MarchName, [number, number, number, number, number, number]> = {
  MATS: [8, 4, 38, 12, 12, 36],
  'MATS+': [8, 4, 44, 18, 18, 36],
  'MATS++': [8, 8, 44, 18, 18, 36],
  'March X': [8, 8, 44, 24, 24, 36],
  'March Y': [8, 8, 44, 24, 24, 36],
  'March C-': [8, 8, 44, 24, 48, 48],
  'March A': [8, 8, 44, 24, 48, 48],
  'March B': [8, 8, 44, 24, 48, 48],
};

describe('the published March tests', () => {
  it('have the published lengths', () => {
    const lengths = marchNames.map((name) => [name, marchLength(marchTest(name))]);
    expect(lengths).toEqual([
      ['MATS', 4],
      ['MATS+', 5],
      ['MATS++', 6],
      ['March X', 6],
      ['March Y', 8],
      ['March C-', 10],
      ['March A', 15],
      ['March B', 17],
    ]);
  });

  it('are tried against every single and two-cell fault of four cells', () => {
    const sizes = Object.values(faults).map((list) => list.length);
    expect(sizes).toEqual([8, 8, 44, 24, 48, 48]);
  });

  const classes: readonly FaultClass[] = ['SAF', 'TF', 'AF', 'CFin', 'CFid', 'CFst'];
  describe.each(marchNames)('%s', (name) => {
    it.each(classes.map((of, at) => [of, table[name][at] as number] as const))('detects of %s: %d', (of, count) => {
      expect(detected(name, of)).toBe(count);
    });
  });

  it('report nothing on a sound memory', () => {
    for (const name of marchNames)
      for (const content of contents) expect(runMarch(marchTest(name), faultyCells(content, null))).toEqual([]);
  });

  it('are told from what is no March test', () => {
    for (const wrong of ['sideways r0', 'up', 'up x0', 'up r2', 'up r01'])
      expect(() => parseMarch('wrong', [wrong])).toThrow(RangeError);
  });
});
