import { heldWords, partWords, sideWords, socketWords } from '@/components/board/words';
import { board, boardOf } from './boards';

const socketAt = (slug: string, label: string) => board(slug).socketByLabel.get(label) ?? -1;

describe('which side is up', () => {
  const plain = boardOf({});

  test.each([
    [0, false, 'Component side, connector at the bottom'],
    [1, false, 'Component side, connector at the left'],
    [2, false, 'Component side, connector at the top'],
    [3, false, 'Component side, connector at the right'],
    [0, true, 'Solder side, connector at the bottom'],
    [1, true, 'Solder side, connector at the left'],
  ] as const)('%i quarter turns, solder side %s: %s', (turn, solderSide, words) => {
    expect(sideWords(plain, { turn, solderSide })).toBe(words);
  });

  test('a connector at the side changes sides when the board is turned over', () => {
    const tide = board('sandvoe-tg-3-issue-2');
    expect(sideWords(tide, { turn: 0, solderSide: false })).toBe('Component side, float encoder connector at the left');
    expect(sideWords(tide, { turn: 0, solderSide: true })).toBe('Solder side, float encoder connector at the right');
  });
});

describe('what is said of a socket', () => {
  const index = board('tarnvall-t-64-rev-b');

  test('its label, what it holds, what it did and its rank', () => {
    expect(socketWords(index, socketAt('tarnvall-t-64-rev-b', 'U31'), { state: 'failed', rank: 1 })).toBe(
      'U31, bit 5 of bank C, did not answer, suspect 1',
    );
  });

  test('nothing more than is known', () => {
    expect(socketWords(index, socketAt('tarnvall-t-64-rev-b', 'U10'))).toBe('U10, bit 0 of bank A');
  });

  test('bits of a wide chip are drawn together, and a parity bit is called one', () => {
    expect(heldWords(board('corvane-six-a1'), 2)).toBe('bits 0 to 7 of bank SEQ');
    const parity = boardOf({ banks: 1, bits: 8, parity: 1 });
    expect(heldWords(parity, 8)).toBe('the parity bit of bank A');
  });

  test('a chip that holds a part of the words says which', () => {
    expect(heldWords(boardOf({ banks: 1, bits: 2, deep: 2 }), 2)).toBe('bit 0 of bank A, words 65536 to 131071');
  });
});

test('a shared part says what it is, that it is shared, and its rank', () => {
  const part = board('tarnvall-t-64-rev-b').document.sharedParts[0]!;
  expect(partWords(part, { rank: 3 })).toBe('U52, data buffer, bits 4 to 7, shared part, suspect 3');
  expect(partWords(part)).toBe('U52, data buffer, bits 4 to 7, shared part');
});
