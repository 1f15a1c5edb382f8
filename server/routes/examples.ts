import { buildLayoutIndex, diagnose } from '@/lib';
import { demoBoards } from '@/server/seeders/boards';
import { checkLayout } from '@/server/services/layout-check';
import { layoutDocument, type LayoutDocumentInput, type RunInput } from '@/shared';
import type { LayoutCheck, LayoutsPage } from '@/shared/api/layouts';
import { runs } from '@/shared/evidence';

/** The address of the demo board that the API's documentation takes for its examples. */
export const exampleSlug = 'tarnvall-t-64-rev-b';

const exampleBoard = () => {
  const board = demoBoards.find(({ slug }) => slug === exampleSlug);
  if (!board) throw new RangeError(`there is no demo board ${exampleSlug}`);
  return layoutDocument.parse(board.document);
};

/** A lamp code, and what came after two chips had changed places: the fault went with the chip. */
const exampleRuns: RunInput[] = [
  { evidence: [{ kind: 'code', format: 'lamp', text: 'C5' }] },
  {
    changes: [{ kind: 'swap', sockets: ['U31', 'U30'] }],
    evidence: [{ kind: 'code', format: 'lamp', text: 'C4' }],
  },
];

/** A diagnosis of a demo board. The answer is made by the engine, so it is never out of date. */
export const diagnosisExample = {
  body: { layout: exampleSlug, runs: exampleRuns },
  answer: () => diagnose(buildLayoutIndex(exampleBoard()), runs.parse(exampleRuns)),
};

/** A small layout document without fault, to start from: one bank of four one-bit chips. */
export const exampleDocument: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Example Works',
    name: 'Four-bit store',
    revision: '1',
    kind: 'other',
    marks: ['Silk screen: "4-BIT STORE 1"'],
  },
  memory: { dataBits: 4, banks: [{ id: '0', words: 16_384 }] },
  addressMap: { digits: 4, windows: [{ range: { from: '0x0000', to: '0x3FFF' }, banks: ['0'] }] },
  sockets: [0, 1, 2, 3].map((bit) => ({
    label: `U${bit + 1}`,
    x: bit * 12,
    y: 0,
    family: 'dynamic-16k-1-three-rail',
    holds: [{ bank: '0', bit }],
  })),
  reportFormats: [
    {
      id: 'code',
      name: 'Error code',
      where: 'The display, after switching on.',
      parts: [{ text: 'E' }, { field: 'bit' }],
      after: 'stops',
    },
  ],
  sources: [{ title: 'Invented for this example', kind: 'other' }],
  examples: [{ format: 'code', text: 'E2', sockets: ['U3'] }],
};

/** What the check says of the small document. */
export const exampleCheck = (): LayoutCheck => checkLayout(exampleDocument);

/** A page of the library with the demo board. */
export const exampleList = (): LayoutsPage => {
  const { board, memory, sockets } = exampleBoard();
  const { maker, name, revision, kind, year = null } = board;
  return {
    items: [
      {
        ...{ slug: exampleSlug, maker, name, revision, kind, year },
        families: [...new Set(sockets.map(({ family }) => family))],
        dataBits: memory.dataBits,
        banks: memory.banks.length,
        sockets: sockets.length,
        number: 1,
        publishedAt: '2026-01-05T09:00:00.000Z',
      },
    ],
    nextCursor: null,
  };
};
