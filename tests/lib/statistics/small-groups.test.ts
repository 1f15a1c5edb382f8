import fc from 'fast-check';
import { showGroups } from '@/lib';

const groups = (...counts: number[]) => counts.map((count, at) => ({ name: `g${at}`, count }));

describe('small groups', () => {
  it('are given together, large ones by themselves', () => {
    expect(showGroups(groups(40, 2, 9, 3))).toEqual({
      shown: [
        { name: 'g0', count: 40 },
        { name: 'g2', count: 9 },
      ],
      rest: { groups: 2, count: 5 },
    });
  });

  it('cannot be worked out as the whole less the others', () => {
    // 2 alone would be the total less 49.
    expect(showGroups(groups(40, 2, 9))).toEqual({
      shown: [{ name: 'g0', count: 40 }],
      rest: { groups: 2, count: 11 },
    });
  });

  it('are not broken down at all where all are too few', () => {
    expect(showGroups(groups(2, 1))).toBeNull();
    expect(showGroups([])).toBeNull();
  });

  it('never show a group or a rest below the least size, and lose no count', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 0, max: 30 }), { maxLength: 12 }),
        fc.integer({ min: 1, max: 12 }),
        (counts, least) => {
          const result = showGroups(groups(...counts), least);
          const total = counts.reduce((sum, one) => sum + one, 0);
          if (result === null) {
            expect(total).toBeLessThan(least);
            return;
          }
          for (const { count } of result.shown) expect(count).toBeGreaterThanOrEqual(least);
          if (result.rest !== null) expect(result.rest.count).toBeGreaterThanOrEqual(least);
          expect(result.shown.reduce((sum, { count }) => sum + count, result.rest?.count ?? 0)).toBe(total);
        },
      ),
    );
  });
});
