/** One operation of a March element on a cell: read and expect a value, or write it. */
export interface MarchOperation {
  readonly does: 'read' | 'write';
  /** 0 is the data background, 1 its complement. */
  readonly value: 0 | 1;
}

/** Operations that are done on one cell after the other. */
export interface MarchElement {
  /** The order of the addresses; `any` leaves it to whoever runs the test. */
  readonly order: 'up' | 'down' | 'any';
  readonly operations: readonly MarchOperation[];
}

export interface MarchTest {
  readonly name: string;
  readonly elements: readonly MarchElement[];
}

const published = {
  MATS: ['any w0', 'any r0 w1', 'any r1'],
  'MATS+': ['any w0', 'up r0 w1', 'down r1 w0'],
  'MATS++': ['any w0', 'up r0 w1', 'down r1 w0 r0'],
  'March X': ['any w0', 'up r0 w1', 'down r1 w0', 'any r0'],
  'March Y': ['any w0', 'up r0 w1 r1', 'down r1 w0 r0', 'any r0'],
  'March C-': ['any w0', 'up r0 w1', 'up r1 w0', 'down r0 w1', 'down r1 w0', 'any r0'],
  'March A': ['any w0', 'up r0 w1 w0 w1', 'up r1 w0 w1', 'down r1 w0 w1 w0', 'down r0 w1 w0'],
  'March B': ['any w0', 'up r0 w1 r1 w0 r0 w1', 'up r1 w0 w1', 'down r1 w0 w1 w0', 'down r0 w1 w0'],
} as const satisfies Record<string, readonly string[]>;

export type MarchName = keyof typeof published;

/** The names of the tests below, the shortest test first. */
export const marchNames = Object.keys(published) as MarchName[];

/**
 * Reads the usual notation of March tests: each element is an order (`up`, `down`, `any`) and operations
 * (`r0`, `r1`, `w0`, `w1`) with spaces between. Throws a RangeError on anything else: the tests are part of the program.
 */
export function parseMarch(name: string, elements: readonly string[]): MarchTest {
  return { name, elements: elements.map(parseElement) };
}

function parseElement(text: string): MarchElement {
  const [order, ...operations] = text.trim().split(/\s+/);
  if ((order !== 'up' && order !== 'down' && order !== 'any') || operations.length === 0)
    throw new RangeError(`"${text}" is no element of a March test.`);
  return { order, operations: operations.map(parseOperation) };
}

function parseOperation(text: string): MarchOperation {
  const [does, value] = text;
  if (text.length !== 2 || (does !== 'r' && does !== 'w') || (value !== '0' && value !== '1'))
    throw new RangeError(`"${text}" is no operation of a March test.`);
  return { does: does === 'r' ? 'read' : 'write', value: value === '0' ? 0 : 1 };
}

const parsed = new Map<MarchName, MarchTest>();

/**
 * A published March test. Sequences after A. J. van de Goor, Testing Semiconductor Memories, Wiley 1991, and
 * Using March Tests to Test SRAMs, IEEE Design & Test of Computers 10(1), 1993, pp. 8-14 (from memory; the lengths of
 * MATS+, MATS++, March X, A, B and C- were compared with an encyclopaedia's article on the March algorithm).
 */
export function marchTest(name: MarchName): MarchTest {
  const before = parsed.get(name);
  if (before) return before;
  const test = parseMarch(name, published[name]);
  parsed.set(name, test);
  return test;
}

/** Operations that a test does on each cell. */
export const marchLength = (test: MarchTest): number =>
  test.elements.reduce((sum, { operations }) => sum + operations.length, 0);
