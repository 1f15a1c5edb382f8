import { lanesWords, pictureWords, type BitIndex, type LayoutIndex } from '@/lib';
import { addressWords, listWords, sentenceCase } from '@/lib/layout/words';
import type { Change, Evidence, LaneName, LogEvidence, Picture, PlainEvidence, Reading, Readings, Run } from '@/shared';
import type { Bench } from './bench';
import { findingWords } from './finding-words';
import { counted } from './logs/log-words';
import { signWords } from './sign-words';
import { voltWords } from './volt-words';

/** A piece of evidence as it is shown in a list: what stands large, and what explains it. */
export interface EvidenceWords {
  readonly text: string;
  readonly note: string;
  /** The text is a code as the machine showed it, not words. */
  readonly code: boolean;
}

/** Evidence in words. `runs`: those up to the one that it stands in, by which a chip that was moved is named. */
export function evidenceWords(seen: Evidence, bench: Bench, runs: readonly Run[] = []): EvidenceWords {
  if (seen.kind !== 'either') return plainWords(seen, bench, runs);
  const [first] = seen.ways;
  if (first === undefined) return { text: 'Nothing', note: '', code: false };
  const words = plainWords(first.evidence, bench, runs);
  return { ...words, note: `${words.note}; either ${seen.ways.map(({ takes }) => takes).join(', or ')}` };
}

function plainWords(seen: PlainEvidence, bench: Bench, runs: readonly Run[]): EvidenceWords {
  const { index, formatName } = bench;
  switch (seen.kind) {
    case 'code': {
      const name = formatName(seen.format) ?? 'a format that this board does not have';
      const note = /^.[a-z ]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name;
      return { text: seen.text, note: `${note}${doubtWords(seen.doubts)}`, code: true };
    }
    case 'lanes':
      return { text: lanesOrNone(index, seen.failing), note: passedWords(seen.passed), code: false };
    case 'mask':
      return {
        text: `${seen.bank} ${seen.mask.toString(16).toUpperCase()}`,
        note: 'mask of failing bits, hexadecimal',
        code: true,
      };
    case 'pass':
      return {
        text: seen.banks === undefined ? 'All passed' : `${bankList(seen.banks)} passed`,
        note: 'no failure reported',
        code: false,
      };
    case 'readings':
      return readingsWords(index, seen);
    case 'log':
      return { text: seen.name, note: logNote(seen), code: false };
    case 'picture':
      return { ...pictureEvidence(index, seen), code: false };
    case 'sign':
      return {
        text: `${signWords[seen.sign].label}${seen.socket === undefined ? '' : `: ${seen.socket}`}`,
        note: 'a sign',
        code: false,
      };
    case 'measurement':
      return { text: `${voltWords(seen.volts)} at pin ${seen.pin} of ${seen.socket}`, note: 'measured', code: false };
    case 'finding':
      return { text: findingWords(seen, bench, runs), note: 'found at the bench', code: false };
    case 'alias': {
      const [one, other] = seen.addresses.map((each) => addressWords(index.document.addressMap, each));
      return {
        text: `${one} = ${other}`,
        note: `two addresses of one cell, ${seen.bits === undefined ? 'in all bits' : `in bit ${listWords(seen.bits.map(String))}`}`,
        code: true,
      };
    }
  }
}

function pictureEvidence(
  { document: { screenMap } }: LayoutIndex,
  seen: Picture,
): Pick<EvidenceWords, 'text' | 'note'> {
  if (screenMap === undefined) return { text: 'Marks on a picture', note: 'this board has no screen map' };
  const { text, note } = pictureWords(screenMap, seen);
  return { text: sentenceCase(text), note };
}

function doubtWords(doubts: Extract<Evidence, { kind: 'code' }>['doubts'] = []): string {
  const open = doubts.map((doubt) => (doubt === 'first' ? 'whether it counts from 0 or 1' : 'which end is bit 0'));
  return open.length === 0 ? '' : `; not known: ${[...new Set(open)].join(', ')}`;
}

const radixes = { hexadecimal: 16, octal: 8, decimal: 10 } as const;

/** "4C1A FF F7": a reading in the notation of the board, in the order address, written, read. */
export function readingText({ document: { addressMap } }: LayoutIndex, line: Reading): string {
  const value = (each: number) => each.toString(radixes[addressMap.notation]).toUpperCase();
  const at = addressWords(addressMap, line.address);
  const until = line.to === undefined ? '' : ` to ${addressWords(addressMap, line.to)}`;
  const step = line.step === undefined ? '' : ` step ${value(line.step)}`;
  const page = line.register === undefined ? '' : `${line.register.name} ${value(line.register.value)} `;
  const run = `${page}${at}${until}${step}`;
  if (line.read === undefined) return `${run} mask ${value(line.mask ?? 0)}`;
  return `${run} ${value(line.written ?? 0)} ${value(line.read)}`;
}

function readingsWords(index: LayoutIndex, { lines, rest, waited }: Readings): EvidenceWords {
  const [first] = lines;
  const also = [
    rest === 'passed' ? 'all else passed' : '',
    waited === undefined ? '' : `read after ${waited} s`,
  ].filter((words) => words !== '');
  const what = first?.read === undefined ? 'address, failing bits' : 'address, written, read';
  const note = lines.length === 1 ? what : `${what}, and ${lines.length - 1} more`;
  return {
    text: first === undefined ? 'No reading' : readingText(index, first),
    note: [note, ...also].join('; '),
    code: true,
  };
}

function logNote({ lines, readings, unread, outside, rest }: LogEvidence): string {
  return [
    `log, ${counted(readings)} readings in ${counted(lines)} lines`,
    ...(unread > 0 ? [`${counted(unread)} lines not read`] : []),
    ...(outside > 0 ? [`${counted(outside)} outside the memory`] : []),
    ...(rest === 'passed' ? ['all else passed'] : []),
  ].join('; ');
}

/** "Bits 4 to 7 of every bank": failing lanes. A lane that the board does not have is left to the answer to refuse. */
function lanesOrNone(index: LayoutIndex, lanes: readonly LaneName[]): string {
  const known = lanes.flatMap(({ bank, bit }) => {
    const at = index.bankByName.get(bank);
    return at === undefined || bit >= index.bitCount ? [] : [index.laneOf(at, bit as BitIndex)];
  });
  const words = sentenceCase(lanesWords(index, known));
  const unknown = lanes.length - known.length;
  if (unknown === 0) return words === '' ? 'No bit' : words;
  return `${words === '' ? '' : `${words}, and `}${unknown} that this board does not have`;
}

function passedWords(passed: 'rest' | 'none' | readonly LaneName[]): string {
  if (passed === 'rest') return 'failing bits; the rest passed';
  if (passed === 'none') return 'failing bits; the rest was not tested';
  return `failing bits; ${passed.length} ${passed.length === 1 ? 'lane' : 'lanes'} passed`;
}

const bankList = (banks: readonly string[]) => `${banks.length === 1 ? 'Bank' : 'Banks'} ${banks.join(', ')}`;

/** "U31 and U23 swapped": something that was done. */
export function changeWords(done: Change): string {
  switch (done.kind) {
    case 'swap':
      return `${done.sockets[0]} and ${done.sockets[1]} swapped`;
    case 'replace': {
      const fitted = done.with === 'known-good' ? 'known good chip' : 'another, untested chip';
      return `${fitted}${done.family === undefined ? '' : ` of family ${done.family}`} fitted in ${done.socket}`;
    }
    case 'reseat':
      return `${done.socket} reseated`;
  }
}

/** The head of a run in a list: "1, as it came in", "2, U31 and U23 swapped". */
export function runTitle({ changes }: Pick<Run, 'changes'>, at: number): string {
  if (changes.length > 0) return `${at + 1}, ${changes.map(changeWords).join(', ')}`;
  return at === 0 ? '1, as it came in' : `${at + 1}, run again`;
}
