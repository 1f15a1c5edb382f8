import { change, evidence, limits, runs as runsSchema, type Change, type Evidence, type Run } from '@/shared';
import { rawChange, writeChange } from './change-statements';
import { rawEither, rawEvidence, writeEvidence } from './evidence-statements';
import { readField } from './link-text';
import { statement } from './statement';

/*
 * One link holds the whole workspace: `1~c.lamp.C5~n~s.U31.U23~c.lamp.B5`.
 * The version, then statements between `~`, each a letter and fields between dots:
 *   n            a new run; `n.more`: its list was not the whole list. The first run needs none.
 *   s, x, t      what was done: see change-statements.ts
 *   c, q, l, m, p            what the machine reported: see report-statements.ts
 *   r, f, a                  readings, a log, two addresses of one cell: see reading-statements.ts
 *   v, g, u, b               the picture, a sign, a measured supply, what a check found: see seen-statements.ts
 *   e.takes.takes            several ways to understand one thing; the ways follow as statements
 *   k.1F03A9.night_2E_log    evidence too large for a link: it stays on the device, under this key
 */

const version = '1';

/** Longest link in characters: what every server and chat passes on whole. */
export const longestLink = 7000;

/** Statements up to this length are never left on the device: it would save nothing. */
const worthKeeping = 80;

/** What a link says, and what of it could not be read, in words. */
export interface ReadLink {
  readonly runs: Run[];
  readonly problems: readonly string[];
}

/** Where evidence is kept that is too large for a link. */
export interface EvidenceStore {
  /** Keeps it and gives its key: letters and digits. */
  readonly keep: (seen: Evidence) => string;
  /** What is kept under a key, of whatever shape; null where this device has nothing. */
  readonly find: (key: string) => unknown;
}

/** The runs as the text of a link; empty for no runs. Evidence for which there is a key is only named. */
export function writeLink(runs: readonly Run[], keys: ReadonlyMap<Evidence, string> = new Map()): string {
  if (runs.length === 0) return '';
  const statements = runs.flatMap(({ changes, evidence: seen, complete }, at) => {
    const items = [
      ...changes.map(writeChange),
      ...seen.map((one) => {
        const key = keys.get(one);
        return key === undefined ? writeEvidence(one) : statement('k', key, keptName(one));
      }),
    ];
    const implied = at === 0 && complete && items.length > 0;
    return implied ? items : [complete ? 'n' : 'n.more', ...items];
  });
  return [version, ...statements].join('~');
}

/**
 * The runs as a link that is not too long: the largest evidence stays on the device, as little of it as will do. It may
 * still be too long where many small things were reported.
 */
export function fitLink(runs: readonly Run[], { keep }: Pick<EvidenceStore, 'keep'>): string {
  const keys = new Map<Evidence, string>();
  const large = runs
    .flatMap(({ evidence: seen }) => seen.map((one) => ({ one, length: writeEvidence(one).length })))
    .filter(({ length }) => length > worthKeeping)
    .sort((a, b) => b.length - a.length);
  let link = writeLink(runs);
  for (const { one } of large) {
    if (link.length <= longestLink) break;
    keys.set(one, keep(one));
    link = writeLink(runs, keys);
  }
  return link;
}

/** What evidence is called that did not travel. */
function keptName(seen: Evidence): string {
  switch (seen.kind) {
    case 'log':
      return `the log “${seen.name}”`;
    case 'readings':
      return `a list of ${seen.lines.length} readings`;
    case 'picture':
      return 'the marks on the picture';
    default:
      return 'a long report';
  }
}

/** Names of the evidence that a link leaves on the device. */
export function leftBehind(link: string): string[] {
  return link.split('~').flatMap((one) => {
    const [letter, , name] = one.split('.');
    return letter === 'k' && name !== undefined ? [readField(name)] : [];
  });
}

type Item = { is: 'run'; complete: boolean } | { is: 'change'; value: Change } | { is: 'evidence'; value: Evidence };

/**
 * Reads the text of a link. Never throws: what cannot be read is named in `problems`, the rest is kept.
 * `find`: where evidence is looked up that stayed on the device.
 */
export function readLink(text: string, find: EvidenceStore['find'] = () => null): ReadLink {
  const problems: string[] = [];
  const [first = '', ...others] = text.trim().split('~');
  if (first === '' && others.length === 0) return { runs: [], problems };
  const versioned = /^\d+$/.test(first);
  if (versioned && first !== version) problems.push('This link was made by another version of Rowcall.');
  const read: { changes: Change[]; evidence: Evidence[]; complete: boolean }[] = [];
  for (const words of statementsOf(versioned ? others : [first, ...others])) {
    const item = readItem(words, find);
    if (typeof item === 'string') {
      problems.push(item);
      continue;
    }
    if (item.is === 'run') {
      read.push({ changes: [], evidence: [], complete: item.complete });
      continue;
    }
    if (read.length === 0) read.push({ changes: [], evidence: [], complete: true });
    const at = read[read.length - 1] as (typeof read)[number];
    if (item.is === 'change') at.changes.push(item.value);
    else at.evidence.push(item.value);
  }
  return { runs: keepWithinLimits(read, problems), problems };
}

/** Each statement with those that belong to it: after `e` stand its ways. */
function statementsOf(all: readonly string[]): string[][] {
  const grouped: string[][] = [];
  for (let at = 0; at < all.length;) {
    const one = all[at] as string;
    const ways = one.startsWith('e.') ? one.split('.').length - 1 : 0;
    if (one !== '') grouped.push(all.slice(at, at + 1 + ways));
    at += 1 + ways;
  }
  return grouped;
}

/** What a statement says; else, in words, that it was left out. */
function readItem([own = '', ...ways]: readonly string[], find: EvidenceStore['find']): Item | string {
  const [letter = '', ...fields] = own.split('.');
  if (letter === 'n') return { is: 'run', complete: fields[0] !== 'more' };
  if (letter === 'k') return readKept(fields, find);
  const done = change.safeParse(rawChange(letter, fields));
  if (done.success) return { is: 'change', value: done.data };
  const seen = evidence.safeParse(letter === 'e' ? rawEither(fields, ways) : rawEvidence(own));
  return seen.success ? { is: 'evidence', value: seen.data } : `Left out: “${shorten(own)}”.`;
}

function readKept([key = '', name = '']: readonly string[], find: EvidenceStore['find']): Item | string {
  const seen = evidence.safeParse(find(key));
  if (seen.success) return { is: 'evidence', value: seen.data };
  const called = readField(name);
  return called === ''
    ? 'Something in this link stayed on the device where it was read.'
    : `This link does not carry ${shorten(called)}: it stayed on the device where it was read. Read it in again here.`;
}

function keepWithinLimits(read: { changes: Change[]; evidence: Evidence[] }[], problems: string[]): Run[] {
  const cut = read.slice(0, limits.runs).map((one) => ({
    ...one,
    changes: one.changes.slice(0, limits.changesPerRun),
    evidence: one.evidence.slice(0, limits.evidencePerRun),
  }));
  if (
    read.length > cut.length ||
    read.some(
      ({ changes, evidence: seen }) => changes.length > limits.changesPerRun || seen.length > limits.evidencePerRun,
    )
  ) {
    problems.push('The link holds more than a look-up can carry; its end was left out.');
  }
  return runsSchema.parse(cut);
}

const shorten = (text: string) => (text.length > 60 ? `${text.slice(0, 60)}…` : text);
