import type { Change, Evidence, LaneName, Run } from '@/shared';

/** A piece of evidence as it is shown in a list: what stands large, and what explains it. */
export interface EvidenceWords {
  readonly text: string;
  readonly note: string;
}

/** Evidence in words. `formatName` gives the name of a report format by its id, null where the board has none such. */
export function evidenceWords(seen: Evidence, formatName: (id: string) => string | null): EvidenceWords {
  switch (seen.kind) {
    case 'code':
      return {
        text: seen.text,
        note: (formatName(seen.format) ?? 'a format that this board does not have').toLowerCase(),
      };
    case 'lanes':
      return { text: lanesWords(seen.failing), note: passedWords(seen.passed) };
    case 'mask':
      return {
        text: `${seen.bank} ${seen.mask.toString(16).toUpperCase()}`,
        note: 'mask of failing bits, hexadecimal',
      };
    case 'pass':
      return {
        text: seen.banks === undefined ? 'All passed' : `${bankList(seen.banks)} passed`,
        note: 'no failure reported',
      };
  }
}

/** "A 3, 5 and C 1": failing lanes, bank by bank. */
function lanesWords(lanes: readonly LaneName[]): string {
  const byBank = new Map<string, number[]>();
  for (const { bank, bit } of lanes) byBank.set(bank, [...(byBank.get(bank) ?? []), bit]);
  return [...byBank].map(([bank, bits]) => `${bank}: ${bits.sort((a, b) => a - b).join(', ')}`).join('; ') || 'none';
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
