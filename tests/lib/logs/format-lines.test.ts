import { layoutDocument } from '@/shared';
import { buildLayoutIndex, findLinePatterns, openLogImport, parseReadings } from '@/lib';
import { boardC } from '../../factories/cases/board-c';
import { buildLayoutInput } from '../../factories/layout';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const nineBits = [0, 1, 2, 3, 4, 5, 6, 7, 8];

/** A board with parity whose machine shows all nine bits of a word in octal, bit 0 at the left in one of two ways. */
function parityBoard(bitOrder: 'low-first' | 'high-first') {
  const input = buildLayoutInput({ banks: 2, parity: 1 });
  const value = { notation: 'octal', digits: { min: 3, max: 3 }, bits: nineBits, bitOrder } as const;
  return buildLayoutIndex(
    layoutDocument.parse({
      ...input,
      reportFormats: [
        {
          id: 'store',
          name: 'Store line',
          parts: [
            { field: 'address', notation: 'octal', digits: { min: 6, max: 6 } },
            { text: ' IN ' },
            { field: 'written', ...value },
            { text: ' OUT ' },
            { field: 'read', ...value },
          ],
          after: 'lists-lanes',
        },
      ],
    }),
  );
}

const lines = ['000017 IN 000 OUT 400', '200017 IN 777 OUT 376', '000020 IN 252 OUT 252', 'SUM 3'];

describe('a log that is worded as a report format which columns cannot express', () => {
  it('offers the format first, and says why', () => {
    const [first] = findLinePatterns(parityBoard('low-first'), lines, { formats: 'too' });
    expect(first).toMatchObject({ format: 'store', reason: "The lines are worded as this board's “Store line”." });
    expect(findLinePatterns(parityBoard('low-first'), lines).some((pattern) => 'format' in pattern)).toBe(false);
  });

  it.each([
    ['low-first', 8],
    ['high-first', 0],
  ] as const)('is read with its parity bit, %s', (order, bitOfA) => {
    const log = openLogImport(parityBoard(order), { format: 'store', unit: 'address', shows: 'word' });
    log.push(bytesOf(lines.join('\r\n').slice(0, 30)));
    log.push(bytesOf(lines.join('\r\n').slice(30)));
    const { lanes, ...evidence } = log.finish();
    expect(evidence).toMatchObject({ lines: 4, readings: 3, unread: 1, outside: 0 });
    const seen = lanes.map(({ bank, bit, readsOne, readsZero, alone, words, first }) => [
      bank,
      bit,
      readsOne,
      readsZero,
      alone,
      words,
      first,
    ]);
    expect(seen).toEqual([
      ['A', bitOfA, 1, 0, 1, 1, 1],
      ['B', 0, 0, 1, 0, 1, 2],
      ['B', 8, 0, 1, 0, 1, 2],
    ]);
    expect(log.summary().unreadLines).toMatchObject([{ line: 4, text: 'SUM 3' }]);
  });

  it('is drawn together where it is pasted with the format said', () => {
    const { evidence, unread } = parseReadings(parityBoard('low-first'), lines.join('\n'), {
      pattern: { format: 'store', unit: 'address', shows: 'word' },
    });
    expect(evidence).toMatchObject({ kind: 'log', readings: 3 });
    expect(unread).toMatchObject([{ line: 4, text: 'SUM 3' }]);
  });

  it('is refused where the board has no such format', () => {
    expect(() => openLogImport(parityBoard('low-first'), { format: 'none', unit: 'address', shows: 'word' })).toThrow(
      RangeError,
    );
  });
});

it('takes from a report format of the board whether a log is octal and whether it counts words', () => {
  const index = buildLayoutIndex(layoutDocument.parse(boardC));
  const { evidence, pattern } = parseReadings(index, 'AT 013052 WANT 000000 GOT 000400');
  expect(pattern).toMatchObject({ notation: 'octal', unit: 'word', shows: 'word' });
  expect(pattern!.reason).toContain('“Octal word log”');
  expect(evidence).toMatchObject({ kind: 'readings', unit: 'word', lines: [{ address: 0o13052, read: 0o400 }] });
});
