import { screen, waitFor, within } from '@testing-library/react';
import { demoBoards } from '@/server/seeders/boards';
import { layoutDocument } from '@/shared';
import { setDevice } from '../support/device';
import { control } from './find-control';
import { address } from './live-router';
import { showWorkspace } from './show-workspace';

jest.mock('expo-router', () => jest.requireActual<typeof import('./live-router')>('./live-router').liveRouter());

const board = (slug: string) => layoutDocument.parse(demoBoards.find((one) => one.slug === slug)?.document);
const loom = board('tarnvall-t-64-rev-b');
const survey = board('wrayburn-gr-5-2b');

const key = control;
const keypad = () => screen.getByLabelText('Keys of this code');
const offered = () =>
  within(keypad())
    .getAllByRole('button')
    .filter((one) => one.getAttribute('aria-disabled') !== 'true')
    .map((one) => one.textContent);
const code = () => screen.getByLabelText<HTMLInputElement>(/what the board reports/);

beforeEach(() => {
  window.scrollTo = jest.fn();
  setDevice({ width: 390 });
});

describe('typing what the board reports', () => {
  it('offers only the keys that can come next, each at its steady place', async () => {
    const { user } = showWorkspace(loom);
    const all = within(keypad())
      .getAllByRole('button')
      .map((one) => one.textContent);
    expect(offered()).toEqual(['A', 'B', 'C', 'D']);
    await user.click(key('C'));
    expect(offered()).toEqual(['0', '1', '2', '3', '4', '5', '6', '7']);
    await user.click(key('5'));
    expect(offered()).toEqual([]);
    expect(
      within(keypad())
        .getAllByRole('button')
        .map((one) => one.textContent),
    ).toEqual(all);
  });

  it('says at once that a code is impossible, and why', async () => {
    const { user } = showWorkspace(loom);
    await user.type(code(), 'C9');
    expect(screen.getByText('Bit 9: this board has bits 0 to 7.')).toBeInTheDocument();
    expect(key('Find the chip')).toHaveAttribute('aria-disabled', 'true');
    expect(code()).toBeInvalid();
  });

  it('fills in fixed text by itself, and takes it away with the key before it', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Monitor line'));
    for (const sign of '4C1A') await user.click(key(sign));
    expect(screen.getByText('wrote')).toBeInTheDocument();
    await user.click(key('F'));
    expect(code()).toHaveValue('4C1A wrote F');
    await user.click(key('Erase'));
    await user.click(key('Erase'));
    expect(code()).toHaveValue('4C1');
  });

  it('takes fixed text that somebody types as well only once', async () => {
    const { user } = showWorkspace(loom, { f: 'monitor' });
    await user.type(code(), '4C1A wrote FF read F7');
    expect(code()).toHaveValue('4C1A wrote FF read F7');
  });

  it('takes ten kilobytes of paste with a reason and loses nothing', async () => {
    const { user } = showWorkspace(loom);
    await user.click(code());
    await user.paste('A'.repeat(10_240));
    expect(screen.getByText(/10240 characters long/)).toBeInTheDocument();
    expect(code().value).toHaveLength(10_240);
    expect(key('Find the chip')).toHaveAttribute('aria-disabled', 'true');
  });

  it('reads what was meant and says what it took otherwise', async () => {
    const { user } = showWorkspace(loom);
    await user.click(code());
    await user.paste('CO');
    expect(screen.getByText(/Bit 0 of bank C/)).toBeInTheDocument();
    expect(screen.getByText(/O read as 0/i)).toBeInTheDocument();
  });

  it('explains which convention nobody knows', async () => {
    const { user } = showWorkspace(survey);
    await user.click(key('Not sure?'));
    expect(screen.getByText('Either lanes counted from 0, or lanes counted from 1.')).toBeInTheDocument();
    await user.click(key('Mark failing bits'));
    expect(control('Bit 3 of bank VT fails')).toBeInTheDocument();
  });

  it('remembers the draft in the link without a place in the history', async () => {
    const { user } = showWorkspace(loom);
    await user.click(key('C'));
    await waitFor(() => expect(address.params).toMatchObject({ f: 'lamp', d: 'C' }));
    expect(address.depth).toBe(1);
  });

  it('goes on typing where a reload left off', () => {
    showWorkspace(loom, { f: 'monitor', d: '4C1A wrote ' });
    expect(code()).toHaveValue('4C1A wrote ');
  });
});

describe('taking a report over', () => {
  it('puts it into the link as a step that can be gone back from', async () => {
    const { user } = showWorkspace(loom);
    await user.type(code(), 'C5{Enter}');
    expect(address.params.r).toBe('1~c.lamp.C5');
    expect(screen.getByRole('heading', { level: 1, name: 'Pull U31 first.' })).toBeInTheDocument();
    address.back();
    expect(screen.getByText('What did the board report?')).toBeInTheDocument();
  });

  it('stays for the next line where the machine lists its failures', async () => {
    const { user } = showWorkspace(loom, { f: 'monitor' });
    await user.click(code());
    await user.paste('4C1A wrote FF read F7');
    await user.click(key('Next line'));
    expect(screen.getByText('What else did it report?')).toBeInTheDocument();
    await user.click(control('There was more'));
    expect(address.params.r).toMatch(/^1~n\.more~c\.monitor\./);
  });

  it('changes and takes out an older report, and gives it back', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5' });
    await user.click(control('Change C5'));
    expect(code()).toHaveValue('C5');
    await user.click(key('Erase'));
    await user.click(key('2'));
    await user.click(key('Keep'));
    expect(address.params.r).toBe('1~c.lamp.C2');
    await user.click(control('Change C2'));
    await user.click(key('Take this report out'));
    expect(address.params.r).toBeUndefined();
    address.back();
    address.back();
    expect(address.params.r).toBe('1~c.lamp.C2');
  });

  it('takes failing bits that were marked one by one', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('Failing bits'));
    await user.click(control('Bit 5 of bank C fails'));
    await user.click(control('The rest was not tested'));
    await user.click(key('Find the chip'));
    expect(address.params.r).toBe('1~l.none.C-5');
  });

  it('takes a pass of some banks', async () => {
    const { user } = showWorkspace(loom);
    await user.click(control('All passed'));
    await user.click(key('Bank B'));
    await user.click(key('Bank B passed'));
    expect(address.params.r).toBe('1~p.B');
  });
});
