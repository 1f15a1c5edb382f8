import type { Lane } from '../brand';
import { sentenceCase } from '../layout/words';
import { lanesWords, saidAsOne } from './lane-words';
import type { Observations } from './observe/observations';
import type { Chip } from './timeline';
import { fitOf } from './wrong-part';
import { openMeaning, wentAway, type Verdict, type Weighed } from './verdict';

export interface Told {
  readonly weighed: Weighed;
  readonly verdict: Verdict;
  readonly observations: Observations;
  readonly untested: readonly Lane[];
  readonly leftOut: number;
  readonly problems: readonly string[];
  readonly chips: readonly Chip[];
}

function shortened(text: string): string {
  return text.length > 40 ? `${text.slice(0, 40)}…` : text;
}

function percent(p: number): string {
  if (p > 0.995) return 'more than 99\u00a0%';
  if (p < 0.005) return 'less than 1\u00a0%';
  return `${Math.round(p * 100)}\u00a0%`;
}

/** Why the headline says what it says, and what is not known, the most important first. */
export function tell(told: Told): string[] {
  const { weighed, verdict, observations, untested } = told;
  const { findings, lastRun, places, unexplained } = weighed;
  const sentences = [...told.problems];
  if (lastRun === null) {
    const reasons = observations.evidence.flatMap((piece) =>
      piece.reason === null ? [] : [`"${shortened(piece.text)}": ${piece.reason}`],
    );
    return [...sentences, ...reasons, ...observations.notes];
  }
  if (verdict.outcome === 'supply') {
    const bad = weighed.suspects.flatMap((suspect) => suspect.reasons);
    const after =
      'Switch off, take the chips out, put the supply right and measure again at the sockets. Then test all chips again: some may be hurt.';
    return [...sentences, ...bad, after, ...observations.notes];
  }
  const gone = wentAway(weighed);
  const shown = gone ? lastFailing(weighed) : lastRun;
  const run = findings.runs[shown];
  const open = openMeaning(weighed);
  if (open) {
    sentences.push(open.words);
  } else if (run && run.failing.size > 0) {
    const failed = sentenceCase(lanesWords(findings.index, run.failing));
    const alone = run.failing.size === 1 && run.passed.size > 0 ? ' alone' : '';
    const verb = gone ? 'failed' : saidAsOne(findings.index, run.failing) ? 'fails' : 'fail';
    const passed = run.passed.size > 0 ? ` ${sentenceCase(lanesWords(findings.index, run.passed))} passed.` : '';
    sentences.push(`${failed}${alone} ${verb}.${passed}`);
  } else if (run) {
    sentences.push(`${sentenceCase(lanesWords(findings.index, run.passed))} passed.`);
  }
  if (gone) {
    sentences.push(
      'It went away. That is not a repair yet: a contact, or a chip that comes and goes, stays suspected until a soak of some hours shows no failure.',
    );
  }
  if (untested.length > 0) {
    const silence = observations.silence[lastRun];
    const words = sentenceCase(lanesWords(findings.index, untested));
    sentences.push(
      `${words} ${saidAsOne(findings.index, untested) ? 'was' : 'were'} not tested${silence ? `: ${silence}` : ''}.`,
    );
  }
  for (const { words } of weighed.signatures.slice(0, 3)) sentences.push(words);
  for (const chip of told.chips) {
    const fit = chip.family === null ? null : fitOf(findings.index, chip);
    if (fit && fit.verdict !== 'fits') sentences.push(...fit.reasons.slice(0, 3).map(({ words }) => words));
  }
  const [first] = places;
  if (verdict.outcome === 'place' && first && verdict.sockets.length === 1 && first.chip + first.contact > 0) {
    const more =
      first.chip >= first.contact
        ? ['chip', first.chip, 'contact', first.contact]
        : ['contact', first.contact, 'chip', first.chip];
    sentences.push(
      `Of this place, the ${more[0]} with ${percent(more[1] as number)}, the ${more[2]} with ${percent(more[3] as number)}.`,
    );
  }
  if (verdict.outcome === 'place' && verdict.sockets.length > 2) {
    sentences.push(
      'Three and more bad chips at once are rare. Measure every supply rail at a socket before you pull one.',
    );
  }
  if (unexplained.length > 0)
    sentences.push(`No single cause explains ${lanesWords(findings.index, unexplained)} well.`);
  if (told.leftOut > 0.2) sentences.push('So much fails that only the likeliest combinations of faults were weighed.');
  else if (told.leftOut > 1e-3) {
    sentences.push(
      `Combinations of many faults at once were left out; together they hold at most ${percent(told.leftOut)}.`,
    );
  }
  return [...sentences, ...observations.notes];
}

function lastFailing({ findings, lastRun }: Weighed): number {
  for (let r = lastRun ?? 0; r >= 0; r--) if ((findings.runs[r]?.failing.size ?? 0) > 0) return r;
  return lastRun ?? 0;
}
