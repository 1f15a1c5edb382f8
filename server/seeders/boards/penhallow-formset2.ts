import type { LayoutDocumentInput } from '@/shared';
import { labelled, lineOfSockets, numbers } from './place';

const family = 'dynamic-64k-1';
const window = { from: '0x10000', to: '0x1FFFF' };

const planeRow = (bank: string, firstLabel: number, y: number) =>
  lineOfSockets({
    labels: labelled('N', numbers(firstLabel, firstLabel + 7)),
    start: { x: 0, y },
    step: { x: 10, y: 0 },
    socket: { family },
    holds: (bit) => [{ bank, bit }],
  });

const gridColumn = lineOfSockets({
  labels: labelled('N', numbers(40, 47)),
  start: { x: 84, y: 0 },
  step: { x: 0, y: 10 },
  socket: { family, turn: 1 },
  holds: (bit) => [{ bank: 'GRID', bit }],
});

/** Typesetter's display: three planes of a bitmap, each with data lines of its own. */
export const penhallowFormset2: LayoutDocumentInput = {
  format: 'rowcall.layout/1',
  board: {
    maker: 'Penhallow Type Systems',
    name: 'Formset 2 page display',
    revision: 'PD-3',
    kind: 'display',
    year: 1985,
    notes:
      'The page picture of a typesetting desk, 1024 by 512 points in three colours. Each colour is a plane of 64 KB at the same addresses, chosen by the plane register. Even lines come from the lower half of a plane, odd lines from the upper. The tube holds its charge long after the plug is out.',
    marks: [
      'White block on the silk screen: "FORMSET PD-3"',
      'Two rows of chips and a column at the right that form an L',
    ],
    view: { side: 'component', edge: 'top', edgeName: 'tube cable' },
  },
  memory: {
    dataBits: 8,
    banks: [
      { id: 'TYPE', name: 'type, green', words: '0x10000', dataLines: 'type' },
      { id: 'RULE', name: 'rules, red', words: '0x10000', dataLines: 'rule' },
      { id: 'GRID', name: 'grid, blue', words: '0x10000', dataLines: 'grid' },
    ],
  },
  addressMap: {
    digits: 5,
    windows: [
      { range: window, register: { name: 'PLANE', value: 1 }, banks: ['TYPE'] },
      { range: window, register: { name: 'PLANE', value: 2 }, banks: ['RULE'] },
      { range: window, register: { name: 'PLANE', value: 4 }, banks: ['GRID'] },
    ],
  },
  multiplexing: { row: [0, 1, 2, 3, 4, 5, 6, 13], column: [7, 8, 9, 10, 11, 12, 14, 15] },
  sockets: [...planeRow('TYPE', 20, 0), ...planeRow('RULE', 30, 12.5), ...gridColumn],
  sharedParts: [
    {
      label: 'N51',
      name: 'shift register, type',
      role: 'shift-register',
      x: 7,
      y: 26,
      width: 22,
      serves: { banks: ['TYPE'] },
    },
    {
      label: 'N52',
      name: 'shift register, rules',
      role: 'shift-register',
      x: 35,
      y: 26,
      width: 22,
      serves: { banks: ['RULE'] },
    },
    {
      label: 'N53',
      name: 'shift register, grid',
      role: 'shift-register',
      x: 63,
      y: 26,
      width: 22,
      serves: { banks: ['GRID'] },
    },
    {
      label: 'N54',
      name: 'data buffer, type',
      role: 'data-buffer',
      x: 7,
      y: 36,
      width: 22,
      serves: { banks: ['TYPE'] },
    },
    {
      label: 'N55',
      name: 'data buffer, rules',
      role: 'data-buffer',
      x: 35,
      y: 36,
      width: 22,
      serves: { banks: ['RULE'] },
    },
    {
      label: 'N56',
      name: 'data buffer, grid',
      role: 'data-buffer',
      x: 63,
      y: 36,
      width: 22,
      serves: { banks: ['GRID'] },
    },
    {
      label: 'N57',
      name: 'column strobe of each plane',
      role: 'strobe-driver',
      x: 7,
      y: 50,
      width: 22,
      channels: 'bank',
      serves: {},
    },
    {
      label: 'N58',
      name: 'multiplexer, A0 to A3',
      role: 'multiplexer',
      x: 35,
      y: 50,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [0, 1, 2, 3, 7, 8, 9, 10] },
    },
    {
      label: 'N59',
      name: 'multiplexer, A4 to A7',
      role: 'multiplexer',
      x: 63,
      y: 50,
      width: 22,
      channels: 'address-bit',
      serves: { addressBits: [4, 5, 6, 11, 12, 13, 14, 15] },
    },
    { label: 'J2', name: 'keyboard and processor cable', role: 'connector', x: 35, y: 64, width: 50, serves: {} },
  ],
  rails: [{ name: '+5 V', volts: 5, tolerancePercent: 5, pins: [8] }],
  reportFormats: [
    {
      id: 'corner',
      name: 'Corner code',
      where:
        'In the lower right corner of the picture after the stripes of the plane test, or by the key lamps if nothing shows.',
      parts: [
        {
          field: 'bank',
          notation: 'words',
          table: [
            { text: 'T', bank: 'TYPE' },
            { text: 'R', bank: 'RULE' },
            { text: 'G', bank: 'GRID' },
          ],
        },
        { field: 'bit' },
      ],
      after: 'lists-lanes',
      notes:
        'T is the green plane, R the red, G the blue. The figure is the stripe from the left within eight points, counted from 0.',
    },
    {
      id: 'service-line',
      name: 'Service line',
      where: 'The service terminal on J2, command PLANE TEST.',
      parts: [
        {
          field: 'bank',
          notation: 'words',
          table: [
            { text: 'PL1', bank: 'TYPE' },
            { text: 'PL2', bank: 'RULE' },
            { text: 'PL4', bank: 'GRID' },
          ],
        },
        { text: ' ' },
        { field: 'address', notation: 'hexadecimal', digits: { min: 5, max: 5 } },
        { text: ' ' },
        { field: 'written', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
        { text: '/' },
        { field: 'read', notation: 'hexadecimal', digits: { min: 2, max: 2 } },
      ],
      after: 'lists-lanes',
      testOrder: { banks: ['GRID', 'RULE', 'TYPE'] },
      notes: 'It begins with the grid and ends with the type. PL is the value of the plane register.',
    },
  ],
  screenMap: {
    width: 1024,
    height: 512,
    base: '0x10000',
    unitsPerLine: 128,
    pixelsPerUnit: 8,
    lineWeights: ['0x8000', 128, 256, 512, 1024, 2048, 4096, 8192, 16384],
    planes: [
      { name: 'type', colour: 'green', register: { name: 'PLANE', value: 1 }, bits: numbers(0, 7) },
      { name: 'rules', colour: 'red', register: { name: 'PLANE', value: 2 }, bits: numbers(0, 7) },
      { name: 'grid', colour: 'blue', register: { name: 'PLANE', value: 4 }, bits: numbers(0, 7) },
    ],
  },
  sources: [
    {
      title: 'Formset 2, drawing PD-3',
      kind: 'schematic',
      author: 'Penhallow Type Systems',
      year: 1985,
      page: 'sheets 2, 3 and 7',
      proves: 'Planes, plane register, buffers and shift registers.',
    },
    {
      title: 'Formset 2 field notes',
      kind: 'service manual',
      author: 'Penhallow Type Systems',
      year: 1986,
      page: '12 to 15',
      proves: 'Corner code and order of the plane test.',
    },
    {
      title: 'Pull test with stripes on the tube, N20, N37 and N40',
      kind: 'pull test',
      year: 2019,
      proves: 'Bit 0 is the leftmost point, odd lines are in the upper half.',
    },
  ],
  examples: [
    { format: 'corner', text: 'G4', sockets: ['N44'], source: 'Repair at a local newspaper museum, 2019.' },
    { format: 'corner', text: 'T0', sockets: ['N20'], source: 'Pull test, N20 out.' },
    { format: 'service-line', text: 'PL2 1A0C0 FF/7F', sockets: ['N37'], source: 'Pull test, N37 out.' },
  ],
};
