import type { Run } from '@/shared';
import { awaitsReport, type EvidencePlace } from './workspace-runs';

/**
 * Where the technician is. entry: typing what the board reports, in the place of an older report where one is
 * given. change: saying what was done to the board. answer: reading.
 */
export type Step =
  | { readonly at: 'entry'; readonly place: EvidencePlace | null }
  | { readonly at: 'change' }
  | { readonly at: 'answer' };

/** The step as the link has it; where the last run still waits for its report, that is asked first. */
export function readStep(text: string, runs: readonly Run[]): Step {
  if (text === 'do') return { at: 'change' };
  const [run, index] = (/^(\d+)\.(\d+)$/.exec(text) ?? []).slice(1).map(Number);
  if (run !== undefined && index !== undefined && runs[run]?.evidence[index] !== undefined) {
    return { at: 'entry', place: { run, index } };
  }
  return text === 'add' || awaitsReport(runs) ? { at: 'entry', place: null } : { at: 'answer' };
}

/** The step as text of the link; empty where the runs alone lead to it. */
export function writeStep(step: Step, runs: readonly Run[]): string {
  switch (step.at) {
    case 'change':
      return 'do';
    case 'entry':
      if (step.place !== null) return `${step.place.run}.${step.place.index}`;
      return awaitsReport(runs) ? '' : 'add';
    case 'answer':
      return '';
  }
}
