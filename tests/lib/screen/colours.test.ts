import { colourChoices, colourFault, colourName } from '@/lib/screen/colours';
import type { ScreenMap } from '@/shared';

const mapWith = (...colours: ScreenMap['planes'][number]['colour'][]): ScreenMap => ({
  width: 8,
  height: 2,
  base: 0,
  unitsPerLine: 1,
  pixelsPerUnit: 8,
  lineWeights: [1],
  turn: 0,
  planes: colours.map((colour, at) => ({ name: `plane ${at}`, colour, bits: [0, 1, 2, 3, 4, 5, 6, 7] })),
});

describe('the colours of a picture', () => {
  it('of red, green and blue planes mix as light does', () => {
    const map = mapWith('red', 'green', 'blue');
    const name = (...lit: number[]) => colourName(map, lit);
    expect([name(), name(0), name(1), name(2)]).toEqual(['black', 'red', 'green', 'blue']);
    expect([name(0, 1), name(1, 2), name(0, 2), name(0, 1, 2)]).toEqual(['yellow', 'cyan', 'magenta', 'white']);
  });

  it('show white without green as magenta, and green where a green dot stays lit', () => {
    expect(colourFault(mapWith('green', 'red', 'blue'), [0])).toEqual({
      missing: 'magenta in place of white',
      lit: 'green in place of black',
    });
  });

  it('of one plane are lit and dark', () => {
    expect(colourFault(mapWith('amber'), [0])).toEqual({
      missing: 'dark in place of lit',
      lit: 'lit in place of dark',
    });
  });

  it('of two white planes have a grey between', () => {
    expect(colourFault(mapWith('white', 'white'), [1]).missing).toBe('grey in place of white');
  });

  it('with an intensity plane are bright or not', () => {
    const map = mapWith('red', 'green', 'blue', 'intensity');
    expect(colourFault(map, [3])).toEqual({ missing: 'white in place of bright white', lit: 'grey in place of black' });
    expect(colourFault(map, [1]).missing).toBe('bright magenta in place of bright white');
  });

  it('of a chosen colour name the planes that are wrong, the fewest first', () => {
    const choices = (looks: 'missing' | 'lit') =>
      colourChoices(mapWith('green', 'red', 'blue'), looks).map(({ shows, planes }) => [shows, ...planes]);
    expect(choices('lit').slice(0, 4)).toEqual([
      ['green', 0],
      ['red', 1],
      ['blue', 2],
      ['yellow', 0, 1],
    ]);
    expect(choices('missing')).toEqual([
      ['magenta', 0],
      ['cyan', 1],
      ['yellow', 2],
      ['blue', 0, 1],
      ['red', 0, 2],
      ['green', 1, 2],
      ['black', 0, 1, 2],
    ]);
  });
});
