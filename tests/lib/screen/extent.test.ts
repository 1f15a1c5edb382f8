import fc from 'fast-check';
import { extentsOf, placesOf } from '@/lib/screen/extent';

describe('columns drawn together', () => {
  it('are one extent where they come at one distance, up to the edge or not as far', () => {
    expect(extentsOf([2, 10, 18, 26], 32)).toEqual([{ from: 2, to: 2, every: 8 }]);
    expect(extentsOf([2, 10, 18], 32)).toEqual([{ from: 2, to: 2, every: 8, until: 18 }]);
    expect(extentsOf([4, 5, 12, 13, 20, 21], 22)).toEqual([{ from: 4, to: 5, every: 8 }]);
  });

  it('are one extent where the edge cuts the last repeat short', () => {
    expect(extentsOf([1, 2, 3, 8, 9, 10, 15], 16)).toEqual([{ from: 1, to: 3, every: 7 }]);
  });

  it('that come only twice stay two spans', () => {
    expect(extentsOf([3, 9], 10)).toEqual([
      { from: 3, to: 3 },
      { from: 9, to: 9 },
    ]);
  });

  it('cover what they were made of and nothing else', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), fc.uniqueArray(fc.nat(59)), (size, any) => {
        const places = any.filter((at) => at < size).sort((a, b) => a - b);
        const covered = extentsOf(places, size).flatMap((extent) => placesOf(extent, size));
        expect(covered.sort((a, b) => a - b)).toEqual(places);
      }),
    );
  });
});
