import { SimulatedBench, steadyBench } from '@/lib/simulate/bench';
import { allLanes, firstLane, inFormat, readings } from '@/lib/simulate/emit';
import { faultKinds } from '@/lib/simulate/fault-kinds';
import type { BoardFault } from '@/lib/simulate/faults';
import { drawEach, drawFault, drawOfKind, possibleFaults } from '@/lib/simulate/possible-faults';
import { sampledWords } from '@/lib/simulate/sample';
import { faultShares } from '@/lib/simulate/shares';
import { wiringOf } from '@/lib/simulate/wiring';
import { diagnose, buildLayoutIndex, priors } from '@/lib';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { buildLayout } from '../../factories/layout';
import { seededRandom } from '../../factories/random';

const document = buildLayout({ banks: 2, bits: 8 });
const wiring = wiringOf(document);
const label = (bank: number, bit: number) => document.sockets[bank * 8 + bit]?.label as string;
const bench = (fault: BoardFault, seed = 1) =>
  new SimulatedBench(wiring, { faults: [fault], random: seededRandom(seed) });
const lanesOf = (fault: BoardFault) => bench(fault).run().lanes;
const upTo = (n: number) => Array.from({ length: n }, (_, at) => at);
const hard = { intermittent: false };

describe('a simulated board', () => {
  it('reports nothing while it is sound', () => {
    const sound = new SimulatedBench(wiring, { faults: [], random: seededRandom(1) });
    expect(sound.run()).toEqual({ lanes: [], words: [], waited: 0 });
  });

  const chip = `chip:${label(1, 3)}`;
  const inside = { kind: 'chip', chip, pin: 0, word: 0, addressBit: 2, ...hard } as const;

  it.each(['cell', 'row', 'column', 'block', 'scattered', 'whole'] as const)(
    'shows a chip with a bad %s in its own lane only',
    (shape) => {
      for (const reads of [0, 1, 'changing'] as const) expect(lanesOf({ ...inside, shape, reads })).toEqual([11]);
    },
  );

  it('shows a dead row in the words of the row, and in one direction only where it is stuck', () => {
    const { words } = bench({ ...inside, shape: 'row', reads: 1 }).run();
    // Word bits 0 to 7 are the row of the layout.
    expect(new Set(words.map(({ word }) => word % 256))).toEqual(new Set([0]));
    expect(new Set(words.map(({ word }) => Math.floor(word / 256)))).toEqual(new Set([0, 1, 2, 4, 8, 16, 32, 64, 128]));
    for (const { bits, written } of words) {
      expect(bits).toEqual([3]);
      expect((written.background === 0 ? 0 : (3 >> (written.background - 1)) & 1) ^ written.value).toBe(0);
    }
  });

  it('spoils the bit in every bank on the same lines when a chip holds its data line', () => {
    expect(lanesOf({ kind: 'holds-line', chip, pin: 0, level: 0, ...hard })).toEqual([3, 11]);
  });

  it('spoils the bit in its own bank only where each bank has its own lines', () => {
    const own = wiringOf(buildLayout({ banks: 2, bits: 8, ownLines: true }));
    const faults: BoardFault[] = [{ kind: 'holds-line', chip, pin: 0, level: 0, ...hard }];
    expect(new SimulatedBench(own, { faults, random: seededRandom(1) }).run().lanes).toEqual([11]);
  });

  it('spoils its whole bank when a chip holds the strobe, and the whole board when it holds an address line', () => {
    expect(lanesOf({ kind: 'holds-strobe', chip, floats: 1, ...hard })).toEqual(upTo(8).map((bit) => bit + 8));
    expect(lanesOf({ kind: 'holds-address', chip, addressBits: [2, 10], level: 0, ...hard })).toEqual(upTo(16));
  });

  it('makes pairs of words one cell where an address bit is lost', () => {
    const { words, lanes } = bench({ kind: 'chip-address', chip, addressBits: [4], level: 1, ...hard }).run();
    expect(lanes).toEqual([11]);
    const failing = new Set(words.map(({ word }) => word));
    for (const word of failing)
      expect(failing.has(word ^ 16) || !sampledWords(wiring, 11).includes(word ^ 16)).toBe(true);
    expect(failing.has(0) && failing.has(16)).toBe(true);
  });

  it('shows two joined address lines on all lanes behind them', () => {
    const pairs = [
      [0, 1],
      [8, 9],
    ] as const;
    expect(lanesOf({ kind: 'address-short', lanes: upTo(16), pairs, ...hard })).toEqual(upTo(16));
  });

  it('shows two joined data lines in both bits, low where the other is low', () => {
    const short: BoardFault = { kind: 'short', pairs: [[1, 2]], ...hard };
    const { lanes, words } = bench(short).run();
    expect(lanes).toEqual([1, 2]);
    // Alike in the background of groups of eight and four: only those that tell bits 1 and 2 apart show it.
    expect(new Set(words.map(({ written }) => written.background))).toEqual(new Set([1, 2]));
  });

  it('shows a lost write, a missing strobe and a dead buffer on all that they serve', () => {
    const lanes = [0, 1, 2, 3];
    expect(lanesOf({ kind: 'write', lanes, ...hard })).toEqual(lanes);
    expect(lanesOf({ kind: 'strobe', lanes, floats: 'changing', ...hard })).toEqual(lanes);
    expect(lanesOf({ kind: 'data', lanes, level: 1, ...hard })).toEqual(lanes);
    expect(lanesOf({ kind: 'refresh', lanes, ...hard })).toEqual(lanes);
  });

  it.each([
    { kind: 'transition', to: 1 },
    { kind: 'inversion', aggressor: 1, to: 0 },
    { kind: 'idempotent', aggressor: 1, to: 1, value: 0 },
    { kind: 'state', aggressor: 2, while: 1, value: 0 },
  ] as const)('shows a cell with a $kind fault', (coupling) => {
    const fault: BoardFault = { kind: 'cell', chip, pin: 0, word: 4, coupling, ...hard };
    const { words } = bench(fault).run();
    expect(new Set(words.map(({ bank, word }) => `${bank} ${word}`))).toEqual(new Set(['1 4']));
  });

  it('shows a leaky chip only where the test waits', () => {
    const leaky = bench({
      kind: 'retention',
      chip,
      pin: 0,
      shape: 'whole',
      word: 0,
      addressBit: 0,
      seconds: 5,
      decaysTo: 0,
      ...hard,
    });
    expect(leaky.run().lanes).toEqual([]);
    expect(leaky.run({ waits: 10 }).lanes).toEqual([11]);
  });

  it('moves the fault with a chip, and leaves that of a position', () => {
    const moved = bench({ ...inside, shape: 'whole', reads: 0 });
    moved.swap(label(1, 3), label(0, 6));
    expect(moved.run().lanes).toEqual([6]);
    expect(moved.chipIn(label(0, 6))).toBe(chip);
    const open = bench({ kind: 'contact', socket: label(1, 3), pin: null, floats: 1, ...hard });
    open.swap(label(1, 3), label(0, 6));
    expect(open.run().lanes).toEqual([11]);
    moved.replace(label(0, 6));
    expect(moved.run().lanes).toEqual([]);
  });

  it('lets handling cure contacts and bend legs as often as it is told', () => {
    const random = seededRandom(5);
    const figures = { ...steadyBench, handlingCures: 0.4, handlingHarms: 0.1 };
    const open: BoardFault = { kind: 'contact', socket: label(0, 0), pin: null, floats: 1, ...hard };
    let cured = 0;
    let harmed = 0;
    for (let n = 0; n < 2000; n++) {
      const one = new SimulatedBench(wiring, { faults: [open], random, figures });
      one.reseat(label(0, 0));
      if (!one.faults.some(({ kind }) => kind === 'contact')) cured++;
      if (one.faults.some(({ kind }) => kind === 'fitting')) harmed++;
    }
    expect(Math.abs(cured / 2000 - 0.4)).toBeLessThan(0.04);
    expect(Math.abs(harmed / 2000 - 0.1)).toBeLessThan(0.03);
  });

  it('shows a fault that comes and goes in about half of the passes', () => {
    const coming = bench({ ...inside, shape: 'whole', reads: 0, intermittent: true });
    const shown = upTo(1000).filter(() => coming.run().lanes.length > 0).length;
    expect(shown).toBeGreaterThan(430);
    expect(shown).toBeLessThan(570);
  });

  it('refuses a socket that the board does not have', () => {
    expect(() => bench({ ...inside, shape: 'whole', reads: 0 }).swap('U10', 'Z9')).toThrow(RangeError);
  });
});

describe('what the machine reports of a dead chip', () => {
  const result = bench({
    kind: 'chip',
    chip: `chip:${label(1, 3)}`,
    pin: 0,
    shape: 'whole',
    word: 0,
    addressBit: 0,
    reads: 0,
    ...hard,
  }).run();

  it('is every lane, the first lane, or each word with what was written and read', () => {
    const lane = { bank: 'B', bit: 3 };
    expect(allLanes(wiring, result).evidence).toEqual([{ kind: 'lanes', failing: [lane], passed: 'rest' }]);
    expect(firstLane(wiring, result).evidence).toEqual([{ kind: 'lanes', failing: [lane], passed: 'none' }]);
    const [read] = readings(wiring, result).evidence;
    if (read?.kind !== 'readings') throw new RangeError('no readings');
    expect(read.rest).toBe('passed');
    for (const line of read.lines) {
      expect(line.address).toBeGreaterThanOrEqual(65_536);
      expect((line.written as number) ^ (line.read as number)).toBe(8);
    }
  });

  it('is the code of each format, the first where the machine stops', () => {
    const said = document.reportFormats.map((format) => inFormat(wiring, format, result));
    expect(said.map(({ evidence }) => (evidence[0]?.kind === 'code' ? evidence[0].text : ''))).toEqual([
      'B-3',
      'B 08',
      '10000 W FF R F7',
    ]);
    expect(said[0]?.complete).toBe(true);
  });
});

describe('drawn faults', () => {
  const random = seededRandom(9);

  it.each(faultKinds)('of a %s show on lanes that the kind can spoil', (kind) => {
    const boards = [document, buildLayout({ chipWidth: 4, banks: 2 }), buildLayout({ sharedParts: false })];
    let tried = 0;
    for (const each of [...boards, ...demoBoards.map((demo) => layoutDocument.parse(demo.document))]) {
      const own = wiringOf(each);
      for (let n = 0; n < 4; n++) {
        const drawn = drawOfKind(possibleFaults(own, priors), kind, { figures: priors, random });
        if (!drawn) continue;
        tried++;
        const one = new SimulatedBench(own, { faults: [{ ...drawn.fault, intermittent: false }], random });
        // A single cell that changes at each look may read right throughout one pass.
        const lanes = upTo(6).flatMap(() => one.run().lanes);
        const beyond = lanes.filter((lane) => !drawn.from.lanes.includes(lane));
        expect({ kind, fault: drawn.fault, beyond, shown: lanes.length > 0 }).toEqual({
          kind,
          fault: drawn.fault,
          beyond: [],
          shown: true,
        });
      }
    }
    expect(tried).toBeGreaterThan(3);
  });

  it('come as often as their priors say', () => {
    const possible = possibleFaults(wiring, priors);
    const total = possible.reduce((sum, { prior }) => sum + prior, 0);
    const share = possible.filter(({ part }) => part === 'chip').reduce((sum, { prior }) => sum + prior, 0) / total;
    const drawn = upTo(4000).filter(() => drawFault(possible, priors, random)?.from.part === 'chip').length;
    expect(Math.abs(drawn / 4000 - share)).toBeLessThan(0.02);
    const many = upTo(2000).reduce((sum) => sum + drawEach(possible, priors, random).length, 0);
    expect(Math.abs(many / 2000 - total)).toBeLessThan(0.06);
  });

  it('of a chip are shared out among the shapes as the table says', () => {
    for (const table of [faultShares.chipShape, faultShares.cell, faultShares.deadReads, faultShares.contactPin])
      expect(Object.values(table).reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 9);
  });

  it('are evidence that the engine reads', () => {
    const index = buildLayoutIndex(document);
    const possible = possibleFaults(wiring, priors);
    for (let n = 0; n < 20; n++) {
      const drawn = drawFault(possible, priors, random);
      const result = new SimulatedBench(wiring, { faults: drawn ? [drawn.fault] : [], random }).run();
      const said = allLanes(wiring, result);
      const answer = diagnose(index, [{ changes: [], ...said }]);
      expect(answer.evidence.every(({ ok }) => ok)).toBe(true);
      expect(answer.lanes.filter(({ state }) => state === 'failed')).toHaveLength(result.lanes.length);
    }
  });
});
