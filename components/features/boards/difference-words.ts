import type { FormatDifference, LayoutDifference } from '@/lib/layout/difference';
import { listWords } from '@/lib/layout/words';

const sectionWords: Record<string, string> = {
  board: 'the marks and notes of the board',
  memory: 'banks or bits',
  addressMap: 'addresses',
  multiplexing: 'row and column inputs',
  families: 'its own chip families',
  rails: 'rails at the pins',
  screenMap: 'the screen map',
  sources: 'sources',
  examples: 'worked examples',
};

const many = (count: number, one: string) => (count === 1 ? `1 ${one}` : `${count} ${one}s`);

/** "9 of 32 codes of “Lamp code” name another socket." Null where nothing is to be said. */
function formatSentence({ name, state, codes, changed, reworded }: FormatDifference): string | null {
  if (state === 'new') return `It has “${name}”, which this one does not.`;
  if (state === 'gone') return `It lacks “${name}”.`;
  if (changed.length > 0) {
    return `${changed.length} of ${codes} codes of “${name}” ${changed.length === 1 ? 'names' : 'name'} another socket.`;
  }
  return reworded ? `“${name}” is described otherwise; its codes name the same sockets.` : null;
}

/** What differs from this revision to another, in sentences, the codes first. */
export function differenceSentences({ formats, lanes, sockets, sharedParts }: LayoutDifference): string[] {
  const same = formats.every(({ changed }) => changed.length === 0) && lanes.length === 0;
  const ofFormats = formats.map(formatSentence).filter((sentence) => sentence !== null);
  const things = [
    ...(sockets.length > 0 ? [many(sockets.length, 'socket')] : []),
    ...(sharedParts.length > 0 ? [many(sharedParts.length, 'shared part')] : []),
  ];
  const differ = sockets.length + sharedParts.length === 1 ? 'differs' : 'differ';
  return [
    ...(same ? ['Every code names the same socket.'] : []),
    ...ofFormats,
    ...(things.length === 0 ? [] : [`${listWords(things)} ${differ}.`]),
  ];
}

/** Names of the other sections that differ, for a list. */
export function sectionsWords({ sections }: LayoutDifference): string {
  return listWords(
    sections.map((name) => sectionWords[name] ?? name),
    12,
  );
}

/** "U14", "U14 or U15" or "no socket": what a code names. */
export function namesWords(labels: readonly string[]): string {
  if (labels.length === 0) return 'no socket';
  return listWords(labels, 8);
}
