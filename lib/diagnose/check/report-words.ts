import type { Evidence, PlainEvidence, Run } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { listWords } from '../../layout/words';
import { testSequence } from '../../report/silence';
import { compiledFormats } from '../compiled-formats';
import { lanesWords } from '../lane-words';

/** What the board will show for these failing lanes, in the way it showed its last failure. */
export type Reporter = (lanes: readonly Lane[]) => string;

const nothing = 'no failure';
/** Longer lists of codes are told in words. */
const mostCodes = 6;

/** The way in which this board told its failures last: a code, values of words, a picture, or lanes in words. */
export function reporterFor(index: LayoutIndex, runs: readonly Run[]): Reporter {
  const inWords: Reporter = (lanes) => (lanes.length === 0 ? nothing : lanesWords(index, lanes));
  const last = lastTelling(runs);
  switch (last?.kind) {
    case 'code':
      return codeReporter(index, last.format, inWords);
    case 'mask':
    case 'readings':
    case 'log': {
      const steps = stepsOf(index, last);
      return (lanes) => (lanes.length === 0 ? nothing : maskWords(index, lanes, { steps, inWords }));
    }
    case 'picture':
      return (lanes) => (lanes.length === 0 ? 'a right picture' : pictureWords(index, lanes, inWords));
    default:
      return inWords;
  }
}

/** The last piece of evidence that can name a lane. */
function lastTelling(runs: readonly Run[]): PlainEvidence | undefined {
  const plain = (each: Evidence): PlainEvidence | undefined => (each.kind === 'either' ? each.ways[0]?.evidence : each);
  return runs
    .flatMap((run) => run.evidence)
    .map(plain)
    .filter((each) => each !== undefined)
    .findLast(
      (each) => each.kind !== 'pass' && each.kind !== 'sign' && each.kind !== 'measurement' && each.kind !== 'finding',
    );
}

function codeReporter(index: LayoutIndex, id: string, inWords: Reporter): Reporter {
  const format = compiledFormats(index).get(id);
  const definition = index.document.reportFormats.find((each) => each.id === id);
  if (!format || !definition) return inWords;
  const write = (lanes: readonly Lane[]): string | null => {
    const written = format.write(lanes);
    return written.ok ? written.text : null;
  };
  const order = definition.after === 'stops' ? testSequence(definition, index) : [];
  return (lanes) => {
    if (lanes.length === 0) return nothing;
    const groups =
      order.length > 0
        ? [firstTested(order, lanes)]
        : definition.after === 'lists-lanes'
          ? lanes.map((at) => [at])
          : byBank(index, lanes);
    const codes = groups.map((group) => write(group) ?? listed(group.map((at) => write([at]))));
    if (codes.length > mostCodes || codes.some((code) => code === null)) return inWords(lanes);
    return codes.join(', ');
  };
}

const listed = (codes: readonly (string | null)[]): string | null =>
  codes.some((code) => code === null) || codes.length > mostCodes ? null : codes.join(', ');

/** What a test that stops at the first failure gets to say of them. */
function firstTested(order: readonly (readonly Lane[])[], lanes: readonly Lane[]): readonly Lane[] {
  for (const group of order) {
    const failing = group.filter((lane) => lanes.includes(lane));
    if (failing.length > 0) return failing;
  }
  return lanes;
}

function byBank(index: LayoutIndex, lanes: readonly Lane[]): Lane[][] {
  const banks = new Map<number, Lane[]>();
  for (const lane of lanes) {
    const list = banks.get(index.bankOf(lane));
    if (list) list.push(lane);
    else banks.set(index.bankOf(lane), [lane]);
  }
  return [...banks.values()];
}

const radixOf = { hexadecimal: 16, octal: 8, decimal: 10 } as const;

/** The bits that one value shows, the lowest first, by bank. */
type Steps = (bank: number) => readonly (readonly number[])[];

/** Whole words, or what each address of a word carries where the readings gave that. */
function stepsOf(index: LayoutIndex, last: PlainEvidence): Steps {
  const whole = [Array.from({ length: index.bitCount }, (_, bit) => bit)];
  if (last.kind !== 'readings' || last.shows === 'word') return () => whole;
  return (bank) => {
    const id = index.document.memory.banks[bank]?.id ?? '';
    return index.document.addressMap.windows.find(({ banks }) => banks.includes(id))?.lanes ?? whole;
  };
}

/** "bits 3 and 5 of bank 0 (mask 28)", the mask in the notation of the board. */
function maskWords(
  index: LayoutIndex,
  lanes: readonly Lane[],
  { steps, inWords }: { steps: Steps; inWords: Reporter },
): string {
  const radix = radixOf[index.document.addressMap.notation];
  const masks = byBank(index, lanes).flatMap((own) => {
    const failing = own.map((lane): number => index.bitOf(lane));
    return steps(index.bankOf(own[0] as Lane)).flatMap((carried) => {
      const places = carried.flatMap((bit, place) => (failing.includes(bit) ? [place] : []));
      return places.length === 0 ? [] : [maskText(places, { radix, width: carried.length })];
    });
  });
  const different = [...new Set(masks)];
  return different.length > 2 ? inWords(lanes) : `${inWords(lanes)} (mask ${different.join(' and ')})`;
}

function maskText(places: readonly number[], { radix, width }: { radix: number; width: number }): string {
  const text = places
    .reduce((all, place) => all | (1n << BigInt(place)), 0n)
    .toString(radix)
    .toUpperCase();
  return radix === 10 ? text : text.padStart(((1n << BigInt(width)) - 1n).toString(radix).length, '0');
}

/** "bit 4 of bank GL: dots at x = 3, 11, 19 and so on". */
function pictureWords(index: LayoutIndex, lanes: readonly Lane[], inWords: Reporter): string {
  const map = index.document.screenMap;
  const bits = [...new Set(lanes.map((lane): number => index.bitOf(lane)))];
  const [bit] = bits;
  if (!map || bit === undefined || bits.length > 1) return inWords(lanes);
  const places = new Set(map.planes.flatMap((plane) => (plane.bits.includes(bit) ? [plane.bits.indexOf(bit)] : [])));
  const [place] = places;
  if (place === undefined || places.size > 1) return inWords(lanes);
  const columns = [0, 1, 2].map((unit) => place + unit * map.pixelsPerUnit).filter((x) => x < map.width);
  return `${inWords(lanes)}: dots at x = ${listWords(columns.map(String))}${columns.length === 3 ? ' and so on' : ''}`;
}
