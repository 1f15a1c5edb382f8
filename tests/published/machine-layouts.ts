import { lane } from '@/lib/brand';
import { buildLayoutIndex, compileFormat, validateLayout } from '@/lib';
import { type LayoutDocument, type LayoutDocumentInput, layoutDocument } from '@/shared';
import type { ibmPc } from './machine-charts';
import { bbcModelB, commodore64, spectrum48 } from './machine-charts';

interface Chart {
  readonly machine: string;
  readonly dataBits: number;
  readonly checkBits?: readonly number[];
  readonly family: string;
  readonly banks: readonly {
    readonly id: string;
    readonly words: number;
    readonly first?: number;
    readonly sockets: readonly string[];
  }[];
  readonly elsewhere?: NonNullable<LayoutDocumentInput['addressMap']>['elsewhere'];
  readonly formats: NonNullable<LayoutDocumentInput['reportFormats']>;
}

function layoutOf(chart: Chart): LayoutDocument {
  return layoutDocument.parse({
    format: 'rowcall.layout/1',
    board: { maker: 'As published', name: chart.machine, revision: 'As published' },
    memory: {
      dataBits: chart.dataBits,
      checkBits: [...(chart.checkBits ?? [])],
      banks: chart.banks.map(({ id, words }) => ({ id, words })),
    },
    addressMap: {
      windows: chart.banks.flatMap(({ id, words, first }) =>
        first === undefined ? [] : [{ range: { from: first, to: first + words - 1 }, banks: [id] }],
      ),
      elsewhere: chart.elsewhere ?? [],
    },
    sockets: chart.banks.flatMap(({ id, sockets }, row) =>
      sockets.map((label, bit) => ({
        label,
        x: bit * 12,
        y: row * 14,
        family: chart.family,
        holds: [{ bank: id, bit }],
      })),
    ),
    reportFormats: chart.formats,
  } satisfies LayoutDocumentInput);
}

/** Places of the 5150's chips are called by bank and bit here: the sources name no sockets. */
export const ibmSocket = (bank: number, bit: number) => (bit === 8 ? `BANK${bank}-P` : `BANK${bank}-${bit}`);

export function ibmLayout(chart: (typeof ibmPc)[number]): LayoutDocument {
  return layoutOf({
    machine: chart.machine,
    dataBits: 9,
    checkBits: [8],
    family: chart.family,
    banks: chart.banks.map(([first], bank) => ({
      id: String(bank),
      words: chart.bankWords,
      first: Number.parseInt(first, 16) * 0x1000,
      sockets: chart.bits.map((_, bit) => ibmSocket(bank, bit)),
    })),
    elsewhere: [
      {
        range: {
          from: Number.parseInt(chart.beyond.from, 16) * 0x1000,
          to: Number.parseInt(chart.beyond.to, 16) * 0x1000 + 0xfff,
        },
        means: chart.beyond.means,
      },
    ],
    formats: [
      {
        id: 'start-up',
        name: 'Start-up error',
        after: 'stops',
        parts: [
          { field: 'address', notation: 'hexadecimal', shift: 12, digits: { min: 2, max: 2 } },
          { field: 'mask', notation: 'hexadecimal', digits: { min: 2, max: 2 }, table: [{ text: '00', bits: [8] }] },
          { text: ' 201' },
        ],
      },
    ],
  });
}

export function commodoreLayout(): LayoutDocument {
  return layoutOf({
    machine: commodore64.machine,
    dataBits: 8,
    family: 'dynamic-64k-1',
    banks: [{ id: 'RAM', words: 0x10000, first: 0, sockets: commodore64.socketsFromD0 }],
    formats: [
      {
        id: 'screen',
        name: 'Written and read',
        after: 'lists-lanes',
        parts: [
          { field: 'written', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
          { text: ' ' },
          { field: 'read', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
        ],
      },
    ],
  });
}

export function spectrumLayout(): LayoutDocument {
  const poke = (written: number) => ({
    id: `wrote-${written}`,
    name: `Read back after ${written}`,
    after: 'lists-lanes' as const,
    written,
    parts: [{ field: 'address' as const }, { text: ' ' }, { field: 'read' as const }],
  });
  return layoutOf({
    machine: spectrum48.machine,
    dataBits: 8,
    family: 'dynamic-64k-1',
    banks: spectrum48.banks.map(({ bank, from, to, socketsFromD0 }) => ({
      id: bank,
      words: to - from + 1,
      first: from,
      sockets: socketsFromD0,
    })),
    formats: [poke(85), poke(170)],
  });
}

export function bbcLayout(): LayoutDocument {
  return layoutOf({
    machine: bbcModelB.machine,
    dataBits: 8,
    family: 'dynamic-16k-1-three-rail',
    banks: bbcModelB.banks.map(({ bank, socketsFromD0 }, n) => ({
      id: bank,
      words: 0x4000,
      first: n * 0x4000,
      sockets: socketsFromD0,
    })),
    formats: [
      {
        id: 'place',
        name: 'Bank and bit',
        after: 'lists-lanes',
        parts: [{ field: 'bank', notation: 'names' }, { text: ' D' }, { field: 'bit' }],
      },
      { id: 'label', name: 'Socket', after: 'lists-lanes', parts: [{ field: 'socket', notation: 'names' }] },
    ],
  });
}

/** A published layout with its formats ready, and the way from a text to the sockets that it names. */
export function readyLayout(document: LayoutDocument) {
  const index = buildLayoutIndex(document);
  const errors = validateLayout(document).filter(({ severity }) => severity === 'error');
  const format = (id: string) => {
    const compiled = compileFormat(
      document.reportFormats.find((candidate) => candidate.id === id)!,
      index,
    );
    if (!compiled.ok) throw new Error(compiled.reasons.map(({ message }) => message).join(' '));
    return compiled.format;
  };
  const socketsOf = (lanes: readonly number[]) =>
    lanes.flatMap((of) =>
      Array.from(
        index.laneSockets.slice(index.laneSocketStart[of], index.laneSocketStart[of + 1]),
        (at) => document.sockets[at]!.label,
      ),
    );
  const sockets = (id: string, text: string): string[] | string => {
    const read = format(id).read(text);
    if (!read.ok) return read.reason;
    return read.readings.flatMap(({ failing }) => socketsOf(failing.map((bad) => bad.lane)));
  };
  const back = (id: string, label: string) => {
    const at = index.socketByLabel.get(label)!;
    const lanes = Array.from(index.socketLanes.slice(index.socketLaneStart[at], index.socketLaneStart[at + 1]), lane);
    return format(id).write(lanes);
  };
  return { index, errors, sockets, back };
}
