import * as fc from 'fast-check';
import { commonLabelSize, fitLabel, fitWords, letterWidth, wrapWords } from '@/components/board/geometry-label';

const label = fc.string({ minLength: 1, maxLength: 24 });
const width = fc.double({ min: 4, max: 300, noNaN: true });

describe('labels', () => {
  test('a label that is drawn is never wider than its socket nor smaller than can be read', () => {
    fc.assert(
      fc.property(label, width, (text, room) => {
        const fitted = fitLabel(text, { width: room, least: 8, most: 18 });
        if (!fitted) return;
        expect(letterWidth(fitted.text, 'mono') * fitted.size).toBeLessThanOrEqual(room + 1e-6);
        expect(fitted.size).toBeGreaterThanOrEqual(8);
        expect(fitted.size).toBeLessThanOrEqual(18);
      }),
    );
  });

  test('a long label shrinks first, and then keeps its end, by which sockets differ', () => {
    expect(fitLabel('Q-104B', { width: 60, least: 8, most: 18 })).toEqual({ text: 'Q-104B', size: 60 / (6 * 0.632) });
    expect(fitLabel('Q-104B', { width: 26, least: 8, most: 18 })).toEqual({ text: '…104B', size: 8 });
    expect(fitLabel('Q-104B', { width: 10, least: 8, most: 18 })).toBeNull();
  });

  test('one odd label does not make all others small', () => {
    const sizes = [...Array.from({ length: 31 }, () => 14), 3];
    expect(commonLabelSize(sizes, { least: 8, most: 18 })).toBe(14);
  });
});

describe('words', () => {
  test('the longest wording that fits is taken', () => {
    const wordings = ['data buffer, bits 0 to 3', 'data buffer'];
    expect(fitWords(wordings, { width: 200, least: 9, most: 13 })?.text).toBe(wordings[0]);
    expect(fitWords(wordings, { width: 80, least: 9, most: 13 })?.text).toBe('data buffer');
    expect(fitWords(wordings, { width: 20, least: 9, most: 13 })).toBeNull();
  });

  test('words in lines say the same, and no line is too wide', () => {
    fc.assert(
      fc.property(
        fc.array(fc.stringMatching(/^[a-zA-Z0-9]{1,9}$/), { minLength: 1, maxLength: 8 }),
        width,
        (words, room) => {
          const lines = wrapWords(words.join(' '), { width: room, size: 11, lines: 3 });
          if (!lines) return;
          expect(lines.join(' ')).toBe(words.join(' '));
          expect(lines.length).toBeLessThanOrEqual(3);
          for (const line of lines) expect(letterWidth(line, 'text') * 11).toBeLessThanOrEqual(room);
        },
      ),
    );
  });
});
