import { z } from 'zod';
import { change, evidence, limits, runs as runsSchema, type Change, type Evidence, type Run } from '@/shared';
import { escapeField, readField } from './link-text';

/*
 * One link holds the whole workspace: `1~c.lamp.C5~n~s.U31.U23~c.lamp.B5`.
 * The version, then statements between `~`, each a letter and fields between dots:
 *   n            a new run; `n.more`: its list was not the whole list. The first run needs none.
 *   s.U31.U23    swapped;  x.U31.good or x.U31.any: replaced;  t.U31: reseated
 *   c.lamp.C5    a code in a format
 *   l.rest.C-3-5 failing lanes, bank and bits; `rest`, `none` or `some` says what passed, `some` lists it after `ok`
 *   m.C.28       failing bits of a bank as a mask in hexadecimal
 *   p            all passed;  p.A.B: these banks passed
 */

const version = '1';

/** Longest link in characters: what every server and chat passes on whole. */
export const longestLink = 7000;

/** What a link says, and what of it could not be read, in words. */
export interface ReadLink {
  readonly runs: Run[];
  readonly problems: readonly string[];
}

type Lanes = Extract<Evidence, { kind: 'lanes' }>;
type LaneList = Lanes['failing'];

/** The runs as the text of a link; empty for no runs. */
export function writeLink(runs: readonly Run[]): string {
  if (runs.length === 0) return '';
  const statements = runs.flatMap(({ changes, evidence: seen, complete }, at) => {
    const items = [...changes.map(writeChange), ...seen.map(writeEvidence)];
    const implied = at === 0 && complete && items.length > 0;
    return implied ? items : [complete ? 'n' : 'n.more', ...items];
  });
  return [version, ...statements].join('~');
}

/** Reads the text of a link. Never throws: what cannot be read is named in `problems`, the rest is kept. */
export function readLink(text: string): ReadLink {
  const problems: string[] = [];
  const [first = '', ...others] = text.trim().split('~');
  if (first === '' && others.length === 0) return { runs: [], problems };
  const versioned = /^\d+$/.test(first);
  if (versioned && first !== version) {
    problems.push('This link was made by another version of Rowcall.');
  }
  const read: { changes: unknown[]; evidence: unknown[]; complete: boolean }[] = [];
  for (const statement of versioned ? others : [first, ...others]) {
    if (statement === '') continue;
    const [letter = '', ...fields] = statement.split('.');
    if (letter === 'n') {
      read.push({ changes: [], evidence: [], complete: fields[0] !== 'more' });
      continue;
    }
    const item = readStatement(letter, fields);
    if (item === null) {
      problems.push(`Left out: “${shorten(statement)}”.`);
      continue;
    }
    if (read.length === 0) read.push({ changes: [], evidence: [], complete: true });
    const at = read[read.length - 1] as (typeof read)[number];
    if (item.is === 'change') at.changes.push(item.value);
    else at.evidence.push(item.value);
  }
  return { runs: keepWithinLimits(read, problems), problems };
}

/** The link as zod reads it, for a route's parameters: any text in, runs and problems out. */
export const workspaceLink = z.string().catch('').transform(readLink);

function keepWithinLimits(read: { changes: unknown[]; evidence: unknown[] }[], problems: string[]): Run[] {
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

type Item = { is: 'change'; value: Change } | { is: 'evidence'; value: Evidence };

function readStatement(letter: string, fields: readonly string[]): Item | null {
  const raw = rawStatement(letter, fields);
  if (raw === null) return null;
  const asChange = change.safeParse(raw);
  if (asChange.success) return { is: 'change', value: asChange.data };
  const asEvidence = evidence.safeParse(raw);
  return asEvidence.success ? { is: 'evidence', value: asEvidence.data } : null;
}

function rawStatement(letter: string, raw: readonly string[]): unknown {
  const fields = raw.map(readField);
  const [first, second] = fields;
  switch (letter) {
    case 's':
      return { kind: 'swap', sockets: fields };
    case 'x':
      return { kind: 'replace', socket: first, with: second === 'any' ? 'untested' : 'known-good' };
    case 't':
      return { kind: 'reseat', socket: first };
    case 'c':
      // A dot that somebody typed by hand belongs to the code.
      return { kind: 'code', format: first, text: fields.slice(1).join('.') };
    case 'm':
      return { kind: 'mask', bank: first, mask: `0x${second ?? ''}` };
    case 'p':
      if (raw.length === 0) return { kind: 'pass' };
      return { kind: 'pass', banks: raw[0] === '-' ? [] : fields };
    case 'l':
      return rawLanes(raw);
    default:
      return null;
  }
}

function rawLanes([passed, ...groups]: readonly string[]): unknown {
  if (passed !== 'some') return { kind: 'lanes', failing: groups.flatMap(readGroup), passed };
  const ok = groups.indexOf('ok');
  const end = ok < 0 ? groups.length : ok;
  return {
    kind: 'lanes',
    failing: groups.slice(0, end).flatMap(readGroup),
    passed: groups.slice(end + 1).flatMap(readGroup),
  };
}

function readGroup(group: string): { bank: string; bit: number }[] {
  const [bank = '', ...bits] = group.split('-');
  return bits.map((bit) => ({ bank: readField(bank), bit: /^\d+$/.test(bit) ? Number(bit) : -1 }));
}

function writeChange(done: Change): string {
  switch (done.kind) {
    case 'swap':
      return statement('s', ...done.sockets);
    case 'replace':
      return statement('x', done.socket, done.with === 'untested' ? 'any' : 'good');
    case 'reseat':
      return statement('t', done.socket);
  }
}

function writeEvidence(seen: Evidence): string {
  switch (seen.kind) {
    case 'code':
      return statement('c', seen.format, seen.text);
    case 'mask':
      return statement('m', seen.bank, seen.mask.toString(16).toUpperCase());
    case 'pass':
      if (seen.banks === undefined) return 'p';
      return seen.banks.length === 0 ? 'p.-' : statement('p', ...seen.banks);
    case 'lanes':
      return typeof seen.passed === 'string'
        ? ['l', seen.passed, ...writeGroups(seen.failing)].join('.')
        : ['l', 'some', ...writeGroups(seen.failing), 'ok', ...writeGroups(seen.passed)].join('.');
  }
}

const statement = (letter: string, ...fields: string[]) => [letter, ...fields.map(escapeField)].join('.');

/** Neighbouring lanes of one bank share a group, which keeps their order. */
function writeGroups(lanes: LaneList): string[] {
  const groups: { bank: string; bits: number[] }[] = [];
  for (const { bank, bit } of lanes) {
    const last = groups.at(-1);
    if (last?.bank === bank) last.bits.push(bit);
    else groups.push({ bank, bits: [bit] });
  }
  return groups.map(({ bank, bits }) => [escapeField(bank), ...bits].join('-'));
}

const shorten = (text: string) => (text.length > 40 ? `${text.slice(0, 40)}…` : text);
