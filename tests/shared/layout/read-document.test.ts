import { buildLayout } from '../../factories/layout';
import { readLayoutDocument } from '@/shared/layout/read-document';

const pointersOf = (sent: unknown): string[] => {
  const read = readLayoutDocument(sent);
  return read.ok ? [] : read.problems.map(({ pointer }) => pointer);
};

describe('a layout document that is read', () => {
  it('is the same when it is read again', () => {
    const document = buildLayout({ banks: 2, bits: 8 });
    const read = readLayoutDocument(JSON.parse(JSON.stringify(document)));
    expect(read).toEqual({ ok: true, document });
  });

  it('has all that does not fit told at once', () => {
    const document = buildLayout({ banks: 2, bits: 8 });
    const sent = { ...document, format: 'other', board: { ...document.board, year: 12 }, sockets: [] };
    expect(pointersOf(sent).sort()).toEqual(['/board/year', '/format', '/sockets']);
  });

  it('leaves a rest to look at when only sections that it can do without are spoilt', () => {
    const document = buildLayout({ banks: 2, bits: 8 });
    const read = readLayoutDocument({ ...document, reportFormats: [{}], sources: 'none' });
    if (read.ok) throw new Error('it should not fit');
    expect(read.rest?.leftOut).toEqual(['reportFormats', 'examples', 'sources']);
    expect(read.rest?.document.sockets).toEqual(document.sockets);
  });

  it.each([[null], [[]], [3], ['text'], [{}]])('is %j, and has no rest', (sent) => {
    expect(readLayoutDocument(sent)).toMatchObject({ ok: false, rest: undefined });
    expect(pointersOf(sent).length).toBeGreaterThan(0);
  });
});
