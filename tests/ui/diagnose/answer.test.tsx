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

const headline = () => screen.getByRole('heading', { level: 1 }).getAttribute('aria-label') ?? '';
const answer = () => within(screen.getByLabelText('Answer'));
const allBanks = (bits: string) => ['A', 'B', 'C', 'D'].map((bank) => `${bank}-${bits}`).join('.');

beforeEach(() => {
  window.scrollTo = jest.fn();
  setDevice({ width: 390 });
});

describe('the answer', () => {
  it('names the one socket to pull, with tally, percentage and what was not tested', async () => {
    showWorkspace(loom, { r: '1~c.lamp.C5' });
    expect(headline()).toBe('Pull U31 first.');
    expect(answer().getByText('U31')).toBeInTheDocument();
    expect(answer().getByText(/^9\d %$/)).toBeInTheDocument();
    expect(answer().getByText(/were not tested: this self-test stops/)).toBeInTheDocument();
    await waitFor(() =>
      expect(screen.getAllByRole('status').map((one) => one.textContent)).toContain('Pull U31 first.'),
    );
  });

  it('gives the members of a group that cannot be told apart, with their shares', () => {
    showWorkspace(loom, { r: `1~l.rest.${allBanks('5')}` });
    expect(answer().getByText('Cannot be told apart yet')).toBeInTheDocument();
    const members = within(answer().getByRole('list', { name: 'Members of the group' })).getAllByRole('listitem');
    expect(members.map((one) => one.textContent?.slice(0, 3)).sort()).toEqual(['U15', 'U23', 'U31', 'U39', 'U52']);
    expect(answer().queryByText('100 %')).toBeNull();
  });

  it('says not to pull a chip where a shared part leads', () => {
    showWorkspace(loom, { r: `1~l.rest.${allBanks('4-5-6-7')}` });
    expect(headline()).toMatch(/^Do not pull a chip yet\./);
    expect(answer().getByText('A part that many chips share')).toBeInTheDocument();
  });

  it('does not name a chip where nothing failed', () => {
    showWorkspace(loom, { r: '1~p' });
    expect(headline()).toBe('No chip to pull: nothing failed.');
    expect(screen.queryByText('Suspects')).toBeNull();
  });

  it('says why a report was not used', () => {
    showWorkspace(loom, { r: '1~c.lamp.X9' });
    expect(screen.getAllByText(/Bank X: this board has banks A to D/).length).toBeGreaterThan(0);
    expect(screen.queryByText('Suspects')).toBeNull();
  });

  it('keeps suspecting what went away', () => {
    showWorkspace(loom, { r: '1~c.lamp.C5~n~t.U31~p' });
    expect(answer().getByText(/That is not a repair yet/)).toBeInTheDocument();
  });

  it('keeps what could be read of a spoiled link and says what it left out', () => {
    showWorkspace(loom, { r: '1~zz.U9~c.lamp.C5' });
    expect(screen.getByRole('alert')).toHaveTextContent('Left out: “zz.U9”.');
    expect(headline()).toBe('Pull U31 first.');
  });
});

describe('after the answer', () => {
  it('begins a run with the swap that the next check proposed', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5' });
    await user.click(control('I swapped them'));
    expect(address.params.r).toMatch(/^1~c\.lamp\.C5~n~s\.U31\.U\d\d$/);
    expect(screen.getByText('What does it report now?')).toBeInTheDocument();
  });

  it('says while the run waits what each report would mean', async () => {
    setDevice({ width: 1440 });
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5' });
    const before = screen.getByLabelText('What the board may report').textContent;
    await user.click(control('I swapped them'));
    expect(screen.getByText('Run the test, and type what it reports')).toBeInTheDocument();
    expect(screen.getByLabelText('What the board may report').textContent).toBe(before);
    expect(screen.queryByText('Something else was done')).toBeNull();
  });

  it('takes the outcome of the swap by one tap, and takes it back again', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5' });
    await user.click(control(/^I saw C4: /));
    expect(address.params.r).toMatch(/^1~c\.lamp\.C5~n~s\.U31\.U\d\d~c\.lamp\.C4$/);
    expect(headline()).toContain('came from U31');
    await user.click(control('Undo'));
    expect(address.params.r).toBe('1~c.lamp.C5');
  });

  it('puts the supply right before any chip, and asks for the volts where they are wanted', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5~u.U31.8.4-2' });
    expect(headline()).toMatch(/supply right first/);
    expect(answer().getByText('The supply comes before any chip')).toBeInTheDocument();
    expect(answer().getByText(/^U31 pin 8, .*: 4\.2\sV$/)).toBeInTheDocument();
    await user.click(control('Enter the volts'));
    expect(screen.getByRole('heading', { name: 'The supply' })).toBeInTheDocument();
  });

  it('asks how the machine counts, and takes an answer for true', async () => {
    const { user } = showWorkspace(loom, { r: '1~q.order.lamp.C5' });
    expect(screen.getByText('Which end is bit 0 on this machine?')).toBeInTheDocument();
    await user.click(control('It is so: bit 0 is the lowest'));
    expect(address.params.r).toBe('1~c.lamp.C5');
    expect(headline()).toBe('Pull U31 first.');
  });

  it('follows the chip: it is named by where it is now', () => {
    showWorkspace(loom, { r: '1~c.lamp.C5~n~s.U31.U23~c.lamp.B5' });
    expect(headline()).toContain('U23');
    expect(headline()).toContain('came from U31');
  });

  it('takes what was done by label, and refuses a socket that the board does not have', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5' });
    await user.click(control('Something else was done'));
    await user.click(screen.getByLabelText('One socket'));
    await user.paste('U31');
    await user.click(screen.getByLabelText('The other socket'));
    await user.paste('U99');
    expect(screen.getByText('This board has no socket U99.')).toBeInTheDocument();
    expect(control('Done, run again')).toHaveAttribute('aria-disabled', 'true');
    await user.click(control('Reseated'));
    await user.click(control('Done, run again'));
    expect(address.params.r).toBe('1~c.lamp.C5~n~t.U31');
  });

  it('takes a run back and offers to undo that', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5~n~s.U31.U23~c.lamp.B5' });
    await user.click(control('Take back run 2'));
    expect(address.params.r).toBe('1~c.lamp.C5');
    await user.click(control('Undo'));
    expect(address.params.r).toBe('1~c.lamp.C5~n~s.U31.U23~c.lamp.B5');
  });

  it('tells of a socket what it holds, which codes blame it and how far it is suspected', async () => {
    const { user } = showWorkspace(loom, { r: '1~c.lamp.C5' });
    await user.click(control('Why, and what against: U31 chip'));
    await user.click(control('Show U31'));
    const dialog = within(screen.getByRole('dialog', { name: 'U31' }));
    expect(dialog.getByText(/Bit 5 of bank C\. It did not answer\./)).toBeInTheDocument();
    expect(dialog.getByText('C5')).toBeInTheDocument();
    expect(dialog.getByText(/Suspected with 9\d %/)).toBeInTheDocument();
  });

  it('stands in three columns on a wide window, all of it at once', () => {
    setDevice({ width: 1440 });
    showWorkspace(loom, { r: '1~c.lamp.C5' });
    for (const name of ['Runs', 'Board']) expect(screen.getByRole('region', { name })).toBeInTheDocument();
    expect(screen.getAllByText('U31').length).toBeGreaterThan(1);
    expect(screen.getByText('Suspects')).toBeInTheDocument();
  });
});
