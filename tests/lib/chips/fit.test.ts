import fc from 'fast-check';
import { builtInFamilies, findFamily } from '@/lib/chips/families';
import { fitCheck, railsAtSocket } from '@/lib/chips/fit';
import { pinList } from '@/lib/chips/pin-list';
import type { ChipFamily } from '@/shared';
import { pinFunctions } from '@/shared/layout/parts';

const family = (id: string): ChipFamily => findFamily({ families: [] }, id)!;
const threeRail = family('dynamic-16k-1-three-rail');
const single64 = family('dynamic-64k-1');
const single64Short = family('dynamic-64k-1-128-row');
const single256 = family('dynamic-256k-1');
const at = (check: ReturnType<typeof fitCheck>, pin: number) => check.reasons.find((reason) => reason.pin === pin);

describe('a family and its own socket', () => {
  it.each(builtInFamilies.map((one) => [one.id, one] as const))('%s fits without a remark on any pin', (_, one) => {
    const check = fitCheck(one, one);
    expect(check).toMatchObject({ verdict: 'fits', reasons: [], changes: [], fitsAfterChanges: true });
    expect(check.pins.map(({ severity }) => severity)).toEqual(one.pins.map(() => 'same'));
  });

  const anyPin = fc.record(
    {
      pin: fc.integer({ min: 1, max: 64 }),
      name: fc.string({ minLength: 1, maxLength: 6 }),
      does: fc.constantFrom(...pinFunctions),
      index: fc.integer({ min: 0, max: 63 }),
      volts: fc.integer({ min: -50, max: 50 }),
      tolerancePercent: fc.integer({ min: 0, max: 100 }),
    },
    { requiredKeys: ['pin', 'name', 'does'] },
  );
  const anyFamily = fc.record(
    {
      id: fc.constant('own'),
      name: fc.constant('Own'),
      alsoCalled: fc.constant<string[]>([]),
      kind: fc.constantFrom('dynamic' as const, 'static' as const),
      words: fc.integer({ min: 1, max: 2 ** 30 }),
      width: fc.integer({ min: 1, max: 72 }),
      pins: fc.array(anyPin, { maxLength: 40 }),
      rows: fc.integer({ min: 1, max: 4096 }),
      refreshMs: fc.double({ min: 0.1, max: 100, noNaN: true }),
      stackable: fc.boolean(),
    },
    { requiredKeys: ['id', 'name', 'alsoCalled', 'kind', 'words', 'width', 'pins', 'stackable'] },
  );

  it('agree for every family that a layout can describe', () => {
    fc.assert(
      fc.property(anyFamily, (one) => {
        expect(fitCheck(one, one).verdict).toBe('fits');
      }),
      { numRuns: 2000 },
    );
  });

  it('never throws for any two families and any rails', () => {
    const rails = fc.array(
      fc.record({
        name: fc.constant('x'),
        volts: fc.integer({ min: -50, max: 50 }),
        pins: fc.array(fc.integer({ min: 1, max: 64 }), { minLength: 1, maxLength: 4 }),
      }),
      { maxLength: 4 },
    );
    fc.assert(
      fc.property(anyFamily, anyFamily, rails, (a, b, given) => {
        const check = fitCheck({ ...a, id: 'other' }, b, given);
        expect(check.headline).toMatch(/\.$/);
        expect(check.verdict === 'fits').toBe(check.reasons.every(({ severity }) => severity === 'harmless'));
        if (check.verdict === 'destroyed') expect(check.reasons[0]!.severity).toBe('destroys');
        if (!check.fitsAfterChanges) expect(check.changes).toEqual([]);
      }),
      { numRuns: 2000 },
    );
  });
});

/**
 * The changes that the trade makes: "isolate pins 1 and 8, join 8 to 9; only a quarter is used, so 7-bit refresh
 * suffices" (osiweb.org, 4116to4164.txt, in a page that cites it; the pins follow from the published tables).
 */
describe('a 64K x 1 part with one supply in a socket for three', () => {
  const check = fitCheck(threeRail, single64);

  it('would be destroyed by +12 V at its +5 V pin', () => {
    expect(check.verdict).toBe('destroyed');
    expect(check.headline).toBe('Would be destroyed. Pin 8 has +12 V; the chip wants +5 V there.');
    expect(at(check, 8)!.severity).toBe('destroys');
  });

  it('must have pin 1 taken off −5 V, pin 8 off +12 V and joined to pin 9', () => {
    expect(check.changes).toEqual([
      'Pin 8: isolate it from +12 V and join it to pin 9, which has +5 V.',
      'Pin 1: isolate it from −5 V.',
    ]);
    expect(check.fitsAfterChanges).toBe(true);
  });

  it('is used to a quarter, because +5 V holds A7 high, and then 128 rows are enough', () => {
    expect(at(check, 9)).toEqual({
      pin: 9,
      severity: 'harmless',
      words: '+5 V at pin 9 holds A7 high, so the chip is used in part.',
    });
    expect(check.notes.map(({ words }) => words)).toEqual(
      expect.arrayContaining([
        'Uses 16K of the 64K words of the chip, 1 in 4.',
        '128 of its 256 rows are used, so a refresh of 128 rows is enough.',
      ]),
    );
    expect(check.reasons.filter(({ pin }) => pin === null)).toEqual([]);
  });

  it('fits once the layout says that its rails were changed so', () => {
    const rails = [
      { name: '+5 V', volts: 5, pins: [8, 9] },
      { name: 'cut', volts: 0, pins: [1] },
    ];
    expect(fitCheck(threeRail, single64, rails).verdict).toBe('fits');
  });
});

describe('a three-rail part in a socket with +5 V alone', () => {
  it('would be destroyed without its negative supply, and no change gives it what the board has nowhere', () => {
    const check = fitCheck(single64, threeRail);
    expect(check.verdict).toBe('destroyed');
    expect(at(check, 1)!.words).toMatch(/never bears to run without its negative supply/);
    expect(at(check, 8)).toMatchObject({ severity: 'change' });
    expect(check.fitsAfterChanges).toBe(false);
  });
});

describe('a socket of which only some pins are described', () => {
  const some = (...pins: number[]) => ({
    ...threeRail,
    id: 'some',
    pins: threeRail.pins.filter(({ pin }) => pins.includes(pin)),
  });

  it('would destroy a three-rail part where its +12 V is nowhere', () => {
    const plain = { ...single64, id: 'plain', words: 16_384, pins: single64.pins.filter(({ pin }) => pin > 1) };
    const check = fitCheck(plain, threeRail);
    expect(check.verdict).toBe('destroyed');
    expect(check.headline).toMatch(/^Would be destroyed\. Pin 1 wants −5 V/);
  });

  it('leaves open what it does not say of the negative supply where +12 V is there', () => {
    expect(fitCheck(some(8, 9, 16), threeRail).verdict).toBe('fits-after-changes');
    expect(fitCheck(some(2, 3, 16), threeRail).verdict).toBe('fits-after-changes');
  });
});

describe('a 256K x 1 part', () => {
  it('would be destroyed at pin 1 of a three-rail socket, where −5 V meets its A8', () => {
    const check = fitCheck(threeRail, single256);
    expect(check.reasons.filter(({ severity }) => severity === 'destroys').map(({ pin }) => pin)).toEqual([1, 8]);
    expect(check.changes[0]).toBe('Pin 1: isolate it from −5 V and tie A8 to 0 V (pin 16).');
  });

  it('fits a 64K socket once A8 is tied, with a quarter of it in use', () => {
    const check = fitCheck(single64, single256);
    expect(check.verdict).toBe('fits-after-changes');
    expect(check.changes).toEqual(['Pin 1: tie A8 to 0 V (pin 16).']);
    expect(check.notes[0]!.words).toBe('Uses 64K of the 256K words of the chip, 1 in 4.');
  });
});

describe('refresh', () => {
  it('of 128 rows is not enough for a part with 256 where all 64K are used', () => {
    const check = fitCheck(single64Short, single64);
    expect(check.verdict).toBe('fits-after-changes');
    expect(check.reasons).toEqual([
      {
        pin: null,
        severity: 'change',
        words: 'The chip has 256 rows to refresh, the board counts 128: the other rows forget what they hold.',
      },
    ]);
  });

  it('of 256 rows in 4 ms also serves a part with 128 rows in 2 ms, if it is spread evenly', () => {
    const check = fitCheck(single64, single64Short);
    expect(check.verdict).toBe('fits');
    expect(check.notes.find(({ about }) => about === 'refresh')!.words).toMatch(/every 2 ms, if it spreads/);
  });

  it('that comes too seldom wants a change', () => {
    const slow = { ...single64, refreshMs: 16 };
    expect(fitCheck(slow, single64).changes).toEqual(['Refresh faster: 256 rows in 4 ms.']);
  });
});

describe('other sizes and packages', () => {
  it('tells width, words and pins of the package that differ', () => {
    expect(fitCheck(family('dynamic-64k-4'), family('dynamic-1m-1')).headline).toMatch(/^Does not fit\. .*1 data bit/);
    expect(fitCheck(single64, family('dynamic-64k-4')).reasons.map(({ words }) => words)).toEqual([
      'The chip has 18 pins, the socket 16.',
      'The chip has 4 data bits, the socket is wired for 1.',
    ]);
    expect(fitCheck(family('static-32k-8'), family('static-8k-8')).verdict).toBe('does-not-fit');
  });

  it('would destroy a static part whose 0 V pin meets +5 V', () => {
    const check = fitCheck(family('dynamic-64k-4'), family('static-1k-4'));
    expect(check.verdict).toBe('destroyed');
    expect(at(check, 9)).toMatchObject({ severity: 'destroys', words: 'Pin 9 has +5 V; the chip wants 0 V there.' });
  });

  it('says which lines have to stand still where a larger part has no more address pins', () => {
    const check = fitCheck(family('dynamic-16k-4'), family('dynamic-64k-4'));
    expect(check.verdict).toBe('fits-after-changes');
    expect(check.reasons[0]!.words).toBe(
      'At column time the chip also looks at 2 address lines that the socket ignores.',
    );
  });

  it('takes address and data pins in another order for harmless', () => {
    const other = {
      ...family('static-1k-4'),
      id: 'other',
      pins: pinList('A5 A6 A4 A3 A0 A1 A2 /CS 0V /W D2 D3 D1 D0 A9 A8 A7 +5V'),
    };
    const check = fitCheck(family('static-1k-4'), other);
    expect(check.verdict).toBe('fits');
    expect(check.reasons.map(({ pin }) => pin)).toEqual([1, 2, 11, 12]);
  });

  it('does not guess at pins that nobody described', () => {
    const bare = { ...single64, id: 'bare', pins: [] };
    expect(fitCheck(single64, bare)).toMatchObject({ verdict: 'fits-after-changes', pins: [] });
    const partly = { ...single64, id: 'partly', pins: single64.pins.filter(({ pin }) => pin !== 5) };
    expect(fitCheck(single64, partly).changes).toEqual([
      'Compare pin 5 with the data sheet and the drawing of the board.',
    ]);
  });
});

it('takes the rails of the layout that reach the socket', () => {
  const rails = [
    { name: 'a', volts: 5, pins: [8] },
    { name: 'b', volts: 12, pins: [8], sockets: ['U2'] },
  ];
  expect(railsAtSocket(rails, 'U1').map(({ name }) => name)).toEqual(['a']);
  expect(railsAtSocket(rails, 'U2').map(({ name }) => name)).toEqual(['a', 'b']);
});
