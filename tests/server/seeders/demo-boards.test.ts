import { layoutDocument, type LayoutDocument } from '@/shared';
import { demoBoards } from '@/server/seeders/boards';

const boards = demoBoards.map(({ slug, document }) => ({ slug, document: layoutDocument.parse(document) }));

/** Letters and figures of a label made alike, so that U10 and U41 are one scheme and K3/4 another. */
const schemeOf = (label: string) => label.replace(/[0-9]+/g, '9');

const schemesOf = (document: LayoutDocument) => new Set(document.sockets.map(({ label }) => schemeOf(label)));

const machineOf = ({ board }: LayoutDocument) => `${board.maker}, ${board.name}`;

/** The corners of a socket or a part on the sketch, turned as it lies. */
function outline(part: { x?: number; y?: number; width: number; height: number; turn: number }) {
  const [width, height] = part.turn % 2 === 0 ? [part.width, part.height] : [part.height, part.width];
  const { x = 0, y = 0 } = part;
  return { left: x - width / 2, right: x + width / 2, top: y - height / 2, bottom: y + height / 2 };
}

describe('the demo boards', () => {
  it.each(boards)('$slug has sockets and parts that leave room for one another', ({ document }) => {
    const drawn = [...document.sockets, ...document.sharedParts.filter(({ x }) => x !== undefined)];
    const crowded = drawn.flatMap((a, at) =>
      drawn.slice(at + 1).flatMap((b) => {
        const [one, two] = [outline(a), outline(b)];
        const across = Math.max(one.left - two.right, two.left - one.right);
        const down = Math.max(one.top - two.bottom, two.top - one.bottom);
        return Math.max(across, down) < 1.5 ? [`${a.label} and ${b.label}`] : [];
      }),
    );
    expect(crowded).toEqual([]);
  });

  it.each(boards)(
    '$slug says where its facts come from and shows a worked example of each settled format',
    ({ document }) => {
      expect(document.sources.length).toBeGreaterThanOrEqual(2);
      expect(document.examples.every(({ source }) => source !== undefined)).toBe(true);
      expect(new Set(document.examples.map(({ format }) => format))).toEqual(
        new Set(document.reportFormats.map(({ id }) => id)),
      );
    },
  );

  it('share no label scheme, but for revisions of one board', () => {
    const owners = new Map<string, Set<string>>();
    for (const { document } of boards) {
      for (const scheme of schemesOf(document)) {
        owners.set(scheme, (owners.get(scheme) ?? new Set()).add(machineOf(document)));
      }
    }
    expect([...owners].filter(([, machines]) => machines.size > 1)).toEqual([]);
  });

  it('have slugs of their own', () => {
    expect(new Set(boards.map(({ slug }) => slug)).size).toBe(boards.length);
  });
});
