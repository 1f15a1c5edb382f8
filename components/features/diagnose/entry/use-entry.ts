import { useMemo, useState } from 'react';
import type { Lane } from '@/lib';
import { limits, type Evidence } from '@/shared';
import type { Bench, BenchFormat } from '../bench';
import type { Workspace } from '../use-workspace';
import { dropEvidence, putEvidence, runInHand, setComplete } from '../workspace-runs';
import { noBits, readBits, writeBits, type LanesEvidence } from './failing-bits';
import { lookAt, type TypedCode } from './typed-code';

/** The two tabs that every board has beside its report formats. */
export const bitsTab = '~bits';
export const passTab = '~pass';

/** What is being typed, and what it comes to. */
export interface Entry {
  readonly tab: string;
  readonly chooseTab: (tab: string) => void;
  /** The format of the tab; null in the two tabs that have none. */
  readonly format: BenchFormat | null;
  readonly code: TypedCode | null;
  readonly setCode: (text: string) => void;
  readonly bits: LanesEvidence;
  readonly setBits: (bits: LanesEvidence) => void;
  /** Lanes that what is typed so far can still mean; null while it says nothing. */
  readonly possible: readonly Lane[] | null;
  /** The evidence, once it is whole. */
  readonly ready: Evidence | null;
  /** An older piece of evidence is being changed. */
  readonly editing: boolean;
  /** The machine lists its failures one by one, so that a run usually holds several. */
  readonly lists: boolean;
  readonly complete: boolean;
  readonly setWhole: (complete: boolean) => void;
  /** Why the last attempt to add was refused. */
  readonly refused: string | null;
  /** Takes the evidence over. more: and stays for the next line of the list. */
  readonly submit: (then: 'answer' | 'more') => void;
  readonly pass: (banks?: string[]) => void;
  readonly remove: () => void;
}

interface Held {
  readonly revision: string;
  readonly tab: string;
  readonly text: string;
  readonly refused: string | null;
}

/** Holds what is being typed, beside the link that remembers it. */
export function useEntry(bench: Bench, workspace: Workspace): Entry {
  const { runs, step, revision } = workspace;
  const [kept, setHeld] = useState<Held>(() => begin(bench, workspace));
  // Another step or another look-up begins with what its own link holds.
  const held = kept.revision === revision ? kept : begin(bench, workspace);
  const place = step.at === 'entry' ? step.place : null;
  const { tab, text } = held;

  const hold = (next: Partial<Held>) => {
    const all = { ...held, refused: null, ...next };
    setHeld(all);
    workspace.keepDraft({ tab: all.tab, text: all.text });
  };
  const format = bench.formats.find(({ definition }) => definition.id === tab) ?? null;
  const code = useMemo(() => (format === null ? null : lookAt(format.compiled, text)), [format, text]);
  const bits = useMemo(() => (tab === bitsTab ? readBits(text) : noBits), [tab, text]);
  const ready = readyEvidence({ tab, text, code, bits });
  const at = place?.run ?? runInHand(runs);
  const run = runs[at];

  const add = (seen: Evidence, then: 'answer' | 'more') => {
    if (place === null && (run?.evidence.length ?? 0) >= limits.evidencePerRun) {
      return hold({ refused: `A run holds at most ${limits.evidencePerRun} reports. Nothing was lost.` });
    }
    const taken = workspace.commit(putEvidence(runs, seen, place), then === 'more' ? addStep : { at: 'answer' });
    if (!taken) hold({ refused: 'This look-up is as long as a link can carry. Take older reports out first.' });
  };
  return {
    tab,
    chooseTab: (next) => hold({ tab: next, text: next === tab ? text : '' }),
    format,
    code,
    setCode: (next) => hold({ text: next }),
    bits,
    setBits: (next) => hold({ text: writeBits(next) }),
    possible: possibleLanes(bench, { code, bits, text }),
    ready,
    editing: place !== null,
    lists: format !== null && format.definition.after !== 'stops',
    complete: run?.complete ?? true,
    setWhole: (complete) => void workspace.commit(setComplete(runs, { run: at, complete }), step),
    refused: held.refused,
    submit: (then) => {
      if (ready !== null) add(ready, then);
    },
    pass: (banks) => add({ kind: 'pass', banks }, 'answer'),
    remove: () => {
      if (place !== null) workspace.commit(dropEvidence(runs, place));
    },
  };
}

const addStep = { at: 'entry', place: null } as const;

function begin(bench: Bench, { runs, step, draft, revision }: Workspace): Held {
  const place = step.at === 'entry' ? step.place : null;
  const seen = place === null ? undefined : runs[place.run]?.evidence[place.index];
  const own = seen === undefined ? null : draftOf(seen);
  const known = draft.tab !== null && isTab(bench, draft.tab) ? draft.tab : null;
  if (draft.text !== '' && known !== null) return { revision, tab: known, text: draft.text, refused: null };
  if (own !== null && isTab(bench, own.tab)) return { revision, ...own, refused: null };
  return { revision, tab: known ?? usualTab(bench, runs), text: '', refused: null };
}

function draftOf(seen: Evidence): { tab: string; text: string } | null {
  switch (seen.kind) {
    case 'code':
      return { tab: seen.format, text: seen.text };
    case 'lanes':
      return { tab: bitsTab, text: writeBits(seen) };
    case 'mask':
      return { tab: bitsTab, text: writeBits({ ...noBits, failing: bitsOfMask(seen), passed: 'none' }) };
    case 'pass':
      return { tab: passTab, text: '' };
  }
}

function bitsOfMask({ bank, mask }: Extract<Evidence, { kind: 'mask' }>) {
  return Array.from({ length: 40 }, (_, bit) => ({ bank, bit })).filter(({ bit }) => Math.floor(mask / 2 ** bit) % 2);
}

const isTab = (bench: Bench, tab: string) =>
  tab === bitsTab || tab === passTab || bench.formats.some(({ definition }) => definition.id === tab);

/** The format that was used last, else the first one that the board has. */
function usualTab(bench: Bench, runs: Workspace['runs']): string {
  const used = runs.flatMap(({ evidence }) => evidence.flatMap((seen) => (seen.kind === 'code' ? [seen.format] : [])));
  const last = used.reverse().find((id) => isTab(bench, id));
  return last ?? bench.formats[0]?.definition.id ?? bitsTab;
}

type Typed = { tab: string; text: string; code: TypedCode | null; bits: LanesEvidence };

function readyEvidence({ tab, text, code, bits }: Typed): Evidence | null {
  if (code !== null) {
    return code.prefix.complete && text !== '' ? { kind: 'code', format: tab, text: (text + code.ghost).trim() } : null;
  }
  return bits.failing.length > 0 ? bits : null;
}

function possibleLanes({ index }: Bench, { code, bits, text }: Omit<Typed, 'tab'>): readonly Lane[] | null {
  if (code !== null) return text === '' ? null : code.prefix.possible;
  if (bits.failing.length === 0) return null;
  return bits.failing.flatMap(({ bank, bit }) => {
    const at = index.bankByName.get(bank);
    return at === undefined ? [] : [index.laneOf(at, bit as never)];
  });
}
