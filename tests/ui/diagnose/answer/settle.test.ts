import { outcomeEvidence } from '@/components/features/diagnose/answer/outcome-evidence';
import { settle } from '@/components/features/diagnose/answer/settle';
import { readLink, writeLink } from '@/components/features/diagnose/link/workspace-link';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { readyBench } from '../ready-bench';

const board = (slug: string) => layoutDocument.parse(demoBoards.find((one) => one.slug === slug)?.document);
const loom = readyBench(board('tarnvall-t-64-rev-b'));
const survey = readyBench(board('wrayburn-gr-5-2b'));

const settled = (bench: typeof loom, link: string, answer: string) => {
  const runs = settle(bench, readLink(link).runs, answer);
  return runs === null ? null : writeLink(runs);
};

describe('an answer to an open question', () => {
  it('chooses the way that it names, and of two the one that says more', () => {
    const link = '1~e.the log is octal.the log is octal and counts words~r.-.1CwFrE~r.w.1CwFrE~c.lamp.C5';
    expect(settled(loom, link, 'the log is octal')).toBe('1~r.-.1CwFrE~c.lamp.C5');
    expect(settled(loom, link, 'the log is octal and counts words')).toBe('1~r.w.1CwFrE~c.lamp.C5');
    expect(settled(loom, link, 'something else')).toBeNull();
  });

  it('sets a doubt aside where the machine counts as the layout says', () => {
    expect(settled(loom, '1~q.order.lamp.C5', 'bit 0 is the lowest')).toBe('1~c.lamp.C5');
  });

  it('keeps what the code means where the machine counts otherwise', () => {
    expect(settled(loom, '1~q.order.lamp.C5', 'bit 0 is the highest')).toMatch(/^1~l\.some\.C-2\.ok/);
  });

  it('settles a convention that the layout itself leaves open', () => {
    const [format] = survey.formats.filter(({ open }) => open.length > 0);
    const read = format?.compiled.read('ERR 03');
    const id = format?.definition.id ?? '';
    if (read?.ok !== true) throw new Error('The code of the test is none.');
    const takes = read.readings.map((one) => one.takes.join(', '));
    expect(takes).toHaveLength(2);
    const both = takes.map((answer) => settled(survey, `1~c.${id}.ERR 03`, answer));
    expect(new Set(both).size).toBe(2);
    for (const link of both) expect(link).toMatch(/^1~l\.some\./);
  });

  it('changes nothing of evidence that leaves nothing open', () => {
    expect(settled(loom, '1~c.lamp.C5~p', 'bit 0 is the lowest')).toBeNull();
  });
});

describe('an outcome that was foretold', () => {
  const runs = readLink('1~c.lamp.C5').runs;

  it('is entered as the code that it shows', () => {
    expect(outcomeEvidence(loom, runs, { sees: 'C4' })).toEqual([{ kind: 'code', format: 'lamp', text: 'C4' }]);
    expect(outcomeEvidence(loom, runs, { sees: 'C4, C5' })).toHaveLength(2);
    expect(outcomeEvidence(loom, runs, { sees: 'no failure' })).toEqual([{ kind: 'pass' }]);
  });

  it('is left to be typed where it is told in words', () => {
    expect(outcomeEvidence(loom, runs, { sees: 'bit 5 of bank C' })).toEqual([]);
    expect(outcomeEvidence(loom, [], { sees: 'C4' })).toEqual([]);
  });
});
