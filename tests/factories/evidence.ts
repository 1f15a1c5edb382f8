import fc from 'fast-check';
import { type LayoutDocument, type RunInput } from '@/shared';
import { findingChecks, signKinds } from '@/shared/signs';

/** Runs that the schema allows for a board: names that it has and some that it has not, numbers within and beyond it. */
export function runsFor(document: LayoutDocument): fc.Arbitrary<RunInput[]> {
  const banks = document.memory.banks.map((bank) => bank.id);
  const sockets = document.sockets.map((socket) => socket.label);
  const bank = fc.oneof({ weight: 9, arbitrary: fc.constantFrom(...banks) }, fc.constant('nowhere'));
  const socket = fc.oneof({ weight: 9, arbitrary: fc.constantFrom(...sockets) }, fc.constant('X99'));
  const bit = fc.oneof(
    { weight: 9, arbitrary: fc.integer({ min: 0, max: document.memory.dataBits - 1 }) },
    fc.constant(71),
  );
  const furthest = Math.max(0xff, ...document.addressMap.windows.map((window) => window.range.to));
  const address = fc.oneof(
    { weight: 9, arbitrary: fc.integer({ min: 0, max: furthest }) },
    fc.constantFrom(furthest + 1, 2 ** 40 - 1),
  );
  const value = fc.oneof(
    { weight: 9, arbitrary: fc.integer({ min: 0, max: 2 ** Math.min(30, document.memory.dataBits) - 1 }) },
    fc.constant(2 ** 40 - 1),
  );
  const lane = fc.record({ bank, bit });
  const formats = document.reportFormats.map((format) => format.id);
  const text = fc.oneof(
    fc.string({ minLength: 1, maxLength: 12 }),
    fc.tuple(bank, bit).map(([name, n]) => `${name}${n}`),
    fc.tuple(bank, bit).map(([name, n]) => `${name}-${n}`),
  );
  const code = fc.record(
    {
      kind: fc.constant('code' as const),
      format: formats.length > 0 ? fc.constantFrom(...formats) : fc.constant('none'),
      text,
      doubts: fc.subarray(['first', 'order'] as const).map((list) => [...list]),
    },
    { requiredKeys: ['kind', 'format', 'text'] },
  );
  const line = fc
    .record({
      address,
      length: fc.option(fc.integer({ min: 0, max: 300 }), { nil: undefined }),
      written: value,
      read: value,
    })
    .map(({ length, ...rest }) => ({
      ...rest,
      ...(length === undefined ? {} : { to: Math.min(2 ** 40 - 1, rest.address + length) }),
    }));
  const masked = fc.record({ address, mask: value });
  const rest = fc.constantFrom('unknown' as const, 'passed' as const);
  const readings = fc.record({
    kind: fc.constant('readings' as const),
    lines: fc.array(fc.oneof(line, masked), { minLength: 1, maxLength: 4 }),
    unit: fc.constantFrom('address' as const, 'word' as const),
    shows: fc.constantFrom('address' as const, 'word' as const),
    rest,
  });
  const tally = fc.record({
    bank,
    bit,
    readsOne: fc.nat(1000),
    readsZero: fc.nat(1000),
    words: fc.nat(1000),
    rows: fc.nat(20),
    columns: fc.nat(20),
    ones: value,
    zeros: value,
    first: fc.nat(9),
    last: fc.nat(9),
  });
  const log = fc.record({
    kind: fc.constant('log' as const),
    name: fc.constant('night.log'),
    lines: fc.nat(1000),
    readings: fc.nat(1000),
    unread: fc.nat(10),
    rest,
    values: fc.array(fc.record({ bank, written: value, read: value, count: fc.nat(50) }), { maxLength: 3 }),
    lanes: fc.array(tally, { maxLength: 3 }),
    right: fc.array(fc.record({ bank, bit, zeros: fc.nat(50), ones: fc.nat(50) }), { maxLength: 3 }),
  });
  const span = fc.tuple(fc.nat(300), fc.nat(20)).map(([from, more]): [number, number] => [from, from + more]);
  const picture = fc.record({
    kind: fc.constant('picture' as const),
    marks: fc.array(
      fc.record(
        {
          looks: fc.constantFrom('missing' as const, 'lit' as const, 'wrong' as const),
          x: span,
          y: span,
          everyX: fc.integer({ min: 1, max: 64 }),
          planes: fc.constant<string[]>(['green']),
        },
        { requiredKeys: ['x', 'y'] },
      ),
      { minLength: 1, maxLength: 2 },
    ),
  });
  const others = [
    fc.record({
      kind: fc.constant('lanes' as const),
      failing: fc.array(lane, { maxLength: 6 }),
      passed: fc.constantFrom('rest' as const, 'none' as const),
    }),
    fc.record({ kind: fc.constant('mask' as const), bank, mask: value }),
    fc.record({ kind: fc.constant('pass' as const), banks: fc.array(bank, { maxLength: 2 }) }),
    fc.record(
      { kind: fc.constant('sign' as const), sign: fc.constantFrom(...signKinds), socket },
      { requiredKeys: ['kind', 'sign'] },
    ),
    fc.record({
      kind: fc.constant('measurement' as const),
      socket,
      pin: fc.integer({ min: 1, max: 20 }),
      volts: fc.integer({ min: -20, max: 20 }),
    }),
    fc.record(
      {
        kind: fc.constant('alias' as const),
        addresses: fc.tuple(address, address),
        bits: fc.array(bit, { minLength: 1, maxLength: 2 }),
      },
      { requiredKeys: ['kind', 'addresses'] },
    ),
  ] as const;
  const finding = fc.record({
    kind: fc.constant('finding' as const),
    check: fc.constantFrom(...findingChecks),
    about: fc.oneof(
      socket.map((label) => `position:${label}`),
      socket.map((label) => `chip:${label}`),
      fc.constantFrom('short:0-1', 'unlisted:all', 'shared:U30', 'nothing at all'),
    ),
    found: fc.constantFrom('bad' as const, 'good' as const),
  });
  const plain = fc.oneof(finding, code, readings, log, picture, ...others);
  const either = fc.record({
    kind: fc.constant('either' as const),
    ways: fc.tuple(plain, plain).map(([one, other]) => [
      { takes: 'the log is octal', evidence: one },
      { takes: 'the log is hexadecimal', evidence: other },
    ]),
  });
  const change = fc.oneof(
    fc.record({ kind: fc.constant('swap' as const), sockets: fc.tuple(socket, socket) }),
    fc.record(
      {
        kind: fc.constant('replace' as const),
        socket,
        with: fc.constantFrom('known-good' as const, 'untested' as const),
        family: fc.constantFrom('dynamic-64k-1', 'dynamic-16k-1-three-rail', 'nobody-knows'),
      },
      { requiredKeys: ['kind', 'socket', 'with'] },
    ),
    fc.record({ kind: fc.constant('reseat' as const), socket }),
  );
  const run = fc.record({
    changes: fc.array(change, { maxLength: 2 }),
    evidence: fc.array(fc.oneof({ weight: 8, arbitrary: plain }, either), { maxLength: 3 }),
    complete: fc.boolean(),
  });
  return fc.array(run, { maxLength: 2 });
}
