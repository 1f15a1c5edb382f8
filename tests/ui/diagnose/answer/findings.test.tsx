import { screen, within } from '@testing-library/react';
import { noMarks } from '@/components/board/sketch-types';
import { NextChecks } from '@/components/features/diagnose/answer/next-checks';
import { PullSheet } from '@/components/features/diagnose/paper/pull-sheet';
import { readLink } from '@/components/features/diagnose/link/workspace-link';
import { readView } from '@/components/features/diagnose/sketch-view-link';
import { diagnose } from '@/lib';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { setDevice } from '../../support/device';
import { renderPage } from '../../support/render';
import { control } from '../find-control';
import { address } from '../live-router';
import { readyBench } from '../ready-bench';
import { showWorkspace } from '../show-workspace';

jest.mock('expo-router', () => jest.requireActual<typeof import('../live-router')>('../live-router').liveRouter());

const loom = layoutDocument.parse(demoBoards.find(({ slug }) => slug === 'tarnvall-t-64-rev-b')?.document);
const bench = readyBench(loom);
const headline = () => screen.getByRole('heading', { level: 1 }).getAttribute('aria-label') ?? '';
const allBanks = (bits: string) => ['A', 'B', 'C', 'D'].map((bank) => `${bank}-${bits}`).join('.');
/** The first suspect of the list. */
const leading = () => control(/^Why, and what against: /).getAttribute('aria-label') ?? '';

beforeEach(() => {
  window.scrollTo = jest.fn();
  setDevice({ width: 390 });
});

describe('a check that is made without a run of the test', () => {
  it('is entered into the run in hand by a tap on what was measured, and changes the answer', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5' });
    expect(leading()).toContain('chip');
    await user.click(control(/^Other checks/));
    await user.click(control(/^I saw open at a leg: /));
    expect(address.params.r).toBe('1~c.lamp.C5~b.legs.bad.position-U31');
    expect(leading()).toMatch(/U31 .*(contact|socket)/);
    expect(screen.getAllByText('Measured to the legs of U31: a leg is open').length).toBeGreaterThan(0);
    await user.click(control('Undo'));
    expect(address.params.r).toBe('1~c.lamp.C5');
    expect(leading()).toContain('chip');
  });

  it('names the chip that let the others come back', async () => {
    const given = `1~l.rest.${allBanks('5')}`;
    const { user } = showWorkspace(loom, { r: given });
    expect(headline()).toMatch(/^Bit 5 of every bank/);
    await user.click(control(/^I saw the others come back with U31 out: /));
    expect(address.params.r).toBe(`${given}~b.pull.bad.chip-U31`);
    expect(headline()).toContain('U31');
    expect(headline()).not.toMatch(/every bank/);
  });

  it('is taken out again and not changed, and that can be undone', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5~b.legs.bad.position-U31' });
    const text = 'Measured to the legs of U31: a leg is open';
    expect(screen.queryByRole('button', { name: `Change ${text}` })).toBeNull();
    await user.click(control(`Take out ${text}`));
    expect(address.params.r).toBe('1~c.lamp.C5');
    await user.click(control('Undo'));
    expect(address.params.r).toBe('1~c.lamp.C5~b.legs.bad.position-U31');
  });

  it('can be taken out of the list of what is entered already', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5~b.stack.good.chip-U31', e: 'add' });
    await user.click(control('Good chip on top of U31: no change, take out'));
    expect(address.params.r).toBe('1~c.lamp.C5');
  });

  it('leaves what only a report can settle to be read', () => {
    const outcomes = [
      { sees: 'much hotter', means: 'the chip is bad', probability: 0.2 },
      { sees: 'like the others', means: 'says little', probability: 0.8 },
    ];
    const feel = { action: 'feel' as const, label: 'Feel U31.', sockets: ['U31'], minutes: 1, bits: 0.1, outcomes };
    const diagnosis = { ...diagnose(bench.index, readLink('1~c.lamp.C5').runs), nextChecks: [feel] };
    renderPage(
      <NextChecks {...{ diagnosis }} onDone={() => undefined} onSaw={() => undefined} onOther={() => undefined} />,
    );
    const list = screen.getByRole('list', { name: 'What the board may report' });
    expect(within(list).getByText('much hotter')).toBeVisible();
    expect(within(list).queryByRole('button')).toBeNull();
  });
});

describe('the pull sheet', () => {
  it('prints what was found with what was reported, however long the list is', () => {
    const { runs } = readLink(`1~${'c.lamp.C5~'.repeat(12)}b.joined.good.short-4_2D_5`);
    const { container } = renderPage(
      <PullSheet
        {...{ bench, runs }}
        diagnosis={diagnose(bench.index, runs)}
        marks={noMarks}
        view={readView(null, bench.index)}
      />,
    );
    expect(container).toHaveTextContent('What it reported and what was found');
    expect(container).toHaveTextContent('D4 and D5 measured: apart');
    expect(container).toHaveTextContent('and 5 more');
  });
});
