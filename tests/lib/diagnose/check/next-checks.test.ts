import fc from 'fast-check';
import { buildLayoutIndex, diagnose } from '@/lib';
import { diagnosis, layoutDocument, run, type Diagnosis, type LayoutDocumentInput, type RunInput } from '@/shared';
import { caseBoards } from '../../../factories/cases';
import { buildLayout } from '../../../factories/layout';

const answerOf = (board: LayoutDocumentInput, ...runs: RunInput[]): Diagnosis =>
  diagnosis.parse(
    diagnose(
      buildLayoutIndex(layoutDocument.parse(board)),
      runs.map((each) => run.parse(each)),
    ),
  );
type Lanes = [bank: string, bit: number][];
const only = (...lanes: Lanes): RunInput => ({
  evidence: [{ kind: 'lanes', failing: lanes.map(([bank, bit]) => ({ bank, bit })), passed: 'rest' }],
});
const every = [0, 1, 2, 3, 4, 5, 6, 7];
const { A, E, F, H } = caseBoards;
const swapped = (one: string, other: string, seen: RunInput): RunInput => ({
  ...seen,
  changes: [{ kind: 'swap', sockets: [one, other] }],
});
const chipMoves = ['swap', 'replace', 'reseat', 'stack'];

describe('a swap says beforehand what the board will report', () => {
  it('in the code that was read, and where each chip is then', () => {
    const [check] = answerOf(F, { evidence: [{ kind: 'code', format: 'beeps', text: '3 LONG 6 SHORT' }] }).nextChecks;
    expect(check).toMatchObject({ action: 'swap', sockets: ['U35', 'U34'], minutes: 8 });
    const told = new Map(check?.outcomes.map(({ sees, means }) => [sees, means]));
    expect(told.get('3 LONG 5 SHORT')).toBe('the chip that is now in U34 is bad');
    expect(told.get('3 LONG 6 SHORT')).toContain('look at socket U35, its solder, its trace');
    expect(told.get('no failure')).toContain('not repaired yet');
    expect([...told.keys()].at(-1)).toBe('anything else');
  });

  it('as the mask of the word, pin by pin where a chip has four', () => {
    const { nextChecks } = answerOf(E, { evidence: [{ kind: 'mask', bank: '0', mask: 0x14 }] });
    const swap = nextChecks.find(({ action }) => action === 'swap');
    expect(swap?.sockets.sort()).toEqual(['U7', 'U8']);
    expect(swap?.outcomes.map(({ sees }) => sees)).toContain('bits 3 and 5 of bank 0 (mask 28)');
  });

  it('as dots of the picture', () => {
    const { nextChecks } = answerOf(H, {
      evidence: [
        { kind: 'picture', marks: [{ looks: 'missing', planes: ['green'], x: [2, 2], everyX: 8, y: [96, 191] }] },
      ],
    });
    expect(nextChecks[0]).toMatchObject({ action: 'swap', sockets: ['GL5', 'GL4'] });
    expect(nextChecks[0]?.outcomes[0]?.sees).toBe('bit 4 of bank GL: dots at x = 3, 11 and 19 and so on');
  });

  it('with the neighbour that makes a pair, so that the swap back is the same swap', () => {
    expect(answerOf(A, only(['1', 5])).nextChecks[0]?.sockets).toEqual(['U25', 'U24']);
    expect(answerOf(A, only(['1', 4])).nextChecks[0]?.sockets).toEqual(['U24', 'U25']);
  });

  it('never with a chip that fails too', () => {
    const swap = answerOf(A, only(['1', 5], ['1', 4])).nextChecks.find(({ action }) => action === 'swap');
    expect(swap?.sockets.filter((socket) => ['U24', 'U25'].includes(socket))).toHaveLength(1);
  });
});

describe('what comes before the score', () => {
  it('the supply: the rail that is wrong, with the chips out', () => {
    const [check] = answerOf(A, {
      evidence: [{ kind: 'measurement', socket: 'U13', pin: 1, volts: -0.4 }, ...(only(['1', 5]).evidence ?? [])],
    }).nextChecks;
    expect(check).toMatchObject({ action: 'rails', sockets: ['U13'] });
    expect(check?.label).toMatch(/^Power off, put -5 V right, .* with the chips out/);
  });

  it('the supply before what is shared, where everything fails', () => {
    const all: Lanes = ['0', '1'].flatMap((bank) => every.map((bit): [string, number] => [bank, bit]));
    const { nextChecks } = answerOf(A, only(...all));
    expect(nextChecks[0]?.action).toBe('rails');
    expect(nextChecks[0]?.label).toMatch(/-5 V at pin 1, .*pin 9 .*pin 8/);
  });

  it('nothing shared is left for a chip that is moved', () => {
    const { outcome, nextChecks } = answerOf(A, only(...every.map((bit): [string, number] => ['1', bit])));
    expect(outcome).toBe('shared');
    expect(nextChecks[0]?.action).toBe('probe');
    expect(nextChecks.filter(({ action }) => chipMoves.includes(action))).toEqual([]);
  });

  it('of a line that several chips may hold, those are pulled in turn before one is moved', () => {
    const { outcome, nextChecks } = answerOf(A, only(['0', 3], ['1', 3]));
    expect(outcome).toBe('group');
    expect(nextChecks[0]).toMatchObject({ action: 'pull-in-turn', sockets: ['U13', 'U23'] });
    const means = nextChecks[0]?.outcomes.map((each) => each.means) ?? [];
    expect(means[0]).toBe('the chip of U13 holds the line');
    expect(means.at(-1)).toContain('U30');
  });

  it('a chip that is all but certain is replaced', () => {
    const { nextChecks } = answerOf(A, only(['1', 5]), swapped('U25', 'U24', only(['1', 4])));
    expect(nextChecks[0]).toMatchObject({ action: 'replace', sockets: ['U24'] });
    expect(nextChecks[0]?.outcomes[0]).toMatchObject({ sees: 'no failure' });
  });

  it('a place that keeps the fault is measured to the leg, from the chip on the same line', () => {
    const { nextChecks } = answerOf(A, only(['1', 5]), swapped('U25', 'U24', only(['1', 5])));
    expect(nextChecks[0]?.label).toBe(
      'Power off, measure from pin 14 of U15 to the leg of the chip in U25, pin 14. Then pin 2 the same way, and pins 3 to 7, 10 to 13 and 15 from U24.',
    );
  });

  it('what went away is soaked, with both ways in which it may come back, then swapped back', () => {
    const { nextChecks } = answerOf(A, only(['1', 5]), swapped('U25', 'U24', { evidence: [{ kind: 'pass' }] }));
    expect(nextChecks[0]?.action).toBe('soak');
    expect(nextChecks[0]?.label).toMatch(/Clean .* eight hours, cold and warm.* swap U25 and U24 back/);
    const sees = nextChecks[0]?.outcomes.map((each) => each.sees) ?? [];
    expect(sees).toEqual([
      'no failure in eight hours',
      'it comes back as bit 4 of bank 1',
      'it comes back as bit 5 of bank 1',
    ]);
  });

  it('a new failure after handling: both sockets that were handled are looked at, and nothing is moved', () => {
    const { nextChecks } = answerOf(A, only(['1', 5]), swapped('U25', 'U24', only(['1', 4], ['1', 5])));
    expect(nextChecks).toHaveLength(1);
    expect(nextChecks[0]?.label).toMatch(/^Power off at once/);
    expect([...(nextChecks[0]?.sockets ?? [])].sort()).toEqual(['U24', 'U25']);
  });

  it('a report that can mean two things is read again, and no chip is touched', () => {
    const { nextChecks } = answerOf(F, {
      evidence: [{ kind: 'code', format: 'beeps', text: '3 LONG 5 OR 6 SHORT' }],
    });
    expect(nextChecks.map(({ action }) => action)).toEqual(['read-again']);
    expect(nextChecks[0]?.outcomes.map(({ means }) => means)).toEqual(['it is U34', 'it is U35']);
  });
});

describe('cheap checks first', () => {
  const oneLine: RunInput = { evidence: [{ kind: 'readings', lines: [{ address: 0x52a7, written: 0, read: 0x20 }] }] };

  it('one reading: the whole is tested, and what follows is said with it', () => {
    const [first, second] = answerOf(A, oneLine).nextChecks;
    expect(first).toMatchObject({
      action: 'test-whole',
      label: 'Test the whole of both banks, then swap U25 with U24.',
    });
    expect(second).toMatchObject({ action: 'swap', sockets: ['U25', 'U24'] });
  });

  it('two bits that may be joined are written apart, unless they were already', () => {
    const line = (written: number, read: number) => ({ address: 0x1c00, written, read });
    const pattern = answerOf(E, { evidence: [{ kind: 'readings', lines: [line(0, 0x0c), line(0xff, 0xff)] }] });
    expect(pattern.nextChecks.find(({ action }) => action === 'pattern')?.label).toMatch(/04 and 08/);
    const shown = answerOf(E, { evidence: [{ kind: 'readings', lines: [line(0x55, 0x51), line(0xaa, 0xa2)] }] });
    expect(shown.nextChecks.find(({ action }) => action === 'pattern')).toBeUndefined();
    expect(shown.nextChecks[0]?.label).toMatch(/^Power off, measure from line D2 to line D3/);
  });

  it('soldered chips are measured and scoped before they are moved', () => {
    const soldered = layoutDocument.parse(A);
    for (const socket of soldered.sockets) socket.soldered = true;
    const { nextChecks } = answerOf(soldered, only(['1', 5]));
    expect(nextChecks.slice(0, 3).filter(({ action }) => action === 'swap' || action === 'replace')).toEqual([]);
    const swap = nextChecks.find(({ action }) => action === 'swap');
    if (swap) expect(swap.minutes).toBe(80);
  });
});

describe('every check, on boards and evidence of any kind', () => {
  const boards = [
    A,
    E,
    F,
    buildLayout({ banks: 2, bits: 8, chipWidth: 8, formats: ['code'] }),
    buildLayout({ banks: 2, bits: 4, deep: 2, formats: ['mask'], ownLines: true }),
    buildLayout({ banks: 4, bits: 16, parity: 2, byteLanes: 'big-endian', formats: ['log'] }),
  ].map((board) => layoutDocument.parse(board));

  it('has outcomes that add up to 1, sockets of the board, and a place in the order of its worth', () => {
    const anyRun = fc.record({
      lanes: fc.array(fc.tuple(fc.nat(3), fc.nat(17)), { maxLength: 5 }),
      rest: fc.constantFrom('rest' as const, 'none' as const),
      change: fc.option(fc.tuple(fc.constantFrom('swap', 'replace', 'reseat'), fc.nat(63), fc.nat(63))),
    });
    fc.assert(
      fc.property(fc.nat(boards.length - 1), fc.array(anyRun, { minLength: 1, maxLength: 3 }), (b, drawn) => {
        const board = boards[b] as (typeof boards)[number];
        const label = (n: number) => board.sockets[n % board.sockets.length]?.label ?? '';
        const runs = drawn.map(({ lanes, rest, change }, r): RunInput => {
          const failing = lanes.map(([bank, bit]) => ({
            bank: board.memory.banks[bank % board.memory.banks.length]?.id ?? '',
            bit: bit % board.memory.dataBits,
          }));
          const [kind, one, other] = change ?? ['none', 0, 0];
          const changes: RunInput['changes'] =
            r === 0 || kind === 'none'
              ? []
              : kind === 'swap'
                ? [{ kind, sockets: [label(one), label(other)] }]
                : [{ kind: kind as 'replace' | 'reseat', socket: label(one) }];
          return { changes, evidence: [{ kind: 'lanes', failing, passed: rest }] };
        });
        const { nextChecks } = answerOf(board, ...runs);
        expect(nextChecks.length).toBeLessThanOrEqual(5);
        expect(new Set(nextChecks.map((each) => each.label)).size).toBe(nextChecks.length);
        for (const { outcomes, sockets, bits, action } of nextChecks) {
          expect(bits).toBeGreaterThanOrEqual(0);
          for (const socket of sockets) expect(board.sockets.some((each) => each.label === socket)).toBe(true);
          if (action === 'swap') expect(new Set(sockets).size).toBe(2);
          if (outcomes.length > 0)
            expect(outcomes.reduce((sum, { probability }) => sum + probability, 0)).toBeCloseTo(1, 9);
        }
      }),
      { numRuns: 150, seed: 7 },
    );
  });
});
