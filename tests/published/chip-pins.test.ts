import { findFamily } from '@/lib';
import type { ChipFamily } from '@/shared';
import { kicadPins } from './kicad-symbols';

const family = (id: string): ChipFamily => findFamily({ families: [] }, id)!;
const nameAt = (id: string, pin: number) => family(id).pins.find((one) => one.pin === pin)?.name;
const minus = (name: string) => name.replace('-', '−');

/**
 * Pins of the 16-pin dynamic generations and of the 1K x 4 static part.
 * 16K x 1: museo8bits.com wiki, "4116 DRAM"; c64-wiki.com, "RAM"; osiweb.org, 4116to4164.txt (all three read, and they agree).
 * 64K x 1: osiweb.org, 4116to4164.txt; minuszerodegrees.net, 4164_128row (in pages that cite them).
 * 256K x 1: from memory, as far as it differs from the 64K part.
 * 1K x 4: c64-wiki.com, "RAM" (read); its data pins count from 1 there.
 */
const published = {
  'dynamic-16k-1-three-rail': {
    1: '-5 V',
    2: 'D',
    3: '/W',
    4: '/RAS',
    5: 'A0',
    6: 'A2',
    7: 'A1',
    8: '+12 V',
    9: '+5 V',
    10: 'A5',
    11: 'A4',
    12: 'A3',
    13: 'A6',
    14: 'Q',
    15: '/CAS',
    16: '0 V',
  },
  'dynamic-64k-1': {
    1: 'NC',
    2: 'D',
    3: '/W',
    4: '/RAS',
    5: 'A0',
    6: 'A2',
    7: 'A1',
    8: '+5 V',
    9: 'A7',
    10: 'A5',
    11: 'A4',
    12: 'A3',
    13: 'A6',
    14: 'Q',
    15: '/CAS',
    16: '0 V',
  },
  'dynamic-256k-1': { 1: 'A8', 8: '+5 V', 9: 'A7', 16: '0 V' },
  'static-1k-4': {
    1: 'A6',
    2: 'A5',
    3: 'A4',
    4: 'A3',
    5: 'A0',
    6: 'A1',
    7: 'A2',
    8: '/CS',
    9: '0 V',
    10: '/W',
    11: 'D3',
    12: 'D2',
    13: 'D1',
    14: 'D0',
    15: 'A9',
    16: 'A8',
    17: 'A7',
    18: '+5 V',
  },
} as const;

describe.each(Object.entries(published))('%s', (id, pins) => {
  it.each(Object.entries(pins))('has at pin %s what its sources say: %s', (pin, name) => {
    expect(nameAt(id, Number(pin))).toBe(minus(name));
  });
});

/** Refresh: 128 rows in 2 ms for 16K x 1, 128 in 2 or 256 in 4 ms for 64K x 1 (same sources), 256 in 4 ms for 256K x 1 (from memory). */
it.each([
  ['dynamic-16k-1-three-rail', 128, 2],
  ['dynamic-64k-1', 256, 4],
  ['dynamic-64k-1-128-row', 128, 2],
  ['dynamic-256k-1', 256, 4],
])('%s wants %i rows refreshed in %i ms', (id, rows, ms) => {
  expect([family(id).rows, family(id).refreshMs]).toEqual([rows, ms]);
});

/** KiCad writes Q0 or DQ0 for a data pin, ~{WE} for /W and VCC for the supply of a 5 V part. */
function ourName(kicad: string): string {
  const inverted = /^~\{(.*)\}$/.exec(kicad)?.[1];
  if (inverted !== undefined) return inverted === 'WE' ? '/W' : /^C[SE]1?$/.test(inverted) ? '/CS' : `/${inverted}`;
  if (kicad === 'VCC' || kicad === 'VDD') return '+5 V';
  if (kicad === 'GND' || kicad === 'VSS') return '0 V';
  return kicad.replace(/^D?Q(\d+)$/, 'D$1');
}

/**
 * Every pin of the static families that the Debian package kicad-symbols 6.0.10 has in Memory_RAM.kicad_sym, by number
 * and function.
 */
describe.each([
  ['static-32k-8', 'KM62256CLP'],
  ['static-32k-8', 'CY62256-70PC'],
  ['static-32k-8', 'HM62256BLP'],
  ['static-128k-8', '628128_DIP32_SSOP32'],
])('%s beside %s of KiCad', (id, symbol) => {
  it('has the same function at every pin', () => {
    const theirs = [...kicadPins('Memory_RAM.kicad_sym', symbol)].sort(([a], [b]) => a - b);
    expect(theirs.length).toBeGreaterThan(20);
    expect(family(id).pins.map(({ pin, name }) => [pin, name])).toEqual(
      theirs.map(([pin, name]) => [pin, ourName(name)]),
    );
  });
});

/**
 * The 8K x 8 static part is not in that package; a ferroelectric part of the same size and package is
 * (Memory_NVRAM.kicad_sym, FM1608B-SG). Pins 1 and 26 are free there and are the second chip select here.
 */
it('static-8k-8 has the function of the byte-wide package at every pin that the two kinds share', () => {
  const theirs = [...kicadPins('Memory_NVRAM.kicad_sym', 'FM1608B-SG')];
  expect(theirs).toHaveLength(26);
  for (const [pin, name] of theirs) expect([pin, nameAt('static-8k-8', pin)]).toEqual([pin, ourName(name)]);
});
