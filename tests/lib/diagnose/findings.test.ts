import { buildLayoutIndex, diagnose, priors, priorsFor } from '@/lib';
import { layoutDocument, runs as runsSchema, type Finding, type RunInput } from '@/shared';
import { caseBoards } from '../../factories/cases';

const index = buildLayoutIndex(layoutDocument.parse(caseBoards.A));
type Seen = NonNullable<RunInput['evidence']>;
const oneBit: Seen = [{ kind: 'lanes', failing: [{ bank: '1', bit: 5 }], passed: 'rest' }];
const bothBanks: Seen = [
  {
    kind: 'lanes',
    failing: [
      { bank: '0', bit: 5 },
      { bank: '1', bit: 5 },
    ],
    passed: 'rest',
  },
];
const answer = (evidence: Seen) => diagnose(index, runsSchema.parse([{ evidence }]));
const shareOf = (evidence: Seen, id: string) =>
  answer(evidence).suspects.find((suspect) => suspect.id === id)?.probability ?? 0;

describe('what a check at the bench found', () => {
  it('makes a contact with an open leg lead over its chip', () => {
    const open: Finding = { kind: 'finding', check: 'legs', about: 'position:U25', found: 'bad' };
    expect(shareOf(oneBit, 'position:U25')).toBeLessThan(shareOf(oneBit, 'chip:U25'));
    expect(shareOf([...oneBit, open], 'position:U25')).toBeGreaterThan(shareOf([...oneBit, open], 'chip:U25'));
  });

  it('names the chip that held the line when the others come back with it out', () => {
    const freed: Finding = { kind: 'finding', check: 'pull', about: 'chip:U15', found: 'bad' };
    expect(answer(bothBanks).outcome).toBe('group');
    const after = answer([...bothBanks, freed]);
    expect(after.places[0]?.socket).toBe('U15');
    expect(after.places[0]?.probability).toBeGreaterThan(0.9);
  });

  it('leaves the line and its driver when none of the chips held it', () => {
    const none: Finding = { kind: 'finding', check: 'pull', about: 'chip:U15 chip:U25', found: 'good' };
    const after = answer([...bothBanks, none]);
    expect(after.outcome).toBe('shared');
    expect(after.suspects[0]?.id).toBe('shared:U30');
  });

  it('is not asked for again', () => {
    const first = answer(bothBanks).nextChecks.find((check) => check.outcomes.some(({ finding }) => finding));
    const finding = first?.outcomes.at(-1)?.finding as Finding;
    expect(finding.found).toBe('good');
    const labels = answer([...bothBanks, finding]).nextChecks.map((check) => check.label);
    expect(labels).not.toContain(first?.label);
  });
});

describe('the history of a board', () => {
  it('makes the chip of a socket that failed often likelier, and the others less', () => {
    const counts = index.document.sockets.map(({ label }) => ({ failed: label === 'U25' ? 12 : 1, boards: 100 }));
    const plain = diagnose(index, runsSchema.parse([{ evidence: bothBanks }]));
    const told = diagnose(index, runsSchema.parse([{ evidence: bothBanks }]), { ...priors, ...priorsFor(counts) });
    const share = (of: typeof plain, id: string) => of.suspects.find((suspect) => suspect.id === id)?.probability ?? 0;
    expect(share(told, 'chip:U25')).toBeGreaterThan(share(plain, 'chip:U25'));
    expect(share(told, 'chip:U15')).toBeLessThan(share(plain, 'chip:U15'));
  });
});

describe('a chip of another supply that was just fitted', () => {
  it('is told before anything is tested with it', () => {
    const told = diagnose(
      index,
      runsSchema.parse([
        { evidence: [{ kind: 'mask', bank: '0', mask: 4 }] },
        { changes: [{ kind: 'replace', socket: 'U12', family: 'dynamic-64k-1' }] },
      ]),
    );
    expect(told.headline).toMatch(/^Power off\. The chip just fitted in U12 is not made for this socket/);
    expect(told.sentences.join(' ')).toContain('Pin 8 has +12 V');
    expect(told.nextChecks[0]).toMatchObject({ action: 'replace', sockets: ['U12'] });
  });
});
