import { useCallback, useEffect, useMemo, useState } from 'react';
import type { PickTarget, SketchMarks, SketchView } from '@/components/board/sketch-types';
import { useAnnouncer } from '@/components/ui/announcer';
import { diagnose } from '@/lib';
import type { Change, Diagnosis, Run } from '@/shared';
import type { Bench } from './bench';
import { toggleSocket } from './entry/failing-bits';
import { bitsTab, useEntry, type Entry } from './entry/use-entry';
import { answerMarks, chosenMarks, possibleMarks } from './marks';
import { changesOf, chosenSockets, noChange, pickSocket, type ChangeDraft } from './runs/change-draft';
import { readView, writeView } from './sketch-view-link';
import type { Workspace } from './use-workspace';
import { beginRun, dropRun, setComplete } from './workspace-runs';

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
  const begin = (changes: readonly Change[]) => {
    const next =
      changes.length === 0 ? [...runs, { changes: [], evidence: [], complete: true }] : beginRun(runs, changes);
    commit(next, { at: 'entry', place: null });
  };
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
      else if (typing && entry.tab === bitsTab) entry.setBits(toggleSocket(bench, entry.bits, label));
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
    takeBack: (run) => takeOver(dropRun(runs, run), `Run ${run + 1} was taken back.`),
    markWhole: (run, complete) => void commit(setComplete(runs, { run, complete }), step),
  };
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
