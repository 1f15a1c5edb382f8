import { addressMapOf, buildLayoutIndex, decodeAddress, validateLayout } from '@/lib';
import { layoutDocument } from '@/shared';
import { caseBoards } from '../../factories/cases';

describe('the boards of the bench cases', () => {
  it.each(Object.entries(caseBoards))('board %s has no error', (_letter, input) => {
    const problems = validateLayout(layoutDocument.parse(input));
    expect(problems.filter(({ severity }) => severity === 'error')).toEqual([]);
  });

  const placeOn = (letter: keyof typeof caseBoards, address: number) => {
    const index = buildLayoutIndex(layoutDocument.parse(caseBoards[letter]));
    return decodeAddress(addressMapOf(index), address).map(({ bank, word, bits }) => ({
      bank: index.document.memory.banks[bank]?.id,
      word,
      bits: bits.map(Number),
    }));
  };

  it('place an address as their wiring says', () => {
    expect(placeOn('A', 0x52a7)).toEqual([{ bank: '1', word: 0x12a7, bits: [0, 1, 2, 3, 4, 5, 6, 7] }]);
    expect(placeOn('C', 0x2c54)).toEqual([{ bank: '0', word: 0x162a, bits: [8, 9, 10, 11, 12, 13, 14, 15] }]);
    expect(placeOn('G', 0x12a0b)).toMatchObject([{ bank: 'O', word: 0x9505 }]);
    expect(placeOn('H', 0x1800 + 96 * 32)).toMatchObject([{ bank: 'GL', word: 0 }]);
  });
});
