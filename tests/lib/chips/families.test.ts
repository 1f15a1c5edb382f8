import { chipFamily } from '@/shared/layout/parts';
import { builtInFamilies, findFamily } from '@/lib/chips/families';

describe('built-in chip families', () => {
  it.each(builtInFamilies.map((family) => [family.id, family] as const))(
    '%s meets the schema and says where it comes from',
    (_, family) => {
      expect(chipFamily.parse(family)).toEqual(family);
      expect(family.source).toBeTruthy();
    },
  );

  it.each(builtInFamilies.map((family) => [family.id, family] as const))(
    '%s has the address and data pins that its size needs',
    (_, family) => {
      const count = (does: string) => family.pins.filter((pin) => pin.does === does).length;
      const indexes = (does: string) =>
        family.pins
          .filter((pin) => pin.does === does)
          .map((pin) => pin.index)
          .sort((a, b) => a! - b!);
      const addressBits = Math.log2(family.words);
      const inputs =
        family.kind === 'dynamic' ? Math.max(Math.ceil(addressBits / 2), Math.log2(family.rows!)) : addressBits;
      expect(indexes('address')).toEqual(Array.from({ length: inputs }, (_, i) => i));
      if (family.width === 1) expect([count('data-in'), count('data-out')]).toEqual([1, 1]);
      else expect(indexes('data')).toEqual(Array.from({ length: family.width }, (_, i) => i));
      expect(count('ground')).toBe(1);
    },
  );

  it('places the three supplies of the 16K part at pins 1, 8 and 9, against 0 V at pin 16', () => {
    const pins = findFamily({ families: [] }, 'dynamic-16k-1-three-rail')!.pins;
    expect([1, 8, 9, 16].map((pin) => pins[pin - 1]!.volts)).toEqual([-5, 12, 5, 0]);
  });

  it('prefers the family that the layout describes itself', () => {
    const own = { ...findFamily({ families: [] }, 'dynamic-64k-1')!, name: 'as on this board' };
    expect(findFamily({ families: [own] }, 'dynamic-64k-1')!.name).toBe('as on this board');
    expect(findFamily({ families: [] }, 'unheard-of')).toBeNull();
  });
});
