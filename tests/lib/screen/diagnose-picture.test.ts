import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { diagnose } from '@/lib/diagnose/diagnose';
import { pictureOfChip } from '@/lib/screen/picture-of-chip';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, type Picture } from '@/shared';

const indexOf = (slug: string) =>
  buildLayoutIndex(layoutDocument.parse(demoBoards.find((each) => each.slug === slug)?.document));

/** The chips in the order of suspicion when the picture looks as it does with this chip dead. */
function chips(slug: string, label: string) {
  const index = indexOf(slug);
  const { marks } = pictureOfChip(index, { socket: index.socketByLabel.get(label)! })!;
  const picture: Picture = { kind: 'picture', marks: [...marks], rest: 'right' };
  const { suspects } = diagnose(index, [{ changes: [], evidence: [picture], complete: true }]);
  const weight = (socket: string) => suspects.find(({ id }) => id === `chip:${socket}`)?.probability ?? 0;
  return { first: suspects[0]?.id, weight };
}

describe('a picture with a dead chip', () => {
  it('names that chip first on the page display', () => {
    for (const label of ['N22', 'N37', 'N44']) {
      expect(chips('penhallow-formset-2-pd-3', label).first).toBe(`chip:${label}`);
    }
  });

  it('tells the upper chip from the lower where both hold the same bit', () => {
    for (const [dead, other] of [
      ['E29', 'E30'],
      ['E30', 'E29'],
      ['E01', 'E02'],
      ['E02', 'E01'],
    ] as const) {
      const { first, weight } = chips('rimstad-ct-7-rev-3', dead);
      expect(first).toBe(`chip:${dead}`);
      expect(weight(dead)).toBeGreaterThan(3 * weight(other));
    }
  });
});
