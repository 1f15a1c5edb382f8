import type { Evidence, Readings } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { laneAt } from '../../layout/served-lanes';
import { chipWordOf } from '../../layout/segments';
import { addressWords, bankWords, listWords } from '../../layout/words';
import { decodeAddress } from '../../place/address';
import { bitOf } from '../../place/address-bits';
import { nearestWords } from '../../place/nearest-window';
import { emptySeen, type LaneSeen } from '../../readings/lane-seen';
import { tallyOfLog, tallyReadings, type Tally } from '../../readings/tally';
import { lanesOfMarks } from '../../screen/lanes-of-marks';
import { askedAbout } from '../finding-weights';
import { emptyPiece, laneName, noChoice, refuse, shownOf, type Choice, type Read, type Where } from './piece';

type Of<K extends Evidence['kind']> = Extract<Evidence, { kind: K }>;

function failingOf(tally: Tally): Lane[] {
  return [...tally.lanes].flatMap(([lane, seen]) => (seen.readsOne + seen.readsZero + seen.words > 0 ? [lane] : []));
}

function rightOf(tally: Tally): Lane[] {
  return [...tally.lanes].flatMap(([lane, seen]) =>
    seen.readsOne + seen.readsZero + seen.words === 0 && seen.rightOnes + seen.rightZeros > 0 ? [lane] : [],
  );
}

function choiceOf(index: LayoutIndex, tally: Tally, takes: readonly string[]): Choice {
  const failing = failingOf(tally);
  const failed = new Set(failing);
  const passed = tally.whole ? ([...index.lanes] as Lane[]).filter((lane) => !failed.has(lane)) : rightOf(tally);
  return { ...noChoice, failing, passed, tally, takes };
}

function lineWords(index: LayoutIndex, evidence: Readings): string {
  const { addressMap } = index.document;
  const radix = addressMap.notation === 'hexadecimal' ? 16 : addressMap.notation === 'octal' ? 8 : 10;
  const value = (n: number) => n.toString(radix).toUpperCase();
  const [line] = evidence.lines;
  if (!line) return 'no reading';
  const at =
    addressWords(addressMap, line.address) + (line.to === undefined ? '' : ` to ${addressWords(addressMap, line.to)}`);
  const what =
    line.read === undefined
      ? `mask ${value(line.mask ?? 0)}`
      : `written ${value(line.written ?? 0)}, read ${value(line.read)}`;
  const more = evidence.lines.length - 1;
  return `${at}: ${what}${more > 0 ? ` and ${more} more` : ''}`;
}

/** Readings of single words. */
export function readReadings(where: Where, evidence: Of<'readings'>): Read {
  const { index, map } = where;
  const { ways, words, problems } = tallyReadings(map, evidence);
  const choices = ways.map(({ tally, takes }) => choiceOf(index, tally, takes));
  const text = lineWords(index, evidence);
  const [first] = choices;
  if (!first || (first.failing.length === 0 && first.passed.length === 0)) {
    return refuse(where, text, problems[0] ?? 'No line leads to a word of this board.');
  }
  return {
    piece: {
      ...emptyPiece(where),
      question: choices.length > 1 ? 'register' : null,
      choices,
    },
    shown: {
      ...shownOf(where, text),
      notes: [...new Set(problems)].slice(0, 12),
      failing: [...new Set(choices.flatMap((choice) => choice.failing))].map((lane) => laneName(index, lane)),
      words: [...words],
      passed: first.passed.length,
      alternatives: choices.length,
    },
  };
}

/** A log that was drawn together on the device. */
export function readLog(where: Where, evidence: Of<'log'>): Read {
  const { index } = where;
  const tally = tallyOfLog({ index }, evidence);
  const choice = choiceOf(index, tally, []);
  const text = `${evidence.name}: ${evidence.readings} readings`;
  if (choice.failing.length === 0 && choice.passed.length === 0) {
    return refuse(where, text, 'No reading of this log leads to a lane of this board.');
  }
  const notes = [
    ...(evidence.unread > 0 ? [`${evidence.unread} of ${evidence.lines} lines were not read.`] : []),
    ...(evidence.outside > 0 ? [`${evidence.outside} readings lie outside this board's memory.`] : []),
  ];
  return {
    piece: { ...emptyPiece(where), choices: [choice] },
    shown: {
      ...shownOf(where, text),
      notes,
      failing: choice.failing.map((lane) => laneName(index, lane)),
      passed: choice.passed.length,
    },
  };
}

/** Faults marked on the picture. */
export function readPicture(where: Where, evidence: Of<'picture'>): Read {
  const { index } = where;
  const { failing, passed, problems } = lanesOfMarks(index, evidence);
  const marks = evidence.marks.length;
  const text = `picture, ${marks} ${marks === 1 ? 'mark' : 'marks'}`;
  if (failing.length === 0) {
    return refuse(where, text, problems[0] ?? 'The marks touch no lane that the picture shows.');
  }
  const lanes = failing.map(({ lane }) => lane);
  const seen = failing.map(({ lane, words, shown, reads, failingSegments, rightSegments }): [Lane, LaneSeen] => [
    lane,
    {
      ...emptySeen(),
      readsOne: reads === 'one' ? words : 0,
      readsZero: reads === 'zero' ? words : 0,
      words,
      outOf: shown,
      failingSegments,
      rightSegments,
    },
  ]);
  const tally: Tally = { lanes: new Map(seen), values: [], whole: evidence.rest === 'right', readings: marks };
  return {
    piece: { ...emptyPiece(where), choices: [{ ...noChoice, failing: lanes, passed, tally }] },
    shown: {
      ...shownOf(where, text),
      notes: [...problems],
      failing: lanes.map((lane) => laneName(index, lane)),
      passed: passed.length,
    },
  };
}

/** Two addresses that lead to one cell: the bits fail there, and the address bits that differ tell which line is lost. */
export function readAlias(where: Where, evidence: Of<'alias'>): Read {
  const { index, map } = where;
  const { addressMap } = index.document;
  const [a, b] = evidence.addresses;
  const text = `${addressWords(addressMap, a)} and ${addressWords(addressMap, b)} are one cell`;
  const [one] = decodeAddress(map, a);
  const [other] = decodeAddress(map, b);
  if (!one) return refuse(where, text, nearestWords(map, a));
  if (!other) return refuse(where, text, nearestWords(map, b));
  const bits = evidence.bits ?? one.bits.map(Number);
  const failing: Lane[] = [];
  for (const bank of new Set([one.bank, other.bank])) {
    for (const bit of bits) {
      const lane = laneAt(index, bank, bit);
      if (lane === null) {
        const id = index.document.memory.banks[bank]?.id ?? '';
        return refuse(
          where,
          text,
          `Bit ${bit}: ${bankWords(id)} has no such bit; it has bits 0 to ${index.bitCount - 1}.`,
        );
      }
      failing.push(lane);
    }
  }
  const passed = one.bits.flatMap((bit) => {
    const lane = laneAt(index, one.bank, bit);
    return lane === null || bits.includes(bit) ? [] : [lane];
  });
  const aliased = one.bank === other.bank ? differingBits(index, failing[0] as Lane, [one.word, other.word]) : [];
  const notes =
    one.bank === other.bank
      ? [
          `They differ in ${aliased.length === 1 ? 'bit' : 'bits'} ${listWords(aliased.map(String))} of the word number inside the chip.`,
        ]
      : [
          `They lie in ${bankWords(laneName(index, failing[0] as Lane).bank)} and in another bank: what selects the bank.`,
        ];
  return {
    piece: { ...emptyPiece(where), choices: [{ ...noChoice, failing, passed, aliased }] },
    shown: {
      ...shownOf(where, text),
      notes,
      failing: failing.map((lane) => laneName(index, lane)),
      passed: passed.length,
    },
  };
}

function differingBits(index: LayoutIndex, lane: Lane, [one, other]: [number, number]): number[] {
  const [a, b] = [one, other].map((word) => chipWordOf(index, lane, word)?.inChip ?? word) as [number, number];
  return Array.from({ length: 40 }, (_, bit) => bit).filter((bit) => bitOf(a, bit) !== bitOf(b, bit));
}

const signWords = {
  'changes-each-pass': 'other failures in each pass',
  'grows-with-waiting': 'more fails the longer the test waits',
  'grows-with-warmth': 'fails when warm',
  touch: 'comes and goes when it is touched or flexed',
  hot: 'hotter than its neighbours',
  'writes-do-not-stick': 'what is written does not stick',
  dead: 'nothing runs',
} as const;

/** What the board does besides naming lanes. */
export function readSign(where: Where, evidence: Of<'sign'>): Read {
  const { index } = where;
  const text =
    evidence.socket === undefined ? signWords[evidence.sign] : `${evidence.socket}: ${signWords[evidence.sign]}`;
  if (evidence.socket !== undefined && !index.socketByLabel.has(evidence.socket)) {
    return refuse(where, text, `This board has no socket ${evidence.socket}.`);
  }
  return { piece: { ...emptyPiece(where), sign: evidence }, shown: shownOf(where, text) };
}

/** A supply at a pin. */
export function readMeasurement(where: Where, evidence: Of<'measurement'>): Read {
  const { index } = where;
  const text = `${evidence.socket} pin ${evidence.pin}: ${evidence.volts} V`;
  if (!index.socketByLabel.has(evidence.socket)) {
    return refuse(where, text, `This board has no socket ${evidence.socket}.`);
  }
  return { piece: { ...emptyPiece(where), measurement: evidence }, shown: shownOf(where, text) };
}

const findingWords = {
  legs: ['a leg is open', 'all legs are joined'],
  joined: ['joined', 'apart'],
  output: ['signal missing or wrong', 'signal right'],
  pin: ['no clean level', 'like a good one'],
  stack: ['better with a good chip on top', 'no change with a good chip on top'],
  pull: ['the others come back with it out', 'no change with it out'],
} as const;

/** What a check at the bench found. */
export function readFinding(where: Where, evidence: Of<'finding'>): Read {
  const [bad, good] = findingWords[evidence.check];
  const about = askedAbout(evidence.about)
    .map((id) => id.replace(/^(position|chip|shared|unlisted):/, ''))
    .join(', ');
  const text = `${about}: ${evidence.found === 'bad' ? bad : good}`;
  return { piece: { ...emptyPiece(where), finding: evidence }, shown: shownOf(where, text) };
}
