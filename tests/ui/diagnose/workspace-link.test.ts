import fc from 'fast-check';
import { longestLink, readLink, workspaceLink, writeLink } from '@/components/features/diagnose/workspace-link';
import { runs as runsSchema, type Run } from '@/shared';
import { label as labelSchema } from '@/shared/layout/primitives';

const label = fc
  .string({ unit: 'grapheme', minLength: 1, maxLength: 12 })
  .filter((text) => labelSchema.safeParse(text).data === text);
const slug = fc.stringMatching(/^[A-Za-z0-9][A-Za-z0-9._-]{0,10}$/);
const lanes = fc.array(fc.record({ bank: label, bit: fc.integer({ min: 0, max: 71 }) }), { maxLength: 6 });

const evidence = fc.oneof(
  fc.record({
    kind: fc.constant('code' as const),
    format: slug,
    text: fc.string({ unit: 'binary', minLength: 1, maxLength: 40 }).filter((text) => text.length <= 512),
  }),
  fc.record({
    kind: fc.constant('lanes' as const),
    failing: lanes,
    passed: fc.oneof(fc.constant('rest' as const), fc.constant('none' as const), lanes),
  }),
  fc.record({ kind: fc.constant('mask' as const), bank: label, mask: fc.integer({ min: 0, max: 2 ** 40 - 1 }) }),
  fc.record({
    kind: fc.constant('pass' as const),
    banks: fc.option(fc.array(label, { maxLength: 3 }), { nil: undefined }),
  }),
);
const change = fc.oneof(
  fc.record({ kind: fc.constant('swap' as const), sockets: fc.tuple(label, label) }),
  fc.record({
    kind: fc.constant('replace' as const),
    socket: label,
    with: fc.constantFrom('known-good' as const, 'untested' as const),
  }),
  fc.record({ kind: fc.constant('reseat' as const), socket: label }),
);
const run: fc.Arbitrary<Run> = fc.record({
  changes: fc.array(change, { maxLength: 3 }),
  evidence: fc.array(evidence, { maxLength: 4 }),
  complete: fc.boolean(),
}) as fc.Arbitrary<Run>;

describe('the link of a workspace', () => {
  it('carries any runs there and back', () => {
    fc.assert(
      fc.property(fc.array(run, { maxLength: 4 }), (given) => {
        const expected = runsSchema.parse(given);
        const link = writeLink(expected);
        expect(link).toMatch(/^[A-Za-z0-9~._-]*$/);
        // Trailing empty runs and all: what is written is what is read.
        expect(readLink(link)).toEqual({ runs: expected, problems: [] });
      }),
      { numRuns: 400 },
    );
  });

  it('is short for what is usual', () => {
    const runs: Run[] = [
      { changes: [], evidence: [{ kind: 'code', format: 'lamp', text: 'C5' }], complete: true },
      {
        changes: [{ kind: 'swap', sockets: ['U31', 'U23'] }],
        evidence: [{ kind: 'code', format: 'lamp', text: 'B5' }],
        complete: true,
      },
    ];
    expect(writeLink(runs)).toBe('1~c.lamp.C5~n~s.U31.U23~c.lamp.B5');
  });

  it('keeps what can be read of a link that was tampered with, and names the rest', () => {
    const { runs, problems } = readLink('1~c.lamp.C5~zz.U9~s.U31~l.rest.C-x~c.lamp.B5');
    expect(runs).toEqual([
      {
        changes: [],
        evidence: [
          { kind: 'code', format: 'lamp', text: 'C5' },
          { kind: 'code', format: 'lamp', text: 'B5' },
        ],
        complete: true,
      },
    ]);
    expect(problems).toHaveLength(3);
    expect(problems[0]).toContain('zz.U9');
  });

  it('reads a link written by hand, without version and escapes', () => {
    expect(readLink(' c.flashes.2-5 ').runs[0]?.evidence).toEqual([{ kind: 'code', format: 'flashes', text: '2-5' }]);
    expect(readLink('1~t.K3/10').runs[0]?.changes).toEqual([{ kind: 'reseat', socket: 'K3/10' }]);
  });

  it('says so when the link is of another version', () => {
    const { runs, problems } = readLink('7~c.lamp.C5');
    expect(problems[0]).toContain('another version');
    expect(runs).toHaveLength(1);
  });

  it('never throws, whatever stands in it', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
        expect(() => readLink(text)).not.toThrow();
        expect(() => readLink(`1~c.${text}~l.some.${text}~m.A.${text}~x.${text}`)).not.toThrow();
      }),
    );
    expect(workspaceLink.parse(undefined)).toEqual({ runs: [], problems: [] });
    expect(workspaceLink.parse(['a', 'b'])).toEqual({ runs: [], problems: [] });
  });

  it('cuts off what is beyond the limits and says so', () => {
    const { runs, problems } = readLink(`1${'~n~c.lamp.C5'.repeat(100)}`);
    expect(runs).toHaveLength(64);
    expect(problems).toEqual(['The link holds more than a look-up can carry; its end was left out.']);
    expect(longestLink).toBeLessThan(8192);
  });
});
