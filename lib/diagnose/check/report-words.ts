import type { Evidence, PlainEvidence, Run } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { listWords } from '../../layout/words';
import { buildAddressMap } from '../../place/address';
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
    case 'log':
      return (lanes) => (lanes.length === 0 ? nothing : maskWords(index, lanes, inWords));
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
    .findLast((each) => each.kind !== 'pass' && each.kind !== 'sign' && each.kind !== 'measurement');
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

/** "bits 3 and 5 of bank 0 (mask 28)", the mask of one address in the notation of the board. */
function maskWords(index: LayoutIndex, lanes: readonly Lane[], inWords: Reporter): string {
  const masks = new Set(byBank(index, lanes).flatMap((own) => masksOf(index, own)));
  return masks.size > 2 ? inWords(lanes) : `${inWords(lanes)} (mask ${[...masks].join(' and ')})`;
}

/** The failing bits of one bank as the addresses of a word show them. */
function masksOf(index: LayoutIndex, lanes: readonly Lane[]): string[] {
  const radix = radixOf[index.document.addressMap.notation];
  const [first] = lanes;
  if (first === undefined) return [];
  const failing = lanes.map((lane): number => index.bitOf(lane));
  const [window] = buildAddressMap(index).byBank.get(index.bankOf(first)) ?? [];
  const steps = window?.window.lanes ?? [Array.from({ length: index.bitCount }, (_, bit) => bit)];
  return steps.flatMap((carried) => {
    const places = carried.flatMap((bit, place) => (failing.includes(bit) ? [place] : []));
    if (places.length === 0) return [];
    const mask = places.reduce((all, place) => all | (1n << BigInt(place)), 0n);
    const width = ((1n << BigInt(carried.length)) - 1n).toString(radix).length;
    const text = mask.toString(radix).toUpperCase();
    return [radix === 10 ? text : text.padStart(width, '0')];
  });
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
