import { buildLayoutIndex, diagnose } from '@/lib';
import { shapeShares, shownBy } from '@/lib/diagnose/shapes';
import { layoutDocument, runs as runsSchema, type RunInput } from '@/shared';
import { caseBoards } from '../../factories/cases';

const index = buildLayoutIndex(layoutDocument.parse(caseBoards.A));
const answer = (...evidence: NonNullable<RunInput['evidence']>) => diagnose(index, runsSchema.parse([{ evidence }]));
const oddsOf = (of: ReturnType<typeof diagnose>) => {
  const place = of.places.find(({ socket }) => socket === 'U25');
  return (place?.chip ?? NaN) / (place?.contact ?? NaN);
};

describe('how failing words lie in a chip', () => {
  it('is divided among all shapes for each kind of fault', () => {
    for (const [kind, row] of Object.entries(shapeShares)) {
      const total = Object.values(row).reduce((sum, share) => sum + share, 0);
      expect({ kind, total }).toEqual({ kind, total: expect.closeTo(1, 12) });
    }
  });

  it('weighs chip against contact by the ratio of their shares', () => {
    const lane = answer({ kind: 'lanes', failing: [{ bank: '1', bit: 5 }], passed: 'rest' });
    // Row 27 of the chip in U25: every 80 hex from 4027 on.
    const row = answer({
      kind: 'readings',
      rest: 'passed',
      lines: [{ address: 0x4027, to: 0x7fa7, step: 0x80, written: 0, read: 0x20 }],
    });
    expect(row.signatures).toEqual([expect.objectContaining({ shape: 'row', row: 0x27, column: null, count: 128 })]);
    const ratio = shapeShares.chip.row / shapeShares.contact.row;
    // A chip that holds the line spoils both banks and drops out in both answers; the rest is the table.
    expect(oddsOf(row) / oddsOf(lane) / ratio).toBeCloseTo(1, 1);
  });

  it('is not told from a single line: cell, row and whole chip all fit', () => {
    const one = answer({ kind: 'readings', lines: [{ address: 0x52a7, written: 0, read: 0x20 }] });
    expect(one.signatures).toEqual([]);
    expect(one.evidence[0]?.words).toEqual([
      { address: 0x52a7, bank: '1', word: 0x12a7, row: 39, column: 37, mask: 0x20 },
    ]);
  });

  it('makes a pass in few words worth less than a pass in many, and one value less than both', () => {
    const few = shownBy('chip', { words: 1, bothValues: false });
    const both = shownBy('chip', { words: 1, bothValues: true });
    const many = shownBy('chip', { words: 65_536, bothValues: true });
    expect(few).toBeLessThan(both);
    expect(both).toBeLessThan(many);
    expect(many).toBe(1);
  });
});

describe('an address outside every window', () => {
  it('says so and names the nearest window', () => {
    const outside = answer({ kind: 'readings', lines: [{ address: 0x9000, written: 0, read: 0x20 }] });
    expect(outside.evidence[0]).toMatchObject({
      ok: false,
      reason: "9000 lies outside this board's memory; the nearest window is 4000 to 7FFF.",
    });
  });
});
