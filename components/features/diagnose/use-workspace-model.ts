import { useCallback, useEffect, useMemo, useState } from 'react';
import type { PickTarget, SketchMarks, SketchView } from '@/components/board/sketch-types';
import { useAnnouncer } from '@/components/ui/announcer';
import { diagnose } from '@/lib';
import type { Change, Diagnosis, NextCheck, Run } from '@/shared';
import { outcomeEvidence } from './answer/outcome-evidence';
import { settle } from './answer/settle';
import type { Bench } from './bench';
import { toggleSocket } from './entry/failing-bits';
import { bitsTab, signTab, supplyTab } from './entry/entry-tabs';
import { readSign, readSupply, writeSign, writeSupply } from './entry/small-drafts';
import { useEntry, type Entry } from './entry/use-entry';
import { answerMarks, chosenMarks, possibleMarks } from './marks';
import { changesOf, chosenSockets, noChange, pickSocket, type ChangeDraft } from './runs/change-draft';
import { readView, writeView } from './sketch-view-link';
import type { Workspace } from './use-workspace';
import {
  awaitsReport,
  beginRun,
  dropEvidence,
  dropRun,
  putEvidence,
  setComplete,
  type EvidencePlace,
} from './workspace-runs';

/** Everything that the columns of the workspace show and do. */
export interface WorkspaceModel {
  readonly bench: Bench;
  readonly workspace: Workspace;
  readonly diagnosis: Diagnosis;
  readonly entry: Entry;
  readonly marks: SketchMarks;
  readonly view: SketchView;
  readonly setView: (view: SketchView) => void;
  readonly picked: PickTarget | null;
  readonly onPick: (target: PickTarget) => void;
  /** The socket whose particulars are open. */
  readonly opened: string | null;
  readonly open: (socket: string | null) => void;
  readonly change: ChangeDraft;
  readonly setChange: (draft: ChangeDraft) => void;
  readonly beginChange: (draft?: ChangeDraft) => void;
  readonly finishChange: () => void;
  readonly begin: (changes: readonly Change[]) => void;
  /** Opens the entry of one kind of evidence, with what is known of it already. */
  readonly enter: (tab: string, text?: string) => void;
  /** A check was made that changed this, and one of the outcomes that were foretold was reported or found. */
  readonly saw: (changes: readonly Change[], outcome: NextCheck['outcomes'][number]) => void;
  /** The runs with an answer to an open question taken for true; null where it changes nothing. */
  readonly settled: (answer: string) => Run[] | null;
  readonly settleBy: (answer: string) => void;
  /** Takes a piece of evidence out that has no entry in which it could be changed. */
  readonly takeOut: (place: EvidencePlace) => void;
  readonly takeBack: (run: number) => void;
  readonly markWhole: (run: number, complete: boolean) => void;
}

/** Brings together the link, the engine and what is being typed. */
export function useWorkspaceModel(bench: Bench, workspace: Workspace): WorkspaceModel {
  const { runs, step, commit } = workspace;
  const { toast } = useAnnouncer();
  const diagnosis = useMemo(() => diagnose(bench.index, runs), [bench, runs]);
  const entry = useEntry(bench, workspace);
  const [change, setChange] = useState<ChangeDraft>(noChange);
  const [opened, open] = useState<string | null>(null);
  const [view, setView] = useView(bench, workspace);
  useSpokenHeadline(diagnosis);

  const changing = step.at === 'change';
  const typing = step.at === 'entry';
  const marks = useMemo(() => {
    if (changing) return chosenMarks(bench.index, chosenSockets(change));
    if (typing && (entry.possible !== null || diagnosis.outcome === 'no-evidence')) {
      return possibleMarks(bench.index, entry.possible);
    }
    return answerMarks(bench.index, diagnosis);
  }, [changing, typing, bench, change, entry.possible, diagnosis]);

  const takeOver = useCallback(
    (next: readonly Run[], words: string) => {
      const before = runs;
      if (!commit(next)) return;
      toast({ text: words, action: { label: 'Undo', onPress: () => void commit(before) } });
    },
    [runs, commit, toast],
  );
  const begin = (changes: readonly Change[]) => commit(begun(runs, changes), { at: 'entry', place: null });
  const saw: WorkspaceModel['saw'] = (changes, outcome) => {
    const seen = outcomeEvidence(bench, runs, outcome);
    // What is told in words cannot be entered by itself: the report is typed.
    if (seen.length === 0) return void begin(changes);
    // What was found at the bench is of the board as it stands; a report is of a new run of the test.
    const into = outcome.finding === undefined ? begun(runs, changes) : runs;
    takeOver(
      seen.reduce((all, one) => putEvidence(all, one, null), [...into]),
      `Entered: ${outcome.sees}.`,
    );
  };
  const settled = (answer: string) => settle(bench, runs, answer);
  return {
    bench,
    workspace,
    diagnosis,
    entry,
    marks,
    view,
    setView,
    picked: pickedTarget({ changing, change, opened }),
    onPick: ({ kind, label }) => {
      if (kind !== 'socket') return;
      if (changing) setChange(pickSocket(change, label));
      else if (typing && takesSocket(bench, entry, label)) return;
      else open(label);
    },
    opened,
    open,
    change,
    setChange,
    beginChange: (draft = noChange) => {
      setChange(draft);
      open(null);
      workspace.goTo({ at: 'change' });
    },
    finishChange: () => {
      begin(changesOf(change));
      setChange(noChange);
    },
    begin,
    saw,
    settled,
    settleBy: (answer) => {
      const next = settled(answer);
      if (next !== null) takeOver(next, `Taken for true: ${answer}.`);
    },
    enter: (tab, text = '') => workspace.goTo({ at: 'entry', place: null }, { tab, text }),
    takeOut: (place) => takeOver(dropEvidence(runs, place), 'Taken out.'),
    takeBack: (run) => takeOver(dropRun(runs, run), `Run ${run + 1} was taken back.`),
    markWhole: (run, complete) => void commit(setComplete(runs, { run, complete }), step),
  };
}

/** The runs with a new one begun after something was done; one that still waits goes on. */
function begun(runs: readonly Run[], changes: readonly Change[]): Run[] {
  if (changes.length > 0) return beginRun(runs, changes);
  return awaitsReport(runs) ? [...runs] : [...runs, { changes: [], evidence: [], complete: true }];
}

/** Gives a socket that was tapped to what is being entered; false where that has no use for one. */
function takesSocket(bench: Bench, { tab, text, bits, setBits, setText }: Entry, socket: string): boolean {
  switch (tab) {
    case bitsTab:
      setBits(toggleSocket(bench, bits, socket));
      return true;
    case signTab:
      setText(writeSign({ ...readSign(text), socket }));
      return true;
    case supplyTab:
      setText(writeSupply({ ...readSupply(text), socket }));
      return true;
    default:
      return false;
  }
}

type Picking = { changing: boolean; change: ChangeDraft; opened: string | null };

function pickedTarget({ changing, change, opened }: Picking): PickTarget | null {
  const label = changing ? chosenSockets(change)[0] : opened;
  return label ? { kind: 'socket', label } : null;
}

/** The view of the sketch. How it lies is part of the link; how close it is lasts for the visit. */
function useView(bench: Bench, workspace: Workspace): [SketchView, (view: SketchView) => void] {
  const [view, setView] = useState(() => readView(workspace.view, bench.index));
  const { keepView } = workspace;
  const change = useCallback(
    (next: SketchView) => {
      setView(next);
      keepView(writeView(next, bench.index));
    },
    [keepView, bench],
  );
  return [view, change];
}

/** Says the headline when it changes, so that nobody has to look for it. */
function useSpokenHeadline({ headline, outcome }: Diagnosis): void {
  const { announce } = useAnnouncer();
  useEffect(() => {
    if (outcome !== 'no-evidence') announce(headline);
  }, [headline, outcome, announce]);
}
