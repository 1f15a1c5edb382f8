import { bbcModelB, commodore64, ibmPc, spectrum48 } from './machine-charts';
import { bbcLayout, commodoreLayout, ibmLayout, ibmSocket, readyLayout, spectrumLayout } from './machine-layouts';

const hex = (n: number) => n.toString(16).toUpperCase().padStart(2, '0');
const upTo = (from: string, to: string) => {
  const [first, last] = [Number.parseInt(from, 16), Number.parseInt(to, 16)];
  return Array.from({ length: last - first + 1 }, (_, n) => hex(first + n));
};
const named = ({ source }: { source: { title: string; author: string; year: string; page: string } }) =>
  `${source.title}; ${source.author}; ${source.year}; ${source.page}`;

describe.each(ibmPc.map((chart) => [chart.machine, named(chart), chart] as const))('%s (%s)', (_, __, chart) => {
  const board = readyLayout(ibmLayout(chart));

  it('is a layout without error', () => expect(board.errors).toEqual([]));

  it('names the chip for every block and every mask of the chart', () => {
    let cells = 0;
    chart.banks.forEach(([from, to], bank) => {
      for (const block of upTo(from, to)) {
        for (const [mask, bit] of chart.bits) {
          expect(board.sockets('start-up', `${block}${mask} 201`)).toEqual([ibmSocket(bank, bit)]);
          cells++;
        }
      }
    });
    expect(cells).toBe((chart.bankWords / 0x1000) * 4 * 9);
  });

  it('writes the code of every chip, which leads back to it', () => {
    chart.banks.forEach(([from], bank) => {
      for (const [mask, bit] of chart.bits) {
        const written = board.back('start-up', ibmSocket(bank, bit));
        expect(written).toEqual({ ok: true, text: `${from}${mask} 201` });
      }
    });
  });

  it.each(chart.worked.map((row) => [row.report, named(row), row] as const))(
    'reads the worked report %s (%s)',
    (report, _source, row) => {
      expect(board.sockets('start-up', report)).toEqual(row.bits.map((bit) => ibmSocket(row.bank, bit)));
    },
  );

  it('says that blocks beyond the board are memory on an expansion card', () => {
    for (const block of upTo(chart.beyond.from, chart.beyond.to)) {
      expect(board.sockets('start-up', `${block}01 201`)).toBe(`${block}: ${chart.beyond.means}.`);
    }
    expect(board.sockets('start-up', 'A001 201')).toMatch(/^A0 is outside this board's memory\. The nearest is /);
  });
});

describe(`${commodore64.machine} (${named(commodore64)})`, () => {
  const board = readyLayout(commodoreLayout());

  it('is a layout without error', () => expect(board.errors).toEqual([]));

  it.each(commodore64.socketsFromD0.map((label, bit) => [label, bit] as const))(
    '%s is data bit %i, whatever was written',
    (label, bit) => {
      for (const written of [0x00, 0xff, 0x55, 0xaa, 0x20]) {
        expect(board.sockets('screen', `${hex(written)} ${hex(written ^ (1 << bit))}`)).toEqual([label]);
      }
      const back = board.back('screen', label);
      expect(board.sockets('screen', back.ok ? back.text : '')).toEqual([label]);
    },
  );

  it('reads the worked case: a space that shows as a dollar sign', () => {
    for (const { wrote, read, socket } of commodore64.worked)
      expect(board.sockets('screen', `${wrote} ${read}`)).toEqual([socket]);
  });
});

describe(`${spectrum48.machine} (${named(spectrum48)})`, () => {
  const board = readyLayout(spectrumLayout());

  it('is a layout without error', () => expect(board.errors).toEqual([]));

  it.each(spectrum48.rows)(
    'names bit $bit in both banks from what 85 and 170 read back as',
    ({ read85, read170, bit }) => {
      for (const { from, to, socketsFromD0 } of spectrum48.banks) {
        for (const address of [from, from + 1, to]) {
          expect(board.sockets('wrote-85', `${address} ${read85}`)).toEqual([socketsFromD0[bit]]);
          expect(board.sockets('wrote-170', `${address} ${read170}`)).toEqual([socketsFromD0[bit]]);
        }
        expect(board.back('wrote-85', socketsFromD0[bit]!)).toEqual({ ok: true, text: `${from} ${read85}` });
        expect(board.back('wrote-170', socketsFromD0[bit]!)).toEqual({ ok: true, text: `${from} ${read170}` });
      }
    },
  );

  it('reads the worked row', () => {
    for (const { address, wrote, read, socket } of spectrum48.worked)
      expect(board.sockets(`wrote-${wrote}`, `${address} ${read}`)).toEqual([socket]);
  });

  it('refuses addresses of the ROM, and a value that is what was written', () => {
    expect(board.sockets('wrote-85', '16383 84')).toBe(
      "16383 is outside this board's memory. The nearest is 16384 to 32767, bank lower.",
    );
    expect(board.sockets('wrote-85', '16384 85')).toBe('What was read is what was written: nothing failed here.');
  });
});

describe(`${bbcModelB.machine} (${named(bbcModelB)})`, () => {
  const board = readyLayout(bbcLayout());

  it('is a layout without error', () => expect(board.errors).toEqual([]));

  it.each(
    bbcModelB.banks.flatMap(({ bank, socketsFromD0 }) =>
      socketsFromD0.map((label, bit) => [bank, bit, label] as const),
    ),
  )('bank %s, bit %i is %s', (bank, bit, label) => {
    expect(board.sockets('place', `${bank} D${bit}`)).toEqual([label]);
    expect(board.sockets('label', label)).toEqual([label]);
    expect(board.back('place', label)).toEqual({ ok: true, text: `${bank} D${bit}` });
    expect(board.back('label', label)).toEqual({ ok: true, text: label });
  });
});
