import type { AddressWindow, LayoutDocument } from '@/shared';
import { addressesIn, runsOfAddresses, type AddressRun } from './addresses';
import { SimulatedBench } from './bench';
import { inFormat } from './emit';
import type { ChipShape } from './faults';
import { shapeOf } from './lane-state';
import { bitOf, inputsOf, wiringOf, type Port, type Wiring } from './wiring';

/** Addresses at which a fault shows, and the register value that they need. */
export interface AddressSpan extends AddressRun {
  readonly register: { readonly name: string; readonly value: number } | null;
}

/** What the machine shows when the chip in one socket has failed. */
export interface ChipEffect {
  /** The lanes that fail when all of it has failed. */
  readonly lanes: readonly { readonly bank: string; readonly bit: number }[];
  /** What each report format then says; nothing where it cannot say it. */
  readonly codes: readonly { readonly format: string; readonly texts: readonly string[] }[];
  /** The addresses of all its words. Empty where the layout has no window for them. */
  readonly whole: readonly AddressSpan[];
  /** A dead row of it, the one of its first word, and a dead column; null where the layout does not say what they are. */
  readonly row: ShapeEffect | null;
  readonly column: ShapeEffect | null;
}

/** Where a row or a column of a chip lies. */
export interface ShapeEffect {
  /** Words of the chip that fail. */
  readonly words: number;
  readonly spans: readonly AddressSpan[];
}

/** Rows and columns of more words than this are not listed. */
const mostWords = 4096;

/**
 * The inverse look-up: what the board reports, and at which addresses, if the chip in a socket (by its place in the
 * layout's list) fails whole, in a row or in a column. Null for a socket that holds nothing of the memory. Chips are
 * taken to fail at a fixed level; codes with an address show the first failing word that is simulated.
 */
export function effectOf(document: LayoutDocument, socket: number): ChipEffect | null {
  const wiring = wiringOf(document);
  const ports = (wiring.portsOfPosition[socket] ?? []).map((at) => wiring.ports[at] as Port);
  if (ports.length === 0) return null;
  const bench = new SimulatedBench(wiring, {
    faults: [
      {
        kind: 'chip',
        chip: `chip:${wiring.labels[socket]}`,
        pin: null,
        shape: 'whole',
        word: 0,
        addressBit: 0,
        reads: 0,
        intermittent: false,
      },
    ],
    random: () => 0.5,
  });
  const result = bench.run();
  return {
    lanes: result.lanes.map((lane) => ({
      bank: wiring.banks[Math.floor(lane / wiring.bits)] ?? '',
      bit: lane % wiring.bits,
    })),
    codes: document.reportFormats.map((format) => ({
      format: format.id,
      texts: inFormat(wiring, format, result).evidence.flatMap((each) => (each.kind === 'code' ? [each.text] : [])),
    })),
    whole: spansOf(ports, (port) => wholeSpans(wiring, port)),
    row: shapeEffect(wiring, { socket, ports, shape: 'row' }),
    column: shapeEffect(wiring, { socket, ports, shape: 'column' }),
  };
}

/** Ports of one chip that carry the same words of the same byte lie at the same addresses. */
function spansOf(ports: readonly Port[], spans: (port: Port) => AddressSpan[]): AddressSpan[] {
  const found = new Map<string, AddressSpan>();
  for (const span of ports.flatMap(spans)) found.set(JSON.stringify(span), span);
  return [...found.values()].sort((a, b) => a.first - b.first);
}

function addressOfBit(wiring: Wiring, window: AddressWindow, { bank, bit, word }: Port & { word: number }) {
  return addressesIn(wiring, window, { bank, word }).find(({ bits }) => bits.includes(bit))?.address;
}

/** The first and last address of a port in each window, and the step, which is 0 where they do not lie evenly. */
function wholeSpans(wiring: Wiring, port: Port): AddressSpan[] {
  return wiring.document.addressMap.windows.flatMap((window): AddressSpan[] => {
    const { range, firstWord, lanes, interleave } = window;
    const share = (lanes?.length ?? 1) * 2 ** interleave.length;
    const from = Math.max(port.from, firstWord);
    const to = Math.min(port.to, firstWord + Math.floor((range.to - range.from + 1) / share) - 1);
    const at = (word: number) => addressOfBit(wiring, window, { ...port, word });
    const [first, last] = [at(from), at(to)];
    if (first === undefined || last === undefined || to < from) return [];
    const step = to > from ? (last - first) / (to - from) : 0;
    const even = [1, 2, 3, 5, 17, 64, 1000].every((n) => from + n > to || at(from + n) === first + n * step);
    const count = to - from + 1;
    return [{ first, last, step: even ? step : 0, count, register: window.register ?? null }];
  });
}

function shapeEffect(
  wiring: Wiring,
  { socket, ports, shape }: { socket: number; ports: readonly Port[]; shape: Extract<ChipShape, 'row' | 'column'> },
): ShapeEffect | null {
  if (!wiring.document.multiplexing) return null;
  const inputs = inputsOf(wiring, socket);
  const free = shape === 'row' ? inputs.column : inputs.row;
  const other = shape === 'row' ? inputs.row : inputs.column;
  const words = 2 ** free.length;
  if (free.length === 0 || other.length === 0 || words > mostWords) return null;
  const first = Math.min(...ports.map(({ at }) => at));
  const within = shapeOf(wiring, socket, { shape, word: first, addressBit: 0 });
  const inside = Array.from({ length: words }, (_, choice) =>
    free.reduce((at, bit, n) => at + (bitOf(choice, n) - bitOf(first, bit)) * 2 ** bit, first),
  ).filter(within);
  const spans = spansOf(ports, (port) =>
    wiring.document.addressMap.windows.flatMap((window) => {
      const addresses = inside.flatMap((word) => {
        const own = word - port.at + port.from;
        return own < port.from || own > port.to ? [] : (addressOfBit(wiring, window, { ...port, word: own }) ?? []);
      });
      const runs = runsOfAddresses(addresses.sort((a, b) => a - b));
      return runs.map((run) => ({ ...run, register: window.register ?? null }));
    }),
  );
  return { words, spans };
}
