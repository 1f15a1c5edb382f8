import fc from 'fast-check';
import { keptEvidence, workspaceLink } from '@/components/features/diagnose/link/kept-evidence';
import {
  fitLink,
  leftBehind,
  longestLink,
  readLink,
  writeLink,
} from '@/components/features/diagnose/link/workspace-link';
import { runs as runsSchema, type Evidence, type Run } from '@/shared';
import { anyEvidence, anyRuns, evidenceOf } from './any-evidence';

describe('the link of a workspace', () => {
  it('carries any runs there and back', () => {
    fc.assert(
      fc.property(anyRuns, (given) => {
        const expected = runsSchema.parse(given);
        const link = writeLink(expected);
        expect(link).toMatch(/^[A-Za-z0-9~._-]*$/);
        // Trailing empty runs and all: what is written is what is read.
        expect(readLink(link)).toEqual({ runs: expected, problems: [] });
      }),
      { numRuns: 400 },
    );
  });

  it.each(Object.entries(evidenceOf))('carries %s there and back', (_kind, arbitrary) => {
    fc.assert(
      fc.property(arbitrary as fc.Arbitrary<Evidence>, (given) => {
        const expected = runsSchema.parse([{ evidence: [given] }]);
        const link = writeLink(expected);
        expect(link).toMatch(/^[A-Za-z0-9~._-]*$/);
        expect(readLink(link)).toEqual({ runs: expected, problems: [] });
      }),
      { numRuns: 300 },
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

  it.each<[string, Evidence]>([
    [
      'r.p.4C1AwFFrF7.4C1Bt4CFFs2m8-page-3',
      {
        kind: 'readings',
        lines: [
          { address: 0x4c1a, written: 0xff, read: 0xf7 },
          { address: 0x4c1b, to: 0x4cff, step: 2, mask: 8, register: { name: 'page', value: 3 } },
        ],
        unit: 'address',
        shows: 'address',
        rest: 'passed',
      },
    ],
    ['q.first-order.lamp.C5', { kind: 'code', format: 'lamp', text: 'C5', doubts: ['first', 'order'] }],
    ['g.grows-with-waiting', { kind: 'sign', sign: 'grows-with-waiting' }],
    ['u.U31.8.4-72', { kind: 'measurement', socket: 'U31', pin: 8, volts: 4.72 }],
    ['u.U31.1.n5-01', { kind: 'measurement', socket: 'U31', pin: 1, volts: -5.01 }],
    ['b.legs.bad.position-U25', { kind: 'finding', check: 'legs', about: 'position:U25', found: 'bad' }],
    ['b.joined.good.short-2_2D_3', { kind: 'finding', check: 'joined', about: 'short:2-3', found: 'good' }],
    ['a.1000-1400.3-5', { kind: 'alias', addresses: [0x1000, 0x1400], bits: [3, 5] }],
    [
      'v.r.mx0t7n32y0t191-red',
      {
        kind: 'picture',
        marks: [{ looks: 'missing', x: [0, 7], everyX: 32, y: [0, 191], planes: ['red'] }],
        rest: 'right',
      },
    ],
    [
      'e.octal.decimal~r.-.1CwFr7~r.-.22wFr7',
      {
        kind: 'either',
        ways: [0o34, 34].map((address, at) => ({
          takes: at === 0 ? 'octal' : 'decimal',
          evidence: {
            kind: 'readings',
            lines: [{ address, written: 0xf, read: 7 }],
            unit: 'address',
            shows: 'address',
            rest: 'unknown',
          },
        })),
      },
    ],
  ])('says %s', (text, seen) => {
    expect(writeLink([{ changes: [], evidence: [seen], complete: true }])).toBe(`1~${text}`);
    expect(readLink(text).runs[0]?.evidence).toEqual([seen]);
  });

  it('names the family that was fitted in the place of the usual one', () => {
    const changes: Run['changes'] = [
      { kind: 'replace', socket: 'U31', with: 'known-good', family: 'dram-64k-x1-single' },
    ];
    const link = writeLink([{ changes, evidence: [], complete: true }]);
    expect(link).toBe('1~x.U31.good.dram_2D_64k_2D_x1_2D_single');
    expect(readLink(link).runs[0]?.changes).toEqual(changes);
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
        for (const letter of 'qrfvguabek') {
          expect(() => readLink(`1~${letter}.${text}~${letter}.-.${text}~${letter}.${text}.${text}`)).not.toThrow();
        }
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

  it('leaves the ways of a spoiled choice out together, and goes on after them', () => {
    const { runs, problems } = readLink('1~e.octal.decimal~r.-.zz~r.-.22wFr7~c.lamp.C5');
    expect(runs[0]?.evidence).toEqual([{ kind: 'code', format: 'lamp', text: 'C5' }]);
    expect(problems).toEqual(['Left out: “e.octal.decimal”.']);
  });
});

describe('evidence that is too large for a link', () => {
  const lane = (bit: number) => ({
    bank: 'A',
    bit,
    readsOne: 123_456,
    readsZero: 654_321,
    alone: 5,
    words: 65_536,
    rows: 256,
    columns: 256,
    ones: 0,
    zeros: 0xff00,
    first: 17,
    last: 999_999,
  });
  const log: Evidence = {
    kind: 'log',
    name: 'night.log',
    lines: 1_000_000,
    readings: 999_000,
    unread: 1000,
    outside: 0,
    rest: 'unknown',
    values: [],
    lanes: Array.from({ length: 1024 }, (_, at) => lane(at % 72)),
    right: [],
  };
  const code: Evidence = { kind: 'code', format: 'lamp', text: 'C5' };
  const runs: Run[] = [{ changes: [], evidence: [code, log], complete: true }];

  it('stays on the device, and the link says so and keeps the rest', () => {
    const link = fitLink(runs, keptEvidence);
    expect(link.length).toBeLessThan(200);
    expect(leftBehind(link)).toEqual(['the log “night.log”']);
    expect(workspaceLink.parse(link)).toEqual({ runs, problems: [] });
    // On another device:
    const elsewhere = readLink(link);
    expect(elsewhere.runs[0]?.evidence).toEqual([code]);
    expect(elsewhere.problems).toEqual([
      'This link does not carry the log “night.log”: it stayed on the device where it was read. Read it in again here.',
    ]);
  });

  it('travels in the link where there is room', () => {
    const small: Run[] = [{ changes: [], evidence: [{ ...log, lanes: log.lanes.slice(0, 64) }], complete: true }];
    const link = fitLink(small, keptEvidence);
    expect(leftBehind(link)).toEqual([]);
    expect(readLink(link)).toEqual({ runs: small, problems: [] });
  });

  it('never makes a link too long, whatever the one large piece is', () => {
    fc.assert(
      fc.property(anyEvidence, (one) => {
        const many = Array.from({ length: 3 }, () => runsSchema.parse([{ evidence: [one] }])[0] as Run);
        expect(fitLink(many, keptEvidence).length).toBeLessThanOrEqual(longestLink);
      }),
      { numRuns: 100 },
    );
  });
});
