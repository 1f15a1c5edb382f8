import { type Lane, lane } from '@/lib/brand';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { validateLayout } from '@/lib/layout/validate';
import { compileFormat } from '@/lib/report/compile-format';
import { demoBoards } from '@/server/seeders/boards';
import { type LayoutDocument, layoutDocument } from '@/shared';

const boards = demoBoards.map(({ slug, document }) => {
  const parsed = layoutDocument.parse(document);
  return { slug, document: parsed, index: buildLayoutIndex(parsed) };
});

const documentOf = (slug: string) => boards.find((board) => board.slug === slug)!;

function formatsOf(index: LayoutIndex) {
  return index.document.reportFormats.map((format) => {
    const compiled = compileFormat(format, index);
    if (!compiled.ok) throw new Error(`${format.id}: ${compiled.reasons.map(({ message }) => message).join(' ')}`);
    return compiled.format;
  });
}

const socketsOf = (index: LayoutIndex, at: Lane) =>
  [...index.laneSockets.subarray(index.laneSocketStart[at], index.laneSocketStart[at + 1])].map(
    (socket) => index.document.sockets[socket]!.label,
  );

/** The lanes that the first socket of a lane holds, which a code for a socket blames together. */
function chipMates(index: LayoutIndex, at: Lane): number[] {
  const socket = index.laneSockets[index.laneSocketStart[at]!]!;
  return [...index.socketLanes.subarray(index.socketLaneStart[socket], index.socketLaneStart[socket + 1])];
}

/** The sockets that a code blames in each way to read it, sorted. */
function blamed(index: LayoutIndex, formatId: string, text: string): string[][] {
  const read = formatsOf(index)
    .find(({ id }) => id === formatId)!
    .read(text);
  if (!read.ok) throw new Error(`${text}: ${read.reason}`);
  return read.readings.map(({ failing }) => [...new Set(failing.flatMap((bad) => socketsOf(index, bad.lane)))].sort());
}

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

describe('every demo board', () => {
  it.each(boards)('$slug is a valid layout', ({ document }) => {
    expect(validateLayout(document)).toEqual([]);
  });

  it.each(boards)('$slug has worked examples that name their sockets', ({ document, index }) => {
    for (const { format, text, sockets } of document.examples)
      expect({ text, readings: blamed(index, format, text) }).toEqual({ text, readings: [[...sockets].sort()] });
  });

  it.each(boards)('$slug can report each of its lanes in every format, and reads it back', ({ index }) => {
    for (const format of formatsOf(index)) {
      for (const at of index.lanes) {
        const written = format.write([lane(at)]);
        const read = written.ok ? format.read(written.text) : written;
        const failing = read.ok ? read.readings.map((reading) => reading.failing.map((bad): number => bad.lane)) : read;
        const wanted: number[] = format.id === 'socket-line' ? chipMates(index, lane(at)) : [at];
        expect({ format: format.id, at, failing }).toMatchObject({ failing: expect.arrayContaining([wanted]) });
      }
    }
  });

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

  it.each(boards)('$slug says where its facts come from and shows a worked example of each format', ({ document }) => {
    expect(document.sources.length).toBeGreaterThanOrEqual(2);
    expect(document.examples.every(({ source }) => source !== undefined)).toBe(true);
    expect(new Set(document.examples.map(({ format }) => format))).toEqual(
      new Set(document.reportFormats.map(({ id }) => id)),
    );
  });
});

describe('the demo boards together', () => {
  it('share no label scheme, but for revisions of one board', () => {
    const owners = new Map<string, Set<string>>();
    for (const { document } of boards) {
      for (const scheme of schemesOf(document)) {
        owners.set(scheme, (owners.get(scheme) ?? new Set()).add(machineOf(document)));
      }
    }
    expect([...owners].filter(([, machines]) => machines.size > 1)).toEqual([]);
  });

  it('need the revision of the loom controller before a socket is named', () => {
    const [b, c] = [documentOf('tarnvall-t-64-rev-b').index, documentOf('tarnvall-t-64-rev-c').index];
    expect(blamed(b, 'lamp', 'B5')).toEqual([['U23']]);
    expect(blamed(c, 'lamp', 'B5')).toEqual([['U20']]);
  });

  it('leave open whether the survey recorder counts from 0 or from 1, until a number settles it', () => {
    const { index } = documentOf('wrayburn-gr-5-2b');
    expect(blamed(index, 'err', 'ERR 05').sort()).toEqual([['R309'], ['R311']]);
    expect(blamed(index, 'err', 'ERR 00')).toEqual([['R301']]);
    expect(blamed(index, 'err', 'ERR 24')).toEqual([['R423']]);
  });

  it('have slugs of their own', () => {
    expect(new Set(boards.map(({ slug }) => slug)).size).toBe(boards.length);
  });
});
