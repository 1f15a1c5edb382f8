import { lane } from '@/lib/brand';
import { buildLayoutIndex } from '@/lib/layout/build-layout-index';
import { compileFormat } from '@/lib/report/compile-format';
import { type LayoutDocumentInput, layoutDocument } from '@/shared';
import { validateLayout } from '@/lib';
import { buildLayout } from '@/tests/factories/layout';

type Part = NonNullable<LayoutDocumentInput['reportFormats']>[number]['parts'][number];
type Code = { kind: 'hamming' | 'sec-ded'; columns: number[] };

/** Eight data bits and five check bits; every column has odd weight. */
const columns = [7, 11, 13, 14, 19, 21, 22, 25, 1, 2, 4, 8, 16];

function boardWith(field: object, more: Part[] = [{ field: 'bank', notation: 'names' }, { text: ' ' }]) {
  const board = buildLayout({ banks: 2, bits: 8, parity: 5, formats: ['code'] });
  const syndrome = { field: 'syndrome', notation: 'hexadecimal', code: { kind: 'sec-ded', columns }, ...field } as Part;
  return layoutDocument.parse({
    ...board,
    reportFormats: [{ id: 'ecc', name: 'Syndrome', parts: [...more, syndrome], after: 'lists-lanes' }],
    examples: [],
  });
}

function compiled(field: object = {}, more?: Part[]) {
  const board = boardWith(field, more);
  const index = buildLayoutIndex(board);
  return { index, result: compileFormat(board.reportFormats[0]!, index) };
}

function ready(field: object = {}, more?: Part[]) {
  const { index, result } = compiled(field, more);
  if (!result.ok) throw new Error(result.reasons.map(({ message }) => message).join(' '));
  return { index, format: result.format };
}

const reasonsOf = (field: object) => {
  const { result } = compiled(field);
  return result.ok ? [] : result.reasons.map(({ pointer, message }) => [pointer, message]);
};

describe('a syndrome by a code', () => {
  it.each(['hexadecimal', 'decimal', 'octal', 'binary'])('leads in %s to each lane and back', (notation) => {
    const { index, format } = ready({ notation });
    for (const at of index.lanes) {
      const written = format.write([lane(at)]);
      if (!written.ok) throw new Error(written.reason);
      const read = format.read(written.text);
      if (!read.ok) throw new Error(read.reason);
      expect(read.readings.map(({ failing }) => failing.map((bad) => bad.lane))).toEqual([[at]]);
    }
  });

  it('shows the other bits of the word to be right where it would have told two wrong ones', () => {
    const { index, format } = ready();
    const read = format.read('A 13');
    if (!read.ok) throw new Error(read.reason);
    expect(read.readings[0]!.failing).toEqual([{ lane: 4, reads: 'unknown' }]);
    expect([...read.readings[0]!.passed]).toEqual(Array.from(index.lanes).filter((at) => at < 13 && at !== 4));
  });

  it('says nothing of the other bits where it corrects only', () => {
    const { format } = ready({ code: { kind: 'hamming', columns } }, [
      { field: 'bank', notation: 'names' },
      { text: ' ' },
    ]);
    const read = format.read('A 13');
    const sure = ready().format.read('A 13');
    if (!read.ok || !sure.ok) throw new Error('not read');
    expect(read.readings[0]!.passed).not.toEqual(sure.readings[0]!.passed);
  });

  it('gives the reason where it means two bits, more, none, or does not exist', () => {
    const { format } = ready();
    expect(format.read('A 05')).toMatchObject({
      ok: false,
      reason: 'Syndrome 05 means two wrong bits; the code cannot say which.',
    });
    expect(format.read('A 1F')).toMatchObject({
      ok: false,
      reason: 'Syndrome 1F means more wrong bits than the code can tell.',
    });
    expect(format.read('A 00')).toMatchObject({ ok: false, reason: 'Syndrome 00 means that no bit is wrong.' });
    expect(format.read('A 20')).toMatchObject({ ok: false, reason: 'Syndrome 20: this code has 00 to 1F.' });
  });

  it('takes a line of the table before the code', () => {
    const { format } = ready({ table: [{ text: '05', means: 'the memory controller gave up' }] });
    expect(format.read('A 05')).toMatchObject({ ok: false, reason: '05: the memory controller gave up.' });
    expect(format.read('A 13').ok).toBe(true);
  });

  it('cannot say two wrong bits, or a bit that it has no column for', () => {
    expect(ready().format.write([lane(0), lane(1)])).toMatchObject({ ok: false });
    const { format } = ready({ bits: [0, 1, 2, 3], code: { kind: 'sec-ded', columns: columns.slice(0, 4) } });
    expect(format.write([lane(3)])).toEqual({ ok: true, text: 'A E' });
    expect(format.write([lane(4)])).toEqual({
      ok: false,
      reason: expect.stringContaining('the code has no column for that bit'),
    });
  });
});

describe('the keypad', () => {
  const { format } = ready({ digits: { min: 2, max: 2 } });

  it('shows which sockets a syndrome can still mean', () => {
    const { possible, reason, expects } = format.next('A 1');
    // 10, 13, 15, 16 and 19 begin with 1.
    expect([...possible].sort((a, b) => a - b)).toEqual([4, 5, 6, 7, 12]);
    expect(reason).toBeNull();
    expect(expects).toBe('bank A and B, then syndrome 00 to 1F');
  });

  it('takes no digit that leads beyond the code, and says what it has', () => {
    const { keys } = format.next('A ');
    expect(keys.filter(({ enabled }) => enabled).map(({ text }) => text)).toEqual(['0', '1']);
    expect(format.next('A 2').reason).toBe('Syndrome 2: this code has 00 to 1F.');
  });

  it('lets a syndrome of two wrong bits be typed to its end, with its words', () => {
    expect(format.next('A 0').keys.find(({ text }) => text === '5')!.enabled).toBe(true);
    expect(format.next('A 05')).toMatchObject({
      complete: false,
      reason: 'Syndrome 05 means two wrong bits; the code cannot say which.',
    });
  });
});

describe('a bad matrix', () => {
  const code = (change: Partial<Code>): { code: Code } => ({ code: { kind: 'sec-ded', columns, ...change } });
  const put = (at: number, value: number) => columns.map((column, n) => (n === at ? value : column));

  it('is named by its column', () => {
    expect(reasonsOf(code({ columns: put(2, 0) }))).toEqual([
      ['/parts/2/code/columns/2', 'A column of 0 says that bit 2 is never checked.'],
    ]);
    expect(reasonsOf(code({ columns: put(3, 7) }))).toEqual([
      ['/parts/2/code/columns/3', 'Bit 3 has the same column as bit 0: the code could not tell them apart.'],
    ]);
    expect(reasonsOf(code({ columns: put(12, 12) }))).toEqual([
      [
        '/parts/2/code/columns/12',
        'Bit 0 and bit 1 wrong together would look like bit 12 alone, so two errors are not detected.',
      ],
    ]);
  });

  it('has another number of columns than the field has bits', () => {
    expect(reasonsOf(code({ columns: columns.slice(1) }))).toEqual([
      ['/parts/2/code/columns', 'The code has 12 columns, but the field has 13 bits. Give one for each.'],
    ]);
  });

  it('gives syndromes that the digits cannot show', () => {
    expect(reasonsOf({ digits: { min: 1, max: 1 } })).toEqual([
      ['/parts/2/code', 'Syndromes go up to 1F, which is more than the 1 digit of the field.'],
    ]);
  });

  it('belongs to a syndrome in digits only', () => {
    expect(reasonsOf({ field: 'bit' }).map(([, message]) => message)).toContain(
      'Only a syndrome has a code, not a bit.',
    );
    expect(reasonsOf({ notation: 'words', table: [{ text: 'X', bits: [0] }] }).map(([, message]) => message)).toContain(
      'A code gives numbers. Choose hexadecimal, decimal, octal or binary digits.',
    );
    expect(reasonsOf({ code: undefined }).map(([, message]) => message)).toContain(
      'Say in a table which bits each syndrome stands for, or give the code that it comes from.',
    );
  });

  it('is a problem of the layout, with a pointer to the column', () => {
    const problems = validateLayout(boardWith(code({ columns: put(2, 0) })));
    expect(problems.map(({ pointer }) => pointer)).toContain('/reportFormats/0/parts/2/code/columns/2');
    expect(validateLayout(boardWith({})).filter(({ severity }) => severity === 'error')).toEqual([]);
  });
});
