import { screen, within } from '@testing-library/react';
import { AnswerCard } from '@/components/features/diagnose/answer/answer-card';
import { NextChecks } from '@/components/features/diagnose/answer/next-checks';
import { Questions } from '@/components/features/diagnose/answer/questions';
import { worthWords } from '@/components/features/diagnose/answer/worth-words';
import { readLink } from '@/components/features/diagnose/link/workspace-link';
import { pullSteps } from '@/components/features/diagnose/paper/pull-steps';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument, type Diagnosis, type NextCheck } from '@/shared';
import { renderPage } from '../../support/render';
import { readyBench } from '../ready-bench';

const loom = readyBench(layoutDocument.parse(demoBoards.find(({ slug }) => slug === 'tarnvall-t-64-rev-b')?.document));

const answer = (of: Partial<Diagnosis>): Diagnosis => ({
  outcome: 'place',
  headline: 'Pull U31 first.',
  sure: 'strong',
  probability: 0.9,
  sentences: [],
  suspects: [],
  places: [],
  groups: [],
  pairs: [],
  unexplained: [],
  untested: [],
  lanes: [],
  evidence: [],
  signatures: [],
  questions: [],
  nextChecks: [],
  cautions: [],
  exact: true,
  leftOut: 0,
  ...of,
});

const check = (of: Partial<NextCheck>): NextCheck => ({
  action: 'swap',
  label: 'Swap U31 with U30.',
  sockets: ['U31', 'U30'],
  minutes: 8,
  bits: 0.5,
  outcomes: [{ sees: 'C4', means: 'the chip is bad', probability: 0.8 }],
  ...of,
});

describe('a supply out of its limits', () => {
  it('stands before any chip, with the pin and what was measured', () => {
    const diagnosis = answer({ outcome: 'supply', headline: 'Put the supply right first.' });
    const { runs } = readLink('1~u.U31.8.4-2~u.U31.16.0-01');
    renderPage(<AnswerCard bench={loom} runs={runs} diagnosis={diagnosis} />);
    const [first, second] = within(screen.getByRole('list', { name: 'Measured supplies' })).getAllByRole('listitem');
    const five = loom.document.rails.find(({ pins }) => pins.includes(8));
    expect(first).toHaveTextContent(five === undefined ? /U31 pin 8/ : /U31 pin 8, .*: 4\.2 V\s*Too low/);
    expect(second).toHaveTextContent(/U31 pin 16/);
    expect(pullSteps(loom, diagnosis)).toContain('Measure again at every rail before a chip is pulled or fitted.');
  });
});

describe('patterns in the readings', () => {
  it('are told with the bits that show them, once', () => {
    const words = 'All 128 failing words lie in row 53.';
    const signature = {
      shape: 'row' as const,
      words,
      lanes: [{ bank: 'C', bit: 5 }],
      row: 53,
      column: null,
      count: 128,
    };
    const { unmount } = renderPage(
      <AnswerCard bench={loom} runs={[]} diagnosis={answer({ signatures: [signature] })} />,
    );
    expect(screen.getByRole('list', { name: 'Patterns in the readings' })).toHaveTextContent(
      `${words} (bit 5 of bank C)`,
    );
    unmount();
    renderPage(
      <AnswerCard bench={loom} runs={[]} diagnosis={answer({ signatures: [signature], sentences: [words] })} />,
    );
    expect(screen.queryByRole('list', { name: 'Patterns in the readings' })).toBeNull();
    expect(screen.getAllByText(words)).toHaveLength(1);
  });
});

describe('an open question', () => {
  const questions = [
    {
      ask: 'Does this machine count from 0 or from 1?',
      answers: [
        { words: 'banks counted from 0', share: 0.8, sockets: ['U31'] },
        { words: 'banks counted from 1', share: 0.2, sockets: ['U23'] },
      ],
      settles: 'A failure in the last bank settles it.',
    },
  ];

  it('has answers with their shares, and says what settles it where nobody knows', async () => {
    const answered: string[] = [];
    const { user } = renderPage(
      <Questions
        questions={questions}
        next=""
        settles={(words) => words.endsWith('0')}
        onAnswer={(words) => answered.push(words)}
      />,
    );
    const [first, second] = screen.getAllByRole('listitem');
    expect(first).toHaveTextContent('Banks counted from 0U3180 %');
    expect(screen.getByText(/A failure in the last bank settles it/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'It is so: banks counted from 0' }));
    expect(answered).toEqual(['banks counted from 0']);
    // What nothing can be done with is only told.
    expect(within(second as HTMLElement).queryByRole('button')).toBeNull();
  });
});

describe('next checks', () => {
  it('are told with their cost and what they are worth, not in bits', () => {
    const best = check({});
    const long = check({ action: 'pull-in-turn', label: 'Pull them in turn.', minutes: 40, bits: 1.4 });
    const poor = check({ action: 'soak', label: 'Let it run.', minutes: 600, bits: 0.01 });
    const all = [best, long, poor];
    expect(all.map((one) => worthWords(one, all))).toEqual([
      'tells most for its time',
      'tells most of all',
      'tells little',
    ]);
  });

  it('take an outcome by a tap, and the way to enter a measurement', async () => {
    const done: unknown[] = [];
    const rails = check({ action: 'rails', label: 'Measure the rails at U31.', sockets: ['U31'], outcomes: [] });
    const { user } = renderPage(
      <NextChecks
        diagnosis={answer({ nextChecks: [check({}), rails] })}
        onDone={(what) => done.push(what)}
        onSaw={(...what) => done.push(what)}
        onOther={() => undefined}
      />,
    );
    expect(screen.getByText('8 min, tells most for its time')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'I saw C4: the chip is bad' }));
    expect(done[0]).toMatchObject([[{ kind: 'swap', sockets: ['U31', 'U30'] }], { sees: 'C4' }]);
    await user.click(screen.getByRole('button', { name: 'Other checks (1)' }));
    await user.click(screen.getByRole('button', { name: 'Enter the volts' }));
    expect(done[1]).toMatchObject({ enter: { tab: '~supply', text: 'U31\n\n' } });
  });
});
