import { screen, within } from '@testing-library/react';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { setDevice } from '../../support/device';
import { control } from '../find-control';
import { address } from '../live-router';
import { showWorkspace } from '../show-workspace';

jest.mock('expo-router', () => jest.requireActual<typeof import('../live-router')>('../live-router').liveRouter());

const board = (slug: string) => layoutDocument.parse(demoBoards.find((one) => one.slug === slug)?.document);
const loom = board('tarnvall-t-64-rev-b');

const typeInto = async (user: ReturnType<typeof showWorkspace>['user'], label: RegExp | string, text: string) => {
  await user.click(screen.getByLabelText(label));
  await user.paste(text);
};
const lines = () =>
  within(screen.getByRole('list', { name: 'What each line means' }))
    .getAllByRole('listitem')
    .map((one) => one.textContent);
const readings = /^Address, what was written/;

beforeEach(() => {
  window.scrollTo = jest.fn();
  setDevice({ width: 390 });
});

describe('readings', () => {
  it('say what each line means while they are typed, and go into the link', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Readings'));
    await typeInto(user, readings, '4C1A FF F7\n4C1B FF F7');
    expect(lines()).toEqual([
      expect.stringMatching(/^4C1A FF F7Bit 3 of bank B; row \d+, column \d+\.$/),
      expect.stringMatching(/^4C1B FF F7Bit 3 of bank B; row \d+, column \d+\.$/),
    ]);
    await user.click(control('Find the chip'));
    expect(address.params.r).toBe('1~r.-.4C1AwFFrF7.4C1BwFFrF7');
    expect(screen.getByRole('list', { name: 'Where they lead' })).toHaveTextContent(/4C1A Bank B, bit 3, row/);
  });

  it('say so where all else was tested and passed', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Readings'));
    await typeInto(user, readings, '4C1A FF F7');
    await user.click(control('All else was tested and passed'));
    await user.click(control('Find the chip'));
    expect(address.params.r).toBe('1~r.p.4C1AwFFrF7');
    await user.click(control('Change 4C1A FF F7'));
    expect(screen.getByLabelText(readings)).toHaveValue('4C1A FF F7');
    expect(control('All else was tested and passed')).toHaveAttribute('aria-pressed', 'true');
  });

  it('name the line that cannot be read, and why, and keep the others', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Readings'));
    await typeInto(user, readings, '4C1A FF F7\nhello\n4C1B FF F7');
    expect(within(screen.getByRole('list', { name: 'Lines that were not read' })).getByText(/Line 2/)).toBeVisible();
    expect(lines()).toHaveLength(2);
  });

  it('tell of an address outside the memory where the nearest window is', async () => {
    const { user } = showWorkspace(board('sandvoe-tg-3-issue-2'));
    await user.click(control('Readings'));
    await typeInto(user, readings, 'F0000 FF F7');
    expect(screen.getByText(/outside this board's memory; the nearest window is/)).toBeVisible();
  });

  it('keep both notations until the technician knows which is true', async () => {
    const { user } = showWorkspace(loom, { r: '1~e.octal.hexadecimal~r.-.1CwFFrF7~r.-.34wFFrEF' });
    await user.click(control('Change 001C FF F7'));
    expect(screen.getByText('All of these are weighed. Choose one once you know which is true.')).toBeVisible();
    await user.click(control('Hexadecimal. 0034 FF EF'));
    expect(address.params.r).toBe('1~r.-.34wFFrEF');
  });
});

describe('what is rarer than a code', () => {
  const rare = () =>
    within(screen.getByRole('group', { name: 'What else there is to enter' }))
      .getAllByRole('button')
      .map((one) => one.getAttribute('aria-label')?.split('.')[0]);

  it('stands in one list, with only what the board can use', async () => {
    const { user, unmount } = showWorkspace(loom);
    await user.click(control('Something else'));
    expect(rare()).toEqual(['A log', 'A sign', 'The supply', 'Two addresses, one cell']);
    await user.click(control(/^A log\./));
    expect(control('Choose a log file')).toBeInTheDocument();
    expect(screen.queryByText('Find the chip')).toBeNull();
    await user.click(control('Another kind'));
    expect(rare()).toHaveLength(4);
    unmount();

    const shown = showWorkspace(board('penhallow-formset-2-pd-3'));
    await shown.user.click(control('Something else'));
    expect(rare()).toContain('The picture');
    await shown.user.click(control(/^The picture\./));
    expect(screen.queryByRole('group', { name: 'What else there is to enter' })).toBeNull();
  });
});

describe('signs', () => {
  it('are chosen in words, with the socket where one helps', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5', e: 'add' });
    await user.click(control('Something else'));
    await user.click(control(/^A sign\./));
    expect(control('Use this sign')).toHaveAttribute('aria-disabled', 'true');
    await user.click(control(/^A chip is hot\./));
    await typeInto(user, /^The hot chip/, 'U99');
    expect(screen.getByText('This board has no socket U99.')).toBeVisible();
    expect(control('Use this sign')).toHaveAttribute('aria-disabled', 'true');
    await user.clear(screen.getByLabelText(/^The hot chip/));
    await typeInto(user, /^The hot chip/, 'U31');
    await user.click(control('Use this sign'));
    expect(address.params.r).toBe('1~c.lamp.C5~g.hot.U31');
  });
});

describe('a measured supply', () => {
  it('is told at once to be out of its limits, and leads to the next pin of the same socket', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Something else'));
    await user.click(control(/^The supply\./));
    await typeInto(user, 'Socket', 'U31');
    const pins = within(screen.getByRole('radiogroup', { name: 'Supply pins of U31' })).getAllByRole('radio');
    expect(pins.length).toBeGreaterThan(1);
    const five = pins.find((one) => /\+5/.test(one.textContent ?? ''));
    await user.click(five as HTMLElement);
    await typeInto(user, 'Volts measured', '4,2');
    expect(screen.getByText(/^Too low: pin \d+ wants 4\.\d+ V to 5\.\d+ V\.$/)).toBeVisible();
    await user.click(control('Next pin'));
    expect(address.params.r).toMatch(/^1~u\.U31\.\d+\.4-2$/);
    expect(screen.getByLabelText('Socket')).toHaveValue('U31');
    expect(screen.getByLabelText('Volts measured')).toHaveValue('');
  });

  it('refuses what is no number of volts', async () => {
    const { user } = showWorkspace(loom, { f: '~supply', d: 'U31\n8\n4.7.1' });
    expect(screen.getByText(/Write a number of volts/)).toBeVisible();
    expect(control('Use this value')).toHaveAttribute('aria-disabled', 'true');
    await user.click(control('Clear'));
    expect(screen.getByLabelText('Socket')).toHaveValue('');
  });
});

describe('two addresses of one cell', () => {
  it('say in which address bits they differ', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Something else'));
    await user.click(control(/^Two addresses, one cell\./));
    await typeInto(user, 'One address', '4000');
    await typeInto(user, 'The other', '4400');
    expect(screen.getByText('They differ in address bit 10.')).toBeVisible();
    await user.click(control('Only in bit 3'));
    await user.click(control('Use this pair'));
    expect(address.params.r).toBe('1~a.4000-4400.3');
  });
});

describe('a machine of which nobody knows how it counts', () => {
  it('has its code weighed in every meaning', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Not sure?'));
    await user.click(control('Which end is bit 0?'));
    await user.click(control('Close'));
    await user.click(control('C'));
    await user.click(control('5'));
    expect(screen.getByText(/^Bit 5 of bank C, if bit 0 is the lowest\.$/)).toBeVisible();
    expect(screen.getByText(/^Bit 2 of bank C, if bit 0 is the highest\.$/)).toBeVisible();
    await user.click(control('Find the chip'));
    expect(address.params.r).toBe('1~q.order.lamp.C5');
  });
});
