import type { Change, Evidence, Run } from '@/shared';

/** Where a piece of evidence stands: which run, and which place in it, both from 0. */
export interface EvidencePlace {
  readonly run: number;
  readonly index: number;
}

const emptyRun = (): Run => ({ changes: [], evidence: [], complete: true });

/** The run that what is typed now belongs to: the last one. 0 where there is none yet. */
export const runInHand = (runs: readonly Run[]): number => Math.max(0, runs.length - 1);

/** Whether the last run still waits for what the board reports. */
export const awaitsReport = (runs: readonly Run[]): boolean => (runs.at(-1)?.evidence.length ?? 0) === 0;

/** Puts a piece of evidence at the end of the run in hand, or in the place of an older one. */
export function putEvidence(runs: readonly Run[], seen: Evidence, place: EvidencePlace | null): Run[] {
  if (place !== null && runs[place.run]?.evidence[place.index] !== undefined) {
    return editRun(runs, place.run, (run) => ({
      ...run,
      evidence: run.evidence.map((old, at) => (at === place.index ? seen : old)),
    }));
  }
  const list = runs.length === 0 ? [emptyRun()] : runs;
  return editRun(list, list.length - 1, (run) => ({ ...run, evidence: [...run.evidence, seen] }));
}

/** Takes one piece of evidence away. A run of which nothing is left goes with it. */
export function dropEvidence(runs: readonly Run[], { run: at, index }: EvidencePlace): Run[] {
  return tidy(editRun(runs, at, (run) => ({ ...run, evidence: run.evidence.filter((_, place) => place !== index) })));
}

/** Begins a new run after something was done to the board. A run that still waits takes the changes over. */
export function beginRun(runs: readonly Run[], changes: readonly Change[]): Run[] {
  if (runs.length > 0 && awaitsReport(runs)) {
    return editRun(runs, runs.length - 1, (run) => ({ ...run, changes: [...run.changes, ...changes] }));
  }
  // What was done before anything was seen still came after a first state, which nobody reported.
  const before = runs.length === 0 ? [emptyRun()] : runs;
  return [...before, { ...emptyRun(), changes: [...changes] }];
}

/** Takes a whole run away, with what was done before it. */
export function dropRun(runs: readonly Run[], at: number): Run[] {
  return tidy(runs.filter((_, place) => place !== at));
}

/** Says whether the list of a run was the whole list. */
export function setComplete(runs: readonly Run[], { run: at, complete }: { run: number; complete: boolean }): Run[] {
  return editRun(runs, at, (run) => ({ ...run, complete }));
}

function editRun(runs: readonly Run[], at: number, edit: (run: Run) => Run): Run[] {
  return runs.map((run, place) => (place === at ? edit(run) : run));
}

const holdsNothing = ({ changes, evidence }: Run) => changes.length === 0 && evidence.length === 0;

/** Leaves out runs that hold nothing, except a first one that a later change refers back to. */
function tidy(runs: readonly Run[]): Run[] {
  const left = runs.filter((run, at) => at === 0 || !holdsNothing(run));
  const [first] = left;
  return left.length === 1 && first && holdsNothing(first) ? [] : left;
}
