import type { Evidence, Run } from '@/shared';
import type { Lane } from '../../brand';
import type { LayoutIndex } from '../../layout/layout-index';
import { sentenceCase } from '../../layout/words';
import { lanesWords } from '../lane-words';
import { openMeaning } from '../verdict';
import { weighOutcomes, weighSeen, type Candidate, type CandidateOutcome } from './candidate';
import { minutes } from './costs';
import type { Desk } from './desk';
import { outcomeShares, sharesAfter } from './information';
import { shows } from './likelihoods';
import type { State } from './states';

/** So few failing readings do not show whether a lane fails everywhere or only at some addresses. */
const fewReadings = 2;
const anythingElse = { sees: 'anything else', means: 'type it in as it is' };
const worthTelling = 0.01;

/**
 * The test over all of the memory, where only a part of it was looked at: which lanes fail beside those known,
 * and whether a lane fails everywhere or only at some addresses. Null where the machine has said all it can.
 */
export function testWhole(desk: Desk): Candidate | null {
  const { beliefs, runs, index, report } = desk;
  const last = runs.findLast((run) => run.evidence.length > 0);
  if (!last || !canSayMore(desk, last)) return null;
  const { failing, passed, states, answers } = beliefs;
  const alone = [...failing].sort((a, b) => a - b);
  const single = readingsIn(index, last) <= fewReadings;
  const rows = new Map<string, { lanes: readonly Lane[]; some: boolean; likelihood: number[] }>();
  const add = (at: { lanes: readonly Lane[]; some: boolean }, answer: number, probability: number) => {
    const key = `${at.some ? 'some ' : ''}${at.lanes.join(' ')}`;
    const row = rows.get(key) ?? { ...at, likelihood: answers.map(() => 0) };
    row.likelihood[answer] = (row.likelihood[answer] as number) + probability;
    rows.set(key, row);
  };
  for (const state of states) {
    const weight = state.share / (answers[state.answer]?.share ?? 1);
    const more = state.reach.filter((lane) => !passed.has(lane) && !failing.includes(lane));
    const lanes = [...new Set([...alone, ...more])].sort((a, b) => a - b);
    // Untested lanes that it reaches are enough to see it; those that it spares show nothing.
    const showing = more.length > 0 ? 1 - state.kind.miss ** more.length : 1;
    const some = single && lanes.length === alone.length ? shows.someAddresses[state.sort] : 0;
    add({ lanes, some: false }, state.answer, weight * showing * (1 - some));
    add({ lanes, some: true }, state.answer, weight * showing * some);
    add({ lanes: alone, some: false }, state.answer, weight * (1 - showing));
  }
  const rest = answers.length - 1;
  add({ lanes: alone, some: false }, rest, shows.otherStays * (1 - (single ? shows.someAddresses.other : 0)));
  add({ lanes: alone, some: true }, rest, shows.otherStays * (single ? shows.someAddresses.other : 0));
  if (rows.size < 2) return null;
  const prior = answers.map((answer) => answer.share);
  const list = [...rows.values()];
  const probability = outcomeShares(
    prior,
    list.map((row) => row.likelihood),
  );
  const order = list.map((_, n) => n).sort((a, b) => (probability[b] as number) - (probability[a] as number));
  const outcomes = order
    .filter((n) => (probability[n] as number) >= worthTelling)
    .map((n): CandidateOutcome => {
      const { lanes, some, likelihood } = list[n] as (typeof list)[number];
      const after = sharesAfter(prior, likelihood);
      const where =
        single && lanes.length === alone.length ? (some ? ' at some addresses only' : ' at every address') : '';
      const more = lanes.length > alone.length;
      const wholeMode = (answer: number) => (more ? leadingMode(states, { answer, alone }) : null);
      const none = { moves: new Map(), handled: [] };
      const means = () => desk.meaning({ after, clears: false, handling: none, modeOf: wholeMode });
      return { words: () => ({ sees: `${report(lanes)}${where}`, means: means() }), likelihood };
    });
  const left = answers.map((_, a) =>
    Math.max(0, 1 - outcomes.reduce((sum, each) => sum + (each.likelihood[a] as number), 0)),
  );
  const banks = index.bankCount === 1 ? 'the memory' : index.bankCount === 2 ? 'both banks' : 'all banks';
  return weighOutcomes(
    beliefs,
    { action: 'test-whole', label: `Test the whole of ${banks}.`, sockets: [], minutes: minutes.testWhole },
    [...outcomes, { words: () => anythingElse, likelihood: left }],
  );
}

/** The likeliest mode of an answer that reaches further than what is known. */
function leadingMode(states: readonly State[], of: { answer: number; alone: readonly Lane[] }) {
  const further = states.find(
    ({ answer, reach }) => answer === of.answer && reach.some((lane) => !of.alone.includes(lane)),
  );
  return further?.cause.mode ?? null;
}

/** How many failing readings a run holds; as good as many where it names lanes in another way. */
function readingsIn(index: LayoutIndex, { evidence }: Run): number {
  let count = 0;
  for (const each of evidence) {
    if (each.kind === 'readings') {
      count += each.lines.filter((line) => line.read !== line.written).length;
      if (each.lines.some((line) => line.to !== undefined)) return Infinity;
    } else if (each.kind === 'code') {
      const format = index.document.reportFormats.find(({ id }) => id === each.format);
      if (format?.parts.some((part) => 'field' in part && part.field === 'address')) count++;
      else return Infinity;
    } else if (each.kind !== 'sign' && each.kind !== 'measurement') return Infinity;
  }
  return count;
}

/** Whether the way in which the last report was made has more to tell. */
function canSayMore({ index }: Desk, run: Run): boolean {
  return run.evidence.some((each): boolean => sayMore(each));

  function sayMore(each: Evidence): boolean {
    switch (each.kind) {
      case 'readings':
      case 'log':
        return each.rest === 'unknown';
      case 'picture':
        return each.rest === 'unknown';
      case 'mask':
        return index.bankCount > 1;
      case 'lanes':
        return each.passed === 'none';
      case 'code':
        return (
          !run.complete && index.document.reportFormats.some((one) => one.id === each.format && one.after !== 'stops')
        );
      case 'either':
        return each.ways.some((way) => sayMore(way.evidence));
      default:
        return false;
    }
  }
}

/** The report once more, or the question how the machine counts, where it can mean several things. */
export function settleMeaning(desk: Desk): Candidate | null {
  const { beliefs, weighed, report } = desk;
  const open = openMeaning(weighed);
  const shown = weighed.lastRun;
  if (!open || shown === null) return null;
  const meanings = new Map<string, readonly Lane[]>();
  for (const { runs } of weighed.interpretations) {
    const lanes = [...(runs[shown]?.failing ?? [])].sort((a, b) => a - b);
    meanings.set(lanes.join(' '), lanes);
  }
  const list = [...meanings.values()].slice(0, 8);
  if (list.length < 2) return null;
  const takes = weighed.interpretations.flatMap((each) => each.takes).join(' ');
  const counting = /counts/.test(open.words) || /octal|hexadecimal|decimal|counted from|highest|lowest/.test(takes);
  const within = (lanes: readonly Lane[], state: State | null): number => {
    const touches = (each: readonly Lane[]) => state === null || state.reach.some((lane) => each.includes(lane));
    const all = list.filter(touches).length;
    if (all === 0) return 1 / list.length;
    return touches(lanes) ? 1 / all : 0;
  };
  return weighSeen(
    beliefs,
    {
      action: counting ? 'ask' : 'read-again',
      label: open.check,
      sockets: [],
      minutes: counting ? minutes.ask : minutes.readAgain,
    },
    list.map((lanes) => ({
      sees: counting ? sentenceCase(lanesWords(beliefs.findings.index, lanes)) : report(lanes),
      means: meaningOf(desk, lanes),
      given: (state) => within(lanes, state),
    })),
  );
}

function meaningOf({ index }: Desk, lanes: readonly Lane[]): string {
  const labels = new Set<string>();
  for (const lane of lanes) {
    for (let i = index.laneSocketStart[lane] ?? 0; i < (index.laneSocketStart[lane + 1] ?? 0); i++) {
      const label = index.document.sockets[index.laneSockets[i] as number]?.label;
      if (label !== undefined) labels.add(label);
    }
  }
  if (labels.size === 1) return `it is ${[...labels][0]}`;
  return labels.size <= 4 && labels.size > 0 ? `it is among ${[...labels].join(', ')}` : lanesWords(index, lanes);
}
