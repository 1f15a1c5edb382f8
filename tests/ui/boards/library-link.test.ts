import {
  familyLabel,
  filtersOf,
  fitsFilters,
  readLibraryLink,
  searchWords,
} from '@/components/features/boards/library-link';
import { cardOf } from '@/tests/ui/support/boards';

test('a link is read as far as it makes sense', () => {
  expect(readLibraryLink({ q: ' loom ', maker: 'Tarnvall Textil', bits: '8', other: 'x' })).toEqual({
    q: ' loom ',
    maker: 'Tarnvall Textil',
    bits: '8',
  });
  expect(readLibraryLink({ q: '   ', bits: '8; drop', kind: ['terminal', 'display'] })).toEqual({ kind: 'terminal' });
  expect(readLibraryLink({ q: 'x'.repeat(5000) }).q).toHaveLength(120);
});

test('the request has what the link says, numbers as numbers', () => {
  expect(filtersOf({ q: ' loom ', bits: '16', family: 'static-2k-8' })).toEqual({
    q: 'loom',
    bits: 16,
    family: 'static-2k-8',
  });
});

test('a board on the device has to fit every filter', () => {
  const loom = cardOf('tarnvall-t-64-rev-b');
  expect(fitsFilters(loom, {})).toBe(true);
  expect(fitsFilters(loom, { maker: 'tarnvall textil', kind: 'controller', bits: '8' })).toBe(true);
  expect(fitsFilters(loom, { maker: 'tarnvall textil', bits: '16' })).toBe(false);
  expect(fitsFilters(loom, { family: 'dynamic-16k-1-three-rail' })).toBe(true);
  expect(fitsFilters(loom, { family: 'dynamic-64k-1' })).toBe(false);
});

test('what was searched is said in words', () => {
  expect(searchWords({})).toBe('');
  expect(searchWords({ q: 'loom', maker: 'Hallebro Radio', bits: '8' })).toBe('“loom”, maker Hallebro Radio, 8 bits');
});

test('a chip family is named by what its id tells, and else by its id', () => {
  expect(familyLabel('dynamic-16k-1-three-rail')).toBe('16K × 1 dynamic, three rail');
  expect(familyLabel('static-32k-8')).toBe('32K × 8 static');
  expect(familyLabel('house-made')).toBe('house-made');
});
