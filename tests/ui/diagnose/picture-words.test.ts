import { benchOf } from '@/components/features/diagnose/bench';
import { evidenceWords } from '@/components/features/diagnose/evidence-words';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, type Picture } from '@/shared';

const bench = benchOf(
  layoutDocument.parse(demoBoards.find(({ slug }) => slug === 'penhallow-formset-2-pd-3')?.document),
)!;

describe('a picture in the list of what was seen', () => {
  it('says where it is wrong and in which colour, and what of the rest', () => {
    const picture: Picture = {
      kind: 'picture',
      rest: 'right',
      marks: [{ looks: 'missing', planes: ['type'], x: [2, 2], everyX: 8, y: [96, 191] }],
    };
    expect(evidenceWords(picture, bench)).toEqual({
      text: 'Every eighth column from column 2, lines 96 to 191, magenta in place of white',
      note: 'the rest of the picture is right',
      code: false,
    });
    expect(evidenceWords({ ...picture, rest: 'unknown' }, bench).note).toBe('the rest of it was not looked at');
  });

  it('counts the marks that are too many to be told', () => {
    const marks = [0, 1, 2, 3, 4].map((x): Picture['marks'][number] => ({ looks: 'wrong', x: [x, x], y: [0, 0] }));
    expect(evidenceWords({ kind: 'picture', rest: 'right', marks }, bench).text).toMatch(/; and 2 more$/);
  });
});
