import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { testSequence } from '@/lib/report/silence';
import { buildFormat, laneNames } from '@/tests/factories/format';
import { buildLayout } from '@/tests/factories/layout';
import type { LayoutDocumentInput } from '@/shared';

type FormatInput = NonNullable<LayoutDocumentInput['reportFormats']>[number];

const parts: FormatInput['parts'] = [{ field: 'bank', notation: 'letter' }, { field: 'bit' }];
const masks: FormatInput['parts'] = [
  { field: 'bank', notation: 'letter' },
  { text: ' ' },
  { field: 'mask', notation: 'hexadecimal' },
];

function passed(
  format: Parameters<typeof buildFormat>[0],
  text: string,
  board: Parameters<typeof buildFormat>[1] = { banks: 3, bits: 4 },
): string {
  const ready = buildFormat(format, board);
  const read = ready.format.read(text);
  return read.ok ? laneNames(ready.index, read.readings[0]!.passed).join(' ') : read.reason;
}

describe('silence', () => {
  it('after the first failure means nothing, and before it means passed', () => {
    expect(passed({ parts, testOrder: { bits: 'ascending' } }, 'B2')).toBe('A0 A1 A2 A3 B0 B1');
    expect(passed({ parts, testOrder: { bits: 'descending' } }, 'B2')).toBe('A3 A2 A1 A0 B3');
  });

  it('follows the order of the test and not that of the layout', () => {
    expect(passed({ parts, testOrder: { banks: ['C', 'B'], bits: 'ascending' } }, 'B1')).toBe('C0 C1 C2 C3 B0');
    expect(passed({ parts, testOrder: { bits: 'ascending', outer: 'bit' } }, 'B1')).toBe('A0 B0 C0 A1');
  });

  it('of a word tested as a whole clears its other bits', () => {
    expect(passed({ parts, testOrder: {} }, 'B2')).toBe('A0 A1 A2 A3 B0 B1 B3');
    expect(passed({ parts: masks, testOrder: {} }, 'B 5')).toBe('A0 A1 A2 A3 B1 B3');
  });

  it('does not clear a parity bit that a mask does not show', () => {
    expect(passed({ parts: masks, testOrder: {} }, 'A 5', { banks: 1, bits: 4, parity: 1 })).toBe('A1 A3');
  });

  it('clears nothing where the order of the test is not known, but what a mask shows', () => {
    expect(passed({ parts }, 'B2')).toBe('');
    expect(passed({ parts: masks }, 'B 5')).toBe('B1 B3');
  });

  it('of a machine that lists is for the whole list to tell, but for what a mask shows', () => {
    expect(passed({ parts, after: 'lists-lanes', testOrder: {} }, 'B2')).toBe('');
    expect(passed({ parts: masks, after: 'lists-banks', testOrder: {} }, 'B 5')).toBe('B1 B3');
  });
});

describe('the sequence of a test', () => {
  it('has every lane of the banks that it tests once', () => {
    const index = buildLayoutIndex(buildLayout({ banks: 3, bits: 8, parity: 1 }));
    const all = testSequence({ testOrder: { bits: 'ascending', outer: 'bit' } }, index);
    expect(all.flat().sort((a, b) => a - b)).toEqual(Array.from(index.lanes));
    expect(
      testSequence({ testOrder: { banks: ['B', 'nowhere'], bits: 'together', outer: 'bank' } }, index),
    ).toHaveLength(1);
    expect(testSequence({}, index)).toEqual([]);
  });
});
