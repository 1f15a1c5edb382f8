import { followChips } from '@/lib/diagnose/timeline';
import { bankWords, listWords, sentenceCase } from '@/lib/layout/words';
import type { Finding, Run } from '@/shared';
import type { Bench } from './bench';

/**
 * "Measured to the legs of U25: a leg is open": what a check at the bench found. A chip is named by the socket where it
 * lies in the last of `runs`; without runs by the socket where it was first seen.
 */
export function findingWords({ check, about, found }: Finding, bench: Bench, runs: readonly Run[] = []): string {
  const bad = found === 'bad';
  const part = partWords(about, bench, runs);
  switch (check) {
    case 'legs':
      return `Measured to the legs of ${part}: ${bad ? 'a leg is open' : 'all legs are joined'}`;
    case 'joined':
      return `${sentenceCase(part)} measured: ${bad ? 'joined' : 'apart'}`;
    case 'output': {
      // Only a part that the board lists has outputs; a line or a strobe is looked at itself.
      const what = about.startsWith('shared:') ? `outputs of ${part}` : part;
      return `${sentenceCase(what)} on the scope: ${bad ? 'missing or wrong' : 'right'}`;
    }
    case 'pin':
      return `Data pin of ${part} on the scope: ${bad ? 'no clean level' : 'like a good one'}`;
    case 'stack':
      return `Good chip on top of ${part}: ${bad ? 'better' : 'no change'}`;
    case 'pull':
      return pullWords({ part, bad, several: idsOf(about).length > 1 });
  }
}

function pullWords({ part, bad, several }: { part: string; bad: boolean; several: boolean }): string {
  return `${sentenceCase(part)} taken out${several ? ' in turn' : ''}: ${bad ? 'the others came back' : 'no change'}`;
}

/** Labels may hold spaces, so that only a space before another id parts them. */
const idsOf = (about: string): string[] => about.split(/ (?=(?:chip|position|shared|short|unlisted):)/);

function partWords(about: string, bench: Bench, runs: readonly Run[]): string {
  return listWords(idsOf(about).map((id) => idWords(id, bench, runs)));
}

/** A part in words, by its id in an answer. An id that no answer gives is shown as it is. */
function idWords(id: string, bench: Bench, runs: readonly Run[]): string {
  const [, kind, name = ''] = /^(chip|position|shared|short|unlisted):(.+)$/s.exec(id) ?? [];
  switch (kind) {
    case 'chip':
      return chipWords(name, bench, runs);
    case 'position':
    case 'shared':
      return name;
    case 'short':
      return lineNames(name, bench) ?? id;
    case 'unlisted':
      return unlistedWords(name, bench) ?? id;
    default:
      return id;
  }
}

/** "U25", "U24 (chip from U25)" where it was moved, "U25 (chip 2)" where it is no longer on the board. */
function chipWords(name: string, { index }: Bench, runs: readonly Run[]): string {
  const [, socket = name, nth] = /^(.+)#(\d+)$/s.exec(name) ?? [];
  const { chips, runCount } = followChips(
    index,
    runs.map(({ changes }) => changes),
  );
  const at = chips.find((chip) => chip.id === `chip:${name}`)?.socketInRun[runCount - 1];
  const now = at === undefined || at === null ? undefined : index.document.sockets[at]?.label;
  if (now !== undefined) return now === socket ? now : `${now} (chip from ${socket})`;
  return nth === undefined && runs.length === 0 ? socket : `${socket} (chip ${nth ?? 1})`;
}

/** "D2 and D3"; null where the text names no lines of the board. */
function lineNames(text: string, { index }: Bench): string | null {
  if (!/^\d+(-\d+)*$/.test(text)) return null;
  const lines = text.split('-').map(Number);
  if (lines.some((line) => line >= index.lineCount)) return null;
  return listWords(lines.map((line) => index.lineName(line)));
}

/** What many chips share and the board does not list; null where the text is none of it. */
function unlistedWords(text: string, bench: Bench): string | null {
  if (text === 'all') return 'what all banks share';
  const [, kind, name = ''] = /^(bank|line|address):(.+)$/s.exec(text) ?? [];
  switch (kind) {
    case 'bank':
      return `what selects ${bankWords(name)}`;
    case 'line': {
      const line = lineNames(name, bench);
      return line === null ? null : `data line ${line}`;
    }
    case 'address':
      return `address line ${name} of the chips`;
    default:
      return null;
  }
}
