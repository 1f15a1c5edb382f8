import type { LayoutDocument } from '@/shared';
import type { Lane } from '../brand';
import { addressMapOf, type AddressMap } from '../place/address';
import { blamedSockets } from '../report/blamed-sockets';
import { compileFormat } from '../report/compile-format';
import type { CompiledFormat } from '../report/meaning';
import type { LayoutIndex } from './layout-index';
import { partDifferences, socketDifferences, type ThingDifference } from './part-difference';

/** A lane that other sockets hold now. An empty list: the board has, or had, no such lane. */
export interface LaneDifference {
  readonly bank: string;
  readonly bit: number;
  readonly before: readonly string[];
  readonly after: readonly string[];
}

/** A code that names other sockets now. An empty list: it is, or was, no code of this board. */
export interface CodeDifference {
  readonly text: string;
  readonly before: readonly string[];
  readonly after: readonly string[];
}

/** What became of a report format, by its id. */
export interface FormatDifference {
  readonly id: string;
  readonly name: string;
  readonly state: 'new' | 'gone' | 'kept';
  /** How many codes that name one lane were compared. */
  readonly codes: number;
  readonly changed: readonly CodeDifference[];
  /** Its wording, its order of test or what it does after a failure is another, whatever the codes say. */
  readonly reworded: boolean;
}

/** What differs between two layouts, the question that matters first: which socket a code names. */
export interface LayoutDifference {
  readonly lanes: readonly LaneDifference[];
  readonly sameLanes: number;
  readonly formats: readonly FormatDifference[];
  readonly sockets: readonly ThingDifference[];
  readonly sharedParts: readonly ThingDifference[];
  /** Other sections of the document that are not the same, by name. */
  readonly sections: readonly (keyof LayoutDocument)[];
}

interface Side {
  readonly index: LayoutIndex;
  readonly map: AddressMap;
  readonly formats: ReadonlyMap<string, CompiledFormat>;
}

const otherSections = [
  'board',
  'memory',
  'addressMap',
  'multiplexing',
  'families',
  'rails',
  'screenMap',
  'sources',
  'examples',
] as const satisfies readonly (keyof LayoutDocument)[];

/** Compares two layouts of one board, or of two of its revisions. Takes time in the number of lanes and formats. */
export function compareLayouts(before: LayoutIndex, after: LayoutIndex): LayoutDifference {
  const sides = { before: sideOf(before), after: sideOf(after) };
  const lanes = compareLanes(before, after);
  return {
    lanes: lanes.filter((lane) => !sameSet(lane.before, lane.after)),
    sameLanes: lanes.filter((lane) => sameSet(lane.before, lane.after)).length,
    formats: compareFormats(sides),
    sockets: socketDifferences(before.document, after.document),
    sharedParts: partDifferences(before.document, after.document),
    sections: otherSections.filter((name) => !alike(before.document[name], after.document[name])),
  };
}

const alike = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

const sameSet = (a: readonly string[], b: readonly string[]) =>
  a.length === b.length && a.every((label) => b.includes(label));

function sideOf(index: LayoutIndex): Side {
  const formats = new Map<string, CompiledFormat>();
  for (const definition of index.document.reportFormats) {
    const compiled = compileFormat(definition, index);
    if (compiled.ok && !formats.has(definition.id)) formats.set(definition.id, compiled.format);
  }
  return { index, map: addressMapOf(index), formats };
}

function compareLanes(before: LayoutIndex, after: LayoutIndex): LaneDifference[] {
  const found = new Map<string, LaneDifference>();
  for (const [index, side] of [
    [before, 'before'],
    [after, 'after'],
  ] as const) {
    for (const n of index.lanes) {
      const lane = n as Lane;
      const bank = index.document.memory.banks[index.bankOf(lane)]?.id ?? '';
      const bit = index.bitOf(lane);
      const key = `${bit}/${bank}`;
      const entry = found.get(key) ?? { bank, bit, before: [], after: [] };
      found.set(key, { ...entry, [side]: socketsOfLane(index, lane) });
    }
  }
  return [...found.values()];
}

/** Labels of the sockets that hold a lane. */
export function socketsOfLane(index: LayoutIndex, lane: Lane): string[] {
  const held = index.laneSockets.subarray(index.laneSocketStart[lane], index.laneSocketStart[lane + 1]);
  return Array.from(held, (at) => index.document.sockets[at]?.label ?? '');
}

function compareFormats({ before, after }: { before: Side; after: Side }): FormatDifference[] {
  const definitions = (side: Side) => side.index.document.reportFormats;
  const ids = [...new Set([...definitions(after), ...definitions(before)].map(({ id }) => id))];
  return ids.map((id): FormatDifference => {
    const old = definitions(before).find((format) => format.id === id);
    const now = definitions(after).find((format) => format.id === id);
    const { codes, changed } = compareCodes({ before, after }, id);
    return {
      id,
      name: now?.name ?? old?.name ?? id,
      state: old === undefined ? 'new' : now === undefined ? 'gone' : 'kept',
      codes,
      changed,
      reworded: old !== undefined && now !== undefined && !alike(old, now),
    };
  });
}

/** Every code for one lane that either layout can write, and what each of the two makes of it. */
function compareCodes({ before, after }: { before: Side; after: Side }, id: string) {
  const old = before.formats.get(id);
  const now = after.formats.get(id);
  if (old === undefined || now === undefined) return { codes: 0, changed: [] };
  const texts = new Set([...codesOf(before.index, old), ...codesOf(after.index, now)]);
  const changed: CodeDifference[] = [];
  for (const text of texts) {
    const named = { before: blamed(before, old.read(text)), after: blamed(after, now.read(text)) };
    if (!sameSet(named.before, named.after)) changed.push({ text, ...named });
  }
  return { codes: texts.size, changed };
}

function codesOf(index: LayoutIndex, format: CompiledFormat): string[] {
  return Array.from(index.lanes, (lane) => format.write([lane as Lane])).flatMap((written) =>
    written.ok ? [written.text] : [],
  );
}

function blamed({ index, map }: Side, read: ReturnType<CompiledFormat['read']>): string[] {
  if (!read.ok) return [];
  const sockets = new Set(read.readings.flatMap((reading) => blamedSockets(index, map, reading)));
  return [...sockets].map((at) => index.document.sockets[at]?.label ?? '');
}
