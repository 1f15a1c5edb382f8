import type { Question } from '@/shared';
import type { Lane } from '../brand';
import type { LayoutIndex } from '../layout/layout-index';
import { labelOf } from './timeline';
import type { Interpretation } from './observe/observations';

const mostAnswers = 8;
/** An answer that the other evidence makes less likely than this is no longer asked for. */
const worthAsking = 0.01;

/** What is open in the evidence, with what each answer would lead to. Empty where other evidence has settled it. */
export function openQuestions(
  index: LayoutIndex,
  interpretations: readonly Interpretation[],
  { shares, settles }: { shares: readonly number[]; settles: string },
): Question[] {
  if (interpretations.length < 2) return [];
  const answers = new Map<string, { share: number; sockets: Set<string> }>();
  interpretations.forEach(({ takes, runs }, i) => {
    const words = takes.join(', ') || 'as the layout says';
    const answer = answers.get(words) ?? { share: 0, sockets: new Set<string>() };
    answer.share += shares[i] ?? 0;
    for (const lane of runs.flatMap((run) => [...run.failing])) {
      for (const socket of socketsOf(index, lane)) answer.sockets.add(socket);
    }
    answers.set(words, answer);
  });
  const open = [...answers]
    .map(([words, { share, sockets }]) => ({ words, share: Math.min(1, share), sockets: [...sockets].slice(0, 12) }))
    .filter(({ share }) => share >= worthAsking)
    .sort((a, b) => b.share - a.share);
  if (open.length < 2) return [];
  return [{ ask: askFor(interpretations), answers: open.slice(0, mostAnswers), settles }];
}

function askFor(interpretations: readonly Interpretation[]): string {
  const takes = interpretations.flatMap((each) => each.takes).join(' ');
  const counts = /counted from/.test(takes);
  const order = /highest|lowest/.test(takes);
  if (counts && order) return 'From which number does this machine count, and which end is bit 0?';
  if (counts) return 'Does this machine count from 0 or from 1?';
  if (order) return 'Which end is bit 0 on this machine?';
  if (/octal|hexadecimal|decimal/.test(takes)) return 'In which notation does this machine write its numbers?';
  if (/ = /.test(takes)) return 'What was in the page or bank register?';
  return 'Which of these did the machine say?';
}

function socketsOf(index: LayoutIndex, lane: Lane): string[] {
  const found: string[] = [];
  for (let at = index.laneSocketStart[lane] as number; at < (index.laneSocketStart[lane + 1] as number); at++) {
    found.push(labelOf(index, index.laneSockets[at] as never));
  }
  return found;
}
