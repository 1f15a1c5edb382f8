import { useMemo, useState } from 'react';
import { addressMapOf, tallyReadings, type CompiledFormat, type Lane } from '@/lib';
import { limits, type Evidence } from '@/shared';
import type { Bench, BenchFormat } from '../bench';
import { lanesOf } from '../marks';
import type { Workspace } from '../use-workspace';
import { dropEvidence, putEvidence, runInHand, setComplete } from '../workspace-runs';
import { doubtedFormat, readTab, writeTab, type Doubt } from './doubts';
import { draftOf, type TypedDraft } from './draft-of';
import { aliasTab, bitsTab, isTab, otherTab, readingsTab, signTab, supplyTab } from './entry-tabs';
import { noBits, readBits, writeBits, type LanesEvidence } from './failing-bits';
import { readReadingsDraft, readTyped, type TypedReadings } from './readings-draft';
import { aliasOf, measurementOf, readAlias, readSign, readSupply, signOf, writeSupply } from './small-drafts';
import { lookAt, type TypedCode } from './typed-code';

/** What is being typed, and what it comes to. */
export interface Entry {
  readonly tab: string;
  readonly chooseTab: (tab: string) => void;
  /** The format of the tab; null in the tabs that have none. */
  readonly format: BenchFormat | null;
  /** The format as it is read now: with what is doubted left open. */
  readonly compiled: CompiledFormat | null;
  readonly code: TypedCode | null;
  readonly setCode: (text: string) => void;
  /** What of the format is not taken for granted. */
  readonly doubts: readonly Doubt[];
  readonly setDoubts: (doubts: readonly Doubt[]) => void;
  readonly bits: LanesEvidence;
  readonly setBits: (bits: LanesEvidence) => void;
  /** What is typed in a tab without a format, and what typed readings come to. */
  readonly text: string;
  readonly setText: (text: string) => void;
  readonly readings: TypedReadings | null;
  /** Lanes that what is typed so far can still mean; null while it says nothing. */
  readonly possible: readonly Lane[] | null;
  /** The evidence, once it is whole. */
  readonly ready: Evidence | null;
  /** The older piece of evidence that is being changed; null where a new one is entered. */
  readonly before: Evidence | null;
  readonly editing: boolean;
  /** Things of this kind usually come several in a row, so that the next may follow. */
  readonly lists: boolean;
  readonly complete: boolean;
  readonly setWhole: (complete: boolean) => void;
  /** Why the last attempt to add was refused. */
  readonly refused: string | null;
  /** Takes the evidence over. more: and stays for the next line of the list. */
  readonly submit: (then: 'answer' | 'more') => void;
  /** Takes evidence over that was made elsewhere than here. */
  readonly add: (seen: Evidence) => void;
  readonly remove: () => void;
}

interface Held extends TypedDraft {
  readonly revision: string;
  readonly refused: string | null;
}

/** Holds what is being typed, beside the link that remembers it. */
export function useEntry(bench: Bench, workspace: Workspace): Entry {
  const { runs, step, revision } = workspace;
  const [kept, setHeld] = useState<Held>(() => begin(bench, workspace));
  // Another step or another look-up begins with what its own link holds.
  const held = kept.revision === revision ? kept : begin(bench, workspace);
  const place = step.at === 'entry' ? step.place : null;
  const before = place === null ? null : (runs[place.run]?.evidence[place.index] ?? null);
  const { tab, text, doubts } = held;

  const hold = (next: Partial<Held>) => {
    const all = { ...held, refused: null, ...next };
    setHeld(all);
    workspace.keepDraft({ tab: writeTab(all.tab, all.doubts), text: all.text });
  };
  const format = bench.formats.find(({ definition }) => definition.id === tab) ?? null;
  const compiled = useMemo(() => compiledOf(bench, format, doubts), [bench, format, doubts]);
  const code = useMemo(() => (compiled === null ? null : lookAt(compiled, text)), [compiled, text]);
  const bits = useMemo(() => (tab === bitsTab ? readBits(text) : noBits), [tab, text]);
  const readings = useMemo(
    () => (tab === readingsTab ? readTyped(bench.index, readReadingsDraft(text), readingsOf(before)) : null),
    [bench, tab, text, before],
  );
  const typed: Typed = { tab, text, doubts, code, bits, readings };
  const ready = readyEvidence(bench, typed);
  const at = place?.run ?? runInHand(runs);
  const run = runs[at];

  const add = (seen: Evidence, then: 'answer' | 'more') => {
    if (place === null && (run?.evidence.length ?? 0) >= limits.evidencePerRun) {
      return hold({ refused: `A run holds at most ${limits.evidencePerRun} reports. Nothing was lost.` });
    }
    const next = putEvidence(runs, seen, place);
    const taken = then === 'more' ? workspace.commit(next, addStep, nextDraft(typed)) : workspace.commit(next);
    if (!taken) hold({ refused: 'This look-up is as long as a link can carry. Take older reports out first.' });
  };
  return {
    tab,
    chooseTab: (next) => hold({ tab: next, text: next === tab ? text : '', doubts: next === tab ? doubts : [] }),
    format,
    compiled,
    code,
    setCode: (next) => hold({ text: next }),
    doubts,
    setDoubts: (next) => hold({ doubts: next }),
    bits,
    setBits: (next) => hold({ text: writeBits(next) }),
    text,
    setText: (next) => hold({ text: next }),
    readings,
    possible: useMemo(
      () => possibleLanes(bench, { tab, text, code, bits, readings }),
      [bench, tab, text, code, bits, readings],
    ),
    ready,
    before,
    editing: place !== null,
    lists: tab === supplyTab || (format !== null && format.definition.after !== 'stops'),
    complete: run?.complete ?? true,
    setWhole: (complete) => void workspace.commit(setComplete(runs, { run: at, complete }), step),
    refused: held.refused,
    submit: (then) => {
      if (ready !== null) add(ready, then);
    },
    add: (seen) => add(seen, 'answer'),
    remove: () => {
      if (place !== null) workspace.commit(dropEvidence(runs, place));
    },
  };
}

const readingsOf = (seen: Evidence | null) => (seen?.kind === 'readings' ? seen : null);

const addStep = { at: 'entry', place: null } as const;

/** What the next entry begins with: of a measurement the socket, since a chip has several rails. */
function nextDraft({ tab, text, doubts }: Typed): { tab: string; text: string } {
  const socket = tab === supplyTab ? writeSupply({ ...readSupply(text), pin: '', volts: '' }) : '';
  return { tab: writeTab(tab, doubts), text: socket };
}

function compiledOf({ index }: Bench, format: BenchFormat | null, doubts: readonly Doubt[]): CompiledFormat | null {
  if (format === null) return null;
  if (doubts.length === 0) return format.compiled;
  return doubtedFormat(format.definition, index, doubts) ?? format.compiled;
}

function begin(bench: Bench, { runs, step, draft, revision }: Workspace): Held {
  const place = step.at === 'entry' ? step.place : null;
  const seen = place === null ? undefined : runs[place.run]?.evidence[place.index];
  const own = seen === undefined ? null : draftOf(seen, bench);
  const said = readTab(draft.tab ?? '');
  const known = isTab(bench, said.tab) ? said : null;
  if (draft.text !== '' && known !== null) return { revision, ...known, text: draft.text, refused: null };
  if (own !== null && isTab(bench, own.tab)) return { revision, ...own, refused: null };
  return { revision, ...(known ?? usual(bench, runs)), text: '', refused: null };
}

/** The format that was used last, with what was doubted of it; else the first one that the board has. */
function usual(bench: Bench, runs: Workspace['runs']): Pick<TypedDraft, 'tab' | 'doubts'> {
  const used = runs.flatMap(({ evidence }) => evidence.flatMap((seen) => (seen.kind === 'code' ? [seen] : [])));
  const last = used.reverse().find(({ format }) => isTab(bench, format));
  if (last !== undefined) return { tab: last.format, doubts: last.doubts ?? [] };
  return { tab: bench.formats[0]?.definition.id ?? otherTab, doubts: [] };
}

interface Typed extends TypedDraft {
  readonly code: TypedCode | null;
  readonly bits: LanesEvidence;
  readonly readings: TypedReadings | null;
}

function readyEvidence(bench: Bench, { tab, text, doubts, code, bits, readings }: Typed): Evidence | null {
  if (code !== null) {
    if (!code.prefix.complete || text === '') return null;
    const whole = { kind: 'code' as const, format: tab, text: (text + code.ghost).trim() };
    return doubts.length === 0 ? whole : { ...whole, doubts: [...doubts] };
  }
  switch (tab) {
    case readingsTab:
      return readings?.evidence ?? null;
    case signTab:
      return signOf(bench, readSign(text));
    case supplyTab:
      return measurementOf(bench, readSupply(text));
    case aliasTab:
      return aliasOf(bench, readAlias(text));
    default:
      return bits.failing.length > 0 ? bits : null;
  }
}

function possibleLanes(
  bench: Bench,
  { tab, text, code, bits, readings }: Omit<Typed, 'doubts'>,
): readonly Lane[] | null {
  const { index } = bench;
  if (code !== null) return text === '' ? null : code.prefix.possible;
  if (readings !== null) return readingLanes(bench, readings);
  if (tab === signTab || tab === supplyTab) {
    const { socket } = tab === signTab ? readSign(text) : readSupply(text);
    const at = index.socketByLabel.get(socket.trim());
    return at === undefined ? null : lanesOf(index, at);
  }
  if (bits.failing.length === 0) return null;
  return bits.failing.flatMap(({ bank, bit }) => {
    const at = index.bankByName.get(bank);
    return at === undefined ? [] : [index.laneOf(at, bit as never)];
  });
}

/** The lanes that failed in typed readings, in any of the ways to read them. */
function readingLanes({ index }: Bench, { ways }: TypedReadings): readonly Lane[] | null {
  const map = addressMapOf(index);
  const lanes = ways.flatMap(({ evidence }) =>
    evidence.kind === 'readings'
      ? tallyReadings(map, evidence).ways.flatMap(({ tally }) =>
          [...tally.lanes].flatMap(([lane, { readsOne, readsZero, words }]) =>
            readsOne + readsZero + words > 0 ? [lane] : [],
          ),
        )
      : [],
  );
  return lanes.length === 0 ? null : [...new Set(lanes)];
}
