import fc from 'fast-check';
import { solveByTable, type Node } from '@/lib/diagnose/explained-table';
import { solveWide } from '@/lib/diagnose/wide-sum';

const lanes = 9;

/** A cause as the sum takes it: its weights and that of its absence add up to 1. */
const node: fc.Arbitrary<Node> = fc
  .record({
    touches: fc.uniqueArray(fc.integer({ min: 0, max: lanes - 1 }), { minLength: 1, maxLength: lanes }),
    prior: fc.constantFrom(0.018, 0.004, 0.002, 0.0005, 1e-6),
  })
  .map(({ touches, prior }) => {
    const sorted = [...touches].sort((a, b) => a - b);
    return {
      none: 1 - prior,
      share: Float64Array.from([prior * 0.8, prior * 0.2]),
      touches: [sorted, sorted],
      miss: Float64Array.from([0.02, 0.5]),
      widest: sorted.length,
    };
  });
const group = fc.array(node, { minLength: 2, maxLength: 24 });

describe('the sum over far-reaching causes', () => {
  it('is no further from the table of all failing lanes than it says', () => {
    let furthest = 0;
    fc.assert(
      fc.property(group, (nodes) => {
        const part = { nodes: nodes.map((_, n) => n), positives: Array.from({ length: lanes }, (_, o) => o) };
        const quiet = new Float64Array(lanes).fill(0.999);
        const table = solveByTable(nodes, part, quiet);
        const wide = solveWide(nodes, part, quiet);
        const open = wide.dropped / wide.z;
        let most = 0;
        nodes.forEach((each, n) =>
          each.share.forEach((_, s) => {
            const exact = (table.mass[n]?.[s] ?? 0) / table.z;
            most = Math.max(most, Math.abs((wide.mass[n]?.[s] ?? 0) / wide.z - exact));
          }),
        );
        expect(most).toBeLessThanOrEqual(2 * open + 1e-3);
        if (open < 1e-3) furthest = Math.max(furthest, most);
      }),
      { seed: 5, numRuns: 400 },
    );
    expect(furthest).toBeGreaterThan(0);
    expect(furthest).toBeLessThan(1e-3);
  });
});
