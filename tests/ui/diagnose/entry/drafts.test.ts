import fc from 'fast-check';
import { doubtsOf, readTab, writeTab } from '@/components/features/diagnose/entry/doubts';
import { readAddress } from '@/components/features/diagnose/entry/read-address';
import {
  draftOfReadings,
  readReadingsDraft,
  readTyped,
  writeReadingsDraft,
} from '@/components/features/diagnose/entry/readings-draft';
import {
  readAlias,
  readSign,
  readSupply,
  writeAlias,
  writeSign,
  writeSupply,
} from '@/components/features/diagnose/entry/small-drafts';
import { verdictOf } from '@/components/features/diagnose/entry/supply-words';
import { readVolts, voltWords } from '@/components/features/diagnose/volt-words';
import { supplyPins } from '@/lib';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, signKinds, type Readings } from '@/shared';
import { readyBench } from '../ready-bench';

const bench = (slug: string) => readyBench(layoutDocument.parse(demoBoards.find((one) => one.slug === slug)?.document));

const line = fc.string().map((text) => text.replaceAll('\n', ''));

describe('what is being typed', () => {
  it('comes back from the link as it was', () => {
    fc.assert(
      fc.property(
        fc.record({
          text: fc.string({ unit: 'binary' }),
          rest: fc.constantFrom(null, 'passed' as const, 'unknown' as const),
          unit: fc.constantFrom(null, 'word' as const, 'address' as const),
          way: fc.option(fc.nat(7)),
          waited: line,
        }),
        (draft) => expect(readReadingsDraft(writeReadingsDraft(draft))).toEqual(draft),
      ),
    );
    fc.assert(
      fc.property(
        fc.record({
          sign: fc.option(fc.constantFrom(...signKinds)),
          socket: line.filter((text) => text.trim() !== ''),
        }),
        (draft) => expect(readSign(writeSign(draft))).toEqual(draft),
      ),
    );
    fc.assert(
      fc.property(fc.record({ socket: fc.constant('U31'), pin: line, volts: line }), (draft) =>
        expect(readSupply(writeSupply(draft))).toEqual(draft),
      ),
    );
    fc.assert(
      fc.property(
        fc.record({ one: fc.constant('4000'), other: line, bits: fc.option(fc.array(fc.nat(71))) }),
        (draft) => expect(readAlias(writeAlias(draft))).toEqual(draft),
      ),
    );
  });

  it('keeps readings that are only looked at as they were, and reads them again once they are changed', () => {
    const { index } = bench('tarnvall-t-64-rev-b');
    const readings: Readings = {
      kind: 'readings',
      lines: [
        { address: 0x4c1a, written: 0xff, read: 0xf7 },
        { address: 0x4c20, to: 0x4cff, step: 0x20, mask: 8, register: { name: 'page', value: 3 } },
      ],
      unit: 'address',
      shows: 'word',
      rest: 'passed',
      waited: 2,
    };
    const draft = draftOfReadings(index, readings);
    expect(draft.text).toBe('4C1A FF F7\npage 3 4C20 to 4CFF step 20 mask 8');
    expect(readTyped(index, draft, readings).evidence).toEqual(readings);
    const changed = readTyped(index, { ...draft, text: '4C1A FF F7' }, readings).evidence;
    expect(changed).toEqual({ ...readings, lines: readings.lines.slice(0, 1), shows: 'address' });
    expect(readTyped(index, { ...draft, rest: 'unknown', waited: '' }, readings).evidence).toEqual({
      ...readings,
      rest: 'unknown',
      waited: undefined,
    });
  });

  it('keeps the doubts beside the tab', () => {
    expect(readTab(writeTab('lamp', ['first', 'order']))).toEqual({ tab: 'lamp', doubts: ['first', 'order'] });
    expect(readTab('~bits')).toEqual({ tab: '~bits', doubts: [] });
    expect(readTab('lamp~nonsense')).toEqual({ tab: 'lamp', doubts: [] });
  });
});

describe('what may be doubted of a format', () => {
  it('is only what it takes for granted', () => {
    const { index, formats } = bench('wrayburn-gr-5-2b');
    const open = formats.filter((format) => format.open.some(([one]) => one.includes('counted from')));
    expect(open.length).toBeGreaterThan(0);
    for (const { definition } of open) expect(doubtsOf(definition, index)).not.toContain('first');
  });
});

describe('numbers as a technician writes them', () => {
  it.each([
    ['4.72', 4.72],
    ['4,72 V', 4.72],
    ['−5.01', -5.01],
    ['- 5', -5],
    ['+12', 12],
    ['.5', 0.5],
    ['101', null],
    ['five', null],
    ['', null],
    ['1.2.3', null],
  ])('reads %s as volts', (text, volts) => expect(readVolts(text)).toBe(volts));

  it('writes volts with a minus that is one', () => {
    expect(voltWords(-5.014)).toBe('−5.01\u00a0V');
    expect(voltWords(-0.001)).toBe('0\u00a0V');
  });

  it('reads an address in the notation of the board, or with a mark of its own', () => {
    const { index } = bench('tarnvall-t-64-rev-b');
    for (const text of ['4C1A', '4c1a', '0x4C1A', '$4C1A', '4C1Ah']) expect(readAddress(index, text)).toBe(0x4c1a);
    for (const text of ['', '4G', '0x', 'FFFFFFFFFFF']) expect(readAddress(index, text)).toBeNull();
  });
});

describe('the supply pins of a socket', () => {
  const loom = bench('tarnvall-t-64-rev-b');
  const socket = loom.document.sockets[0]?.label ?? '';

  it('are the rails of the board and the ground of the chip, by pin', () => {
    const pins = supplyPins(loom.index, socket);
    for (const { name, volts, pins: at } of loom.document.rails) {
      for (const pin of at) expect(pins).toContainEqual(expect.objectContaining({ pin, name, volts, by: 'board' }));
    }
    expect(pins.some(({ volts }) => volts === 0)).toBe(true);
    expect(pins.map(({ pin }) => pin)).toEqual(pins.map(({ pin }) => pin).sort((a, b) => a - b));
    expect(supplyPins(loom.index, 'U99')).toEqual([]);
  });

  it('are out of their limits just beyond them, for a negative rail as well', () => {
    const five = { pin: 8, name: '+5 V', volts: 5, least: 4.75, most: 5.25, by: 'board' as const };
    expect(verdictOf(five, 4.75).bad).toBe(false);
    expect(verdictOf(five, 4.74)).toMatchObject({ bad: true, words: expect.stringMatching(/^Too low/) });
    expect(verdictOf(five, 5.26)).toMatchObject({ bad: true, words: expect.stringMatching(/^Too high/) });
    const minus = { pin: 1, name: '−5 V', volts: -5, least: -5.5, most: -4.5, by: 'board' as const };
    expect(verdictOf(minus, 0)).toMatchObject({ bad: true, words: expect.stringMatching(/^Too high/) });
  });
});
