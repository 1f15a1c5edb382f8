import { lanesWords, type BitIndex, type LayoutIndex } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';
import type { Change, Evidence, LaneName, Run } from '@/shared';
import type { Bench } from './bench';

/** A piece of evidence as it is shown in a list: what stands large, and what explains it. */
export interface EvidenceWords {
  readonly text: string;
  readonly note: string;
  /** The text is a code as the machine showed it, not words. */
  readonly code: boolean;
}

/** Evidence in words. */
export function evidenceWords(seen: Evidence, { index, formatName }: Bench): EvidenceWords {
  switch (seen.kind) {
    case 'code': {
      const name = formatName(seen.format) ?? 'a format that this board does not have';
      return {
        text: seen.text,
        note: /^.[a-z ]/.test(name) ? name.charAt(0).toLowerCase() + name.slice(1) : name,
        code: true,
      };
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
  }
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
    case 'replace':
      return done.with === 'known-good'
        ? `known good chip fitted in ${done.socket}`
        : `another, untested chip fitted in ${done.socket}`;
    case 'reseat':
      return `${done.socket} reseated`;
  }
}

/** The head of a run in a list: "1, as it came in", "2, U31 and U23 swapped". */
export function runTitle({ changes }: Pick<Run, 'changes'>, at: number): string {
  if (changes.length > 0) return `${at + 1}, ${changes.map(changeWords).join(', ')}`;
  return at === 0 ? '1, as it came in' : `${at + 1}, run again`;
}
