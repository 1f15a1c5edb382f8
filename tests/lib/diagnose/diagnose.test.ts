import fc from 'fast-check';
import { buildLayoutIndex, diagnose } from '@/lib';
import { diagnosis, run, type Diagnosis, type RunInput } from '@/shared';
import { buildLayout, type LayoutOptions } from '../../factories/layout';

const bench = (options: LayoutOptions) => {
  const document = buildLayout(options);
  const index = buildLayoutIndex(document);
  const socket = (bank: number, bit: number) => {
    const id = document.memory.banks[bank]?.id;
    return (
      document.sockets.find((each) => each.holds.some((held) => held.bank === id && held.bit === bit))?.label ?? '?'
    );
  };
  const lane = (bank: number, bit: number) => ({ bank: document.memory.banks[bank]?.id ?? '?', bit });
  const answer = (...runs: RunInput[]): Diagnosis =>
    diagnose(
      index,
      runs.map((each) => run.parse(each)),
    );
  return { document, index, socket, lane, answer };
};
const failing = (lanes: { bank: string; bit: number }[]): RunInput => ({
  evidence: [{ kind: 'lanes', failing: lanes, passed: 'rest' }],
});
const fourBanks = {
  banks: 4,
  bits: 8,
  bankNames: 'letters',
  sharedParts: true,
  formats: ['code'],
  after: 'stops',
  testOrder: { bits: 'ascending', outer: 'bank' },
} as const;
const eight = [0, 1, 2, 3, 4, 5, 6, 7];

describe('one bad lane', () => {
  const board = bench(fourBanks);
  const code = (text: string): RunInput => ({
    evidence: [{ kind: 'code', format: board.document.reportFormats[0]?.id ?? '', text }],
  });
  it('names its socket first, the chip before the contact', () => {
    const answer = board.answer(failing([board.lane(2, 5)]));
    expect(answer.outcome).toBe('place');
    expect(answer.headline).toContain(board.socket(2, 5));
    expect(answer.places[0]).toMatchObject({ socket: board.socket(2, 5) });
    expect(answer.places[0]?.chip).toBeGreaterThan(3 * (answer.places[0]?.contact ?? 1));
    expect(answer.sure).toBe('strong');
  });

  it('leaves what comes after the first failure untested, and says so', () => {
    const answer = board.answer(code('C-5'));
    expect(answer.evidence[0]).toMatchObject({ ok: true });
    const states = (bank: string, bit: number) =>
      answer.lanes.find((lane) => lane.bank === bank && lane.bit === bit)?.state;
    expect(states('A', 7)).toBe('passed');
    expect(states('C', 5)).toBe('failed');
    expect(states('D', 0)).toBe('untested');
    expect(answer.sentences.join(' ')).toContain('stops at the first failure');
  });

  it('tells beforehand what the board will report after the swap', () => {
    const answer = board.answer(code('C-5'));
    const [check] = answer.nextChecks;
    expect(check?.action).toBe('swap');
    expect(check?.sockets[0]).toBe(board.socket(2, 5));
    expect(check?.outcomes.map((outcome) => outcome.sees)).toContain('C-5');
    const sum = check?.outcomes.reduce((total, outcome) => total + outcome.probability, 0) ?? 0;
    expect(sum).toBeGreaterThan(0.99);
    expect(sum).toBeLessThan(1.001);
  });

  it('gives the reason for a code that cannot be, and answers from the rest', () => {
    const answer = board.answer({ evidence: [...(code('C-5').evidence ?? []), ...(code('Q5').evidence ?? [])] });
    expect(answer.evidence[1]).toMatchObject({ ok: false });
    expect(answer.evidence[1]?.reason).toMatch(/banks A to D/);
    expect(answer.headline).toContain(board.socket(2, 5));
  });
});

describe('failures with something in common', () => {
  const board = bench(fourBanks);

  it('one bit bad in every bank is the line: its driver and the chips that could hold it, told as one group', () => {
    const answer = board.answer(failing([0, 1, 2, 3].map((bank) => board.lane(bank, 3))));
    expect(answer.outcome).toBe('group');
    const labels = answer.groups[0]?.members.map((member) => member.label) ?? [];
    for (const bank of [0, 1, 2, 3]) expect(labels).toContain(board.socket(bank, 3));
    expect(labels.length).toBeGreaterThan(4);
    expect(answer.groups[0]?.check).toMatch(/one at a time/);
  });

  it('a whole bank bad is no chip to pull', () => {
    const answer = board.answer(failing(eight.map((bit) => board.lane(1, bit))));
    expect(answer.outcome).toBe('shared');
    expect(answer.headline).toMatch(/Do not pull a chip/);
    expect(answer.suspects[0]?.kind).toBe('shared-part');
  });

  it('everything bad is no chip to pull either, and the rails come first', () => {
    const answer = board.answer(failing([0, 1, 2, 3].flatMap((bank) => eight.map((bit) => board.lane(bank, bit)))));
    expect(answer.outcome).toBe('shared');
    expect(answer.cautions[0]?.id).toBe('many');
  });

  it('a whole bank bad is no chip to pull where the layout lists no shared part', () => {
    const bare = bench({ ...fourBanks, sharedParts: false });
    const answer = bare.answer(failing(eight.map((bit) => bare.lane(1, bit))));
    expect(answer.outcome).toBe('shared');
    expect(answer.headline).toContain('bank B');
  });

  it('two lanes with nothing in common are two chips', () => {
    const answer = board.answer(failing([board.lane(0, 2), board.lane(1, 5)]));
    expect(answer.headline).toContain(board.socket(0, 2));
    expect(answer.headline).toContain(board.socket(1, 5));
    expect(answer.pairs.length).toBeGreaterThan(0);
  });

  it('two bits of one four-bit chip are one chip', () => {
    const wide = bench({ banks: 2, bits: 8, chipWidth: 4, formats: ['code'] });
    const [first] = wide.document.sockets;
    const held = first?.holds.slice(0, 2).map((each) => ({ bank: each.bank, bit: each.bit })) ?? [];
    const answer = wide.answer(failing(held));
    expect(answer.places[0]?.socket).toBe(first?.label);
    expect(answer.places[0]?.probability).toBeGreaterThan(0.8);
  });

  it('a lane of two chips behind one another names both', () => {
    const deep = bench({ banks: 1, bits: 8, deep: 2, formats: ['code'] });
    const answer = deep.answer(failing([deep.lane(0, 4)]));
    const held = deep.document.sockets.filter((each) => each.holds.some((h) => h.bit === 4)).map((each) => each.label);
    expect(held).toHaveLength(2);
    expect(
      answer.places
        .slice(0, 2)
        .map((place) => place.socket)
        .sort(),
    ).toEqual(held.sort());
    expect(answer.outcome).toBe('group');
  });
});

describe('after a swap', () => {
  const board = bench(fourBanks);
  const a = board.socket(1, 5);
  const b = board.socket(1, 4);
  const before = failing([board.lane(1, 5)]);
  const after = (lanes: { bank: string; bit: number }[]): RunInput => ({
    ...(lanes.length > 0 ? failing(lanes) : { evidence: [{ kind: 'pass' }] }),
    changes: [{ kind: 'swap', sockets: [a, b] }],
  });

  it('the fault that moved is the chip, named by where it is now', () => {
    const answer = board.answer(before, after([board.lane(1, 4)]));
    expect(answer.headline).toBe(`Pull the chip now in ${b}: it came from ${a}.`);
    expect(answer.suspects[0]).toMatchObject({ kind: 'chip', socket: b, cameFrom: a });
    expect(answer.sure).toBe('sure');
  });

  it('the fault that stayed is the place, and its contact is measured', () => {
    const answer = board.answer(before, after([board.lane(1, 5)]));
    expect(answer.headline).toContain(`socket ${a}`);
    expect(answer.suspects[0]).toMatchObject({ kind: 'position', socket: a });
    expect(answer.nextChecks[0]?.action).toBe('measure');
  });

  it('the fault that went away is not repaired: contact and chip stay suspected, and a soak is asked for', () => {
    const answer = board.answer(before, after([]));
    expect(answer.sure).toBe('not sure');
    expect(answer.sentences.join(' ')).toContain('not a repair');
    const top = answer.suspects.slice(0, 2).map((suspect) => `${suspect.kind} ${suspect.socket}`);
    expect(top.sort()).toEqual([`chip ${b}`, `position ${a}`].sort());
    expect(answer.nextChecks[0]?.action).toBe('soak');
  });

  it('a new failure beside the old one points at how the chips were fitted', () => {
    const answer = board.answer(before, after([board.lane(1, 4), board.lane(1, 5)]));
    expect(answer.headline).toMatch(/bent leg/);
    expect(answer.suspects.map((suspect) => suspect.label)).toContain(`chip now in ${b} (came from ${a})`);
  });

  it('a replaced chip takes its guilt off the board', () => {
    const answer = board.answer(before, {
      evidence: [{ kind: 'lanes', failing: [], passed: 'rest' }],
      changes: [{ kind: 'replace', socket: a, with: 'known-good' }],
    });
    expect(answer.suspects[0]).toMatchObject({ kind: 'chip', socket: null });
    expect(answer.suspects[0]?.label).toContain(`taken out of ${a}`);
  });

  it('a swap with a socket that the board does not have is told and left out', () => {
    const answer = board.answer(before, { ...before, changes: [{ kind: 'swap', sockets: [a, 'X99'] }] });
    expect(answer.sentences.join(' ')).toContain('no socket X99');
  });
});

describe('what it does not know', () => {
  const board = bench({ ...fourBanks, first: 'unknown', bankNames: 'numbers-from-1' });

  it('a code of a machine that counts from nobody knows where suspects the socket of each meaning', () => {
    const format = board.document.reportFormats[0]?.id ?? '';
    const answer = board.answer({ evidence: [{ kind: 'code', format, text: '2-3' }] });
    expect(answer.evidence[0]?.alternatives).toBeGreaterThan(1);
    expect(answer.outcome).toBe('group');
    const meant = answer.evidence[0]?.failing ?? [];
    const named = answer.suspects.flatMap((suspect) => (suspect.kind === 'chip' ? [suspect.socket] : []));
    for (const { bank, bit } of meant) {
      const at = board.document.memory.banks.findIndex((each) => each.id === bank);
      expect(named).toContain(board.socket(at, bit));
    }
    expect(answer.sentences[0]).toContain('not known how this machine counts');
  });

  it('nothing entered names no chip', () => {
    expect(board.answer()).toMatchObject({ outcome: 'no-evidence', suspects: [], probability: null });
    expect(board.answer({ evidence: [] })).toMatchObject({ outcome: 'no-evidence' });
  });

  it('all passed names no chip', () => {
    expect(board.answer({ evidence: [{ kind: 'pass' }] })).toMatchObject({ outcome: 'not-shown', suspects: [] });
  });

  it('lists that are not complete prove nothing of the lanes that they leave out', () => {
    const list = bench({ ...fourBanks, after: 'lists-lanes' });
    const evidence: RunInput['evidence'] = [
      { kind: 'code', format: list.document.reportFormats[0]?.id ?? '', text: 'B3' },
    ];
    const whole = list.answer({ evidence });
    const part = list.answer({ evidence, complete: false });
    expect(whole.untested).toHaveLength(0);
    expect(part.untested.length).toBeGreaterThan(0);
    expect(part.places[0]?.probability).toBeLessThan(whole.places[0]?.probability ?? 0);
  });
});

describe('the answer', () => {
  const boards = [
    bench(fourBanks),
    bench({ banks: 2, bits: 8, chipWidth: 4, parity: 1, formats: ['code', 'mask'] }),
    bench({ banks: 1, bits: 8, deep: 2, first: 'unknown', formats: ['code', 'lane-number'], sharedParts: true }),
  ];
  const label = fc.constantFrom('U1', 'U2', 'IC1', 'A', 'B', '0', '1', 'X');
  const lane = fc.record({ bank: label, bit: fc.integer({ min: 0, max: 71 }) });
  const evidence = fc.oneof(
    fc.record({
      kind: fc.constant('code' as const),
      format: fc.constantFrom('code', 'mask', 'none'),
      text: fc.oneof(fc.string({ minLength: 1, maxLength: 12 }), fc.constantFrom('A1', 'B5', '01', '1-1')),
    }),
    fc.record({ kind: fc.constant('mask' as const), bank: label, mask: fc.integer({ min: 0, max: 0xffff }) }),
    fc.record({ kind: fc.constant('pass' as const) }),
    fc.record({
      kind: fc.constant('lanes' as const),
      failing: fc.array(lane, { maxLength: 10 }),
      passed: fc.constantFrom('rest' as const, 'none' as const),
    }),
  );
  const socketOf = (board: (typeof boards)[number]) =>
    fc.constantFrom(...board.document.sockets.slice(0, 5).map((each) => each.label), 'X99');

  it('comes for any runs that the contract allows, keeps to its own contract, and never throws', () => {
    const cases = fc.constantFrom(...boards).chain((board) =>
      fc.record({
        board: fc.constant(board),
        runs: fc.array(
          fc.record({
            changes: fc.array(
              fc.oneof(
                fc.record({ kind: fc.constant('swap' as const), sockets: fc.tuple(socketOf(board), socketOf(board)) }),
                fc.record({ kind: fc.constant('replace' as const), socket: socketOf(board) }),
                fc.record({ kind: fc.constant('reseat' as const), socket: socketOf(board) }),
              ),
              { maxLength: 3 },
            ),
            evidence: fc.array(evidence, { maxLength: 4 }),
            complete: fc.boolean(),
          }),
          { maxLength: 3 },
        ),
      }),
    );
    fc.assert(
      fc.property(cases, ({ board, runs }) => {
        const answer = board.answer(...runs);
        expect(diagnosis.safeParse(answer).error).toBeUndefined();
      }),
      { seed: 5, numRuns: 400 },
    );
  }, 180_000);
});
