import fc from 'fast-check';
import { findingChecks, signKinds, type Evidence, type Run } from '@/shared';
import { label as labelSchema, words as wordsSchema } from '@/shared/layout/primitives';

const label = fc
  .string({ unit: 'grapheme', minLength: 1, maxLength: 12 })
  .filter((text) => labelSchema.safeParse(text).data === text);
const words = (max: number) =>
  fc
    .string({ unit: 'grapheme', minLength: 1, maxLength: 24 })
    .filter((text) => wordsSchema(max).safeParse(text).data === text);
const slug = fc.stringMatching(/^[A-Za-z0-9][A-Za-z0-9._-]{0,10}$/);
const address = fc.oneof(fc.integer({ min: 0, max: 0xffff }), fc.integer({ min: 0, max: 2 ** 40 - 1 }));
const bit = fc.integer({ min: 0, max: 71 });
const lanes = fc.array(fc.record({ bank: label, bit }), { maxLength: 6 });
const maybe = <T>(of: fc.Arbitrary<T>) => fc.option(of, { nil: undefined });
/** Minus zero is zero to everybody but the computer. */
const volts = fc.double({ min: -100, max: 100, noNaN: true }).map((value) => (value === 0 ? 0 : value));

const reading = fc
  .record({
    address,
    further: maybe(fc.integer({ min: 0, max: 4096 })),
    step: maybe(address),
    seen: fc.oneof(
      fc.record({ mask: address, written: maybe(address) }),
      fc.record({ read: address, written: address }),
    ),
    register: maybe(fc.record({ name: label, value: address })),
  })
  .map(({ address: at, further, seen, ...rest }) => ({
    address: at,
    to: further === undefined ? undefined : Math.min(at + further, 2 ** 40 - 1),
    ...rest,
    ...seen,
  }));

const span = fc.tuple(fc.nat(8191), fc.nat(8191)).map(([a, b]): [number, number] => [Math.min(a, b), Math.max(a, b)]);
const every = maybe(fc.integer({ min: 1, max: 8192 }));

/** Every kind of plain evidence that the schema allows. */
export const evidenceOf = {
  code: fc.record({
    kind: fc.constant('code' as const),
    format: slug,
    text: fc.string({ unit: 'binary', minLength: 1, maxLength: 40 }).filter((text) => text.length <= 512),
    doubts: maybe(fc.array(fc.constantFrom('first' as const, 'order' as const), { maxLength: 2 })),
  }),
  lanes: fc.record({
    kind: fc.constant('lanes' as const),
    failing: lanes,
    passed: fc.oneof(fc.constant('rest' as const), fc.constant('none' as const), lanes),
  }),
  mask: fc.record({ kind: fc.constant('mask' as const), bank: label, mask: address }),
  pass: fc.record({ kind: fc.constant('pass' as const), banks: maybe(fc.array(label, { maxLength: 3 })) }),
  readings: fc.record({
    kind: fc.constant('readings' as const),
    lines: fc.array(reading, { minLength: 1, maxLength: 6 }),
    unit: fc.constantFrom('address' as const, 'word' as const),
    shows: fc.constantFrom('address' as const, 'word' as const),
    rest: fc.constantFrom('unknown' as const, 'passed' as const),
    waited: maybe(volts.map(Math.abs)),
  }),
  log: fc.record({
    kind: fc.constant('log' as const),
    name: words(120),
    lines: address,
    readings: address,
    unread: address,
    outside: address,
    rest: fc.constantFrom('unknown' as const, 'passed' as const),
    values: fc.array(fc.record({ bank: label, written: address, read: address, count: address }), { maxLength: 3 }),
    lanes: fc.array(
      fc.record({
        bank: label,
        bit,
        readsOne: address,
        readsZero: address,
        alone: address,
        words: address,
        rows: address,
        columns: address,
        row: maybe(address),
        column: maybe(address),
        ones: address,
        zeros: address,
        first: address,
        last: address,
      }),
      { maxLength: 4 },
    ),
    right: fc.array(fc.record({ bank: label, bit, zeros: address, ones: address }), { maxLength: 3 }),
  }),
  picture: fc.record({
    kind: fc.constant('picture' as const),
    marks: fc.array(
      fc.record({
        looks: fc.constantFrom('missing' as const, 'lit' as const, 'wrong' as const),
        planes: maybe(fc.array(words(40), { minLength: 1, maxLength: 3 })),
        x: span,
        everyX: every,
        untilX: maybe(fc.nat(8191)),
        y: span,
        everyY: every,
        untilY: maybe(fc.nat(8191)),
      }),
      { minLength: 1, maxLength: 3 },
    ),
    rest: fc.constantFrom('right' as const, 'unknown' as const),
  }),
  sign: fc.record({ kind: fc.constant('sign' as const), sign: fc.constantFrom(...signKinds), socket: maybe(label) }),
  measurement: fc.record({
    kind: fc.constant('measurement' as const),
    socket: label,
    pin: fc.integer({ min: 1, max: 64 }),
    volts,
  }),
  finding: fc.record({
    kind: fc.constant('finding' as const),
    check: fc.constantFrom(...findingChecks),
    about: fc.oneof(
      label.map((name) => `position:${name}`),
      fc.tuple(label, label).map(([one, other]) => `chip:${one} chip:${other}#2`),
      fc.string({ unit: 'grapheme', minLength: 1, maxLength: 24 }),
    ),
    found: fc.constantFrom('bad' as const, 'good' as const),
  }),
  alias: fc.record({
    kind: fc.constant('alias' as const),
    addresses: fc.tuple(address, address),
    bits: maybe(fc.array(bit, { minLength: 1, maxLength: 6 })),
  }),
};

const plain = fc.oneof(...(Object.values(evidenceOf) as fc.Arbitrary<Evidence>[]));

const either = fc.record({
  kind: fc.constant('either' as const),
  ways: fc.array(fc.record({ takes: words(80), evidence: plain }), { minLength: 2, maxLength: 4 }),
}) as fc.Arbitrary<Evidence>;

/** Any piece of evidence. */
export const anyEvidence: fc.Arbitrary<Evidence> = fc.oneof(
  { weight: 5, arbitrary: plain },
  { weight: 1, arbitrary: either },
);

const change = fc.oneof(
  fc.record({ kind: fc.constant('swap' as const), sockets: fc.tuple(label, label) }),
  fc.record({
    kind: fc.constant('replace' as const),
    socket: label,
    with: fc.constantFrom('known-good' as const, 'untested' as const),
    family: maybe(slug),
  }),
  fc.record({ kind: fc.constant('reseat' as const), socket: label }),
);

/** Any runs, as they are before the schema fills in what was left out. */
export const anyRuns: fc.Arbitrary<Run[]> = fc.array(
  fc.record({
    changes: fc.array(change, { maxLength: 3 }),
    evidence: fc.array(anyEvidence, { maxLength: 4 }),
    complete: fc.boolean(),
  }),
  { maxLength: 4 },
) as fc.Arbitrary<Run[]>;
