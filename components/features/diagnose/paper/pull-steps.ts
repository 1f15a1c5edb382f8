import type { Diagnosis } from '@/shared';
import type { Bench } from '../bench';

/** What to do at the bench, one line a step, in order. */
export function pullSteps({ document }: Bench, { headline, nextChecks, outcome, questions }: Diagnosis): string[] {
  const [check] = nextChecks;
  const steps = ['Power off, unplug, wait for the capacitors.', 'Compare the revision and its marks with the board.'];
  if (document.rails.length > 0) steps.push('Measure the rails at a socket and write them down here.');
  if (outcome === 'place' || outcome === 'group') steps.push('Touch ground before you touch a chip.');
  steps.push(headline);
  if (outcome === 'supply') steps.push('Measure again at every rail before a chip is pulled or fitted.');
  for (const { ask, settles } of questions) steps.push(`${ask} ${settles}`.trim());
  if (check !== undefined && check.label !== headline) {
    const outcomes = check.outcomes.slice(0, 3).map(({ sees, means }) => `${sees}: ${means}`);
    steps.push(`${check.label} ${outcomes.join('; ')}`.trim());
  }
  steps.push('Run the test again, and write down what it reports: ____________________');
  steps.push('Soak it for some hours, cold and warm, before it is called repaired.');
  return steps;
}
