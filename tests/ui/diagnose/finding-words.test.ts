import { evidenceWords } from '@/components/features/diagnose/evidence-words';
import { readLink } from '@/components/features/diagnose/link/workspace-link';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, type Finding } from '@/shared';
import { readyBench } from './ready-bench';

const loom = readyBench(layoutDocument.parse(demoBoards.find(({ slug }) => slug === 'tarnvall-t-64-rev-b')?.document));

const found = (check: Finding['check'], about: string, is: Finding['found']): Finding => ({
  kind: 'finding',
  check,
  about,
  found: is,
});
const words = (seen: Finding, link = '') => evidenceWords(seen, loom, readLink(link).runs).text;

describe('what was found at the bench', () => {
  it.each<[Finding, string]>([
    [found('legs', 'position:U25', 'bad'), 'Measured to the legs of U25: a leg is open'],
    [found('legs', 'position:U25', 'good'), 'Measured to the legs of U25: all legs are joined'],
    [found('joined', 'short:2-3', 'bad'), 'D2 and D3 measured: joined'],
    [found('joined', 'short:2-3', 'good'), 'D2 and D3 measured: apart'],
    [found('output', 'shared:U52', 'good'), 'Outputs of U52 on the scope: right'],
    [found('output', 'unlisted:line:5', 'bad'), 'Data line D5 on the scope: missing or wrong'],
    [found('output', 'unlisted:bank:C', 'bad'), 'What selects bank C on the scope: missing or wrong'],
    [found('output', 'unlisted:all', 'good'), 'What all banks share on the scope: right'],
    [found('output', 'unlisted:address:3', 'good'), 'Address line 3 of the chips on the scope: right'],
    [found('pin', 'chip:U25', 'bad'), 'Data pin of U25 on the scope: no clean level'],
    [found('pin', 'chip:U25', 'good'), 'Data pin of U25 on the scope: like a good one'],
    [found('stack', 'chip:U25', 'bad'), 'Good chip on top of U25: better'],
    [found('stack', 'chip:U25', 'good'), 'Good chip on top of U25: no change'],
    [found('pull', 'chip:U25', 'bad'), 'U25 taken out: the others came back'],
    [found('pull', 'chip:U23 chip:U31', 'good'), 'U23 and U31 taken out in turn: no change'],
    [found('output', 'shared:IC 7', 'bad'), 'Outputs of IC 7 on the scope: missing or wrong'],
  ])('is told as a technician says it: %j', (seen, text) => {
    expect(words(seen)).toBe(text);
  });

  it('names a chip by the socket where it lay at the time', () => {
    const seen = found('stack', 'chip:U31', 'bad');
    expect(words(seen, '1~c.lamp.C5')).toBe('Good chip on top of U31: better');
    expect(words(seen, '1~c.lamp.C5~n~s.U31.U23~c.lamp.B5')).toBe('Good chip on top of U23 (chip from U31): better');
    const later = found('stack', 'chip:U31#2', 'good');
    expect(words(later, '1~c.lamp.C5~n~x.U31.good~c.lamp.C5')).toBe('Good chip on top of U31: no change');
    expect(words(later)).toBe('Good chip on top of U31 (chip 2): no change');
    expect(words(seen, '1~c.lamp.C5~n~x.U31.good~c.lamp.C5')).toBe('Good chip on top of U31 (chip 1): better');
  });

  it('shows as it is what this board does not have', () => {
    expect(words(found('joined', 'short:2-999', 'bad'))).toBe('Short:2-999 measured: joined');
    expect(words(found('legs', 'nothing at all', 'good'))).toBe(
      'Measured to the legs of nothing at all: all legs are joined',
    );
  });
});
