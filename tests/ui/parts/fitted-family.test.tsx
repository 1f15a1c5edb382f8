import { screen, within } from '@testing-library/react';
import { useEffect, useState } from 'react';
import { changesOf, type ChangeDraft } from '@/components/features/diagnose/runs/change-draft';
import { ChangePanel } from '@/components/features/diagnose/runs/change-panel';
import type { LayoutDocument } from '@/shared';
import { demoDocument } from '@/tests/ui/support/boards';
import { renderPage } from '@/tests/ui/support/render';
import { routes } from '@/tests/ui/support/router';
import { readyBench } from '../diagnose/ready-bench';

jest.mock('expo-router', () => jest.requireActual('@/tests/ui/support/router').routerDouble());

const said = jest.fn<void, [ChangeDraft]>();
const lastSaid = () => changesOf(said.mock.lastCall![0]);

function Panel({ document, start }: { document: LayoutDocument; start: ChangeDraft }) {
  const [draft, setDraft] = useState(start);
  useEffect(() => said(draft), [draft]);
  return (
    <ChangePanel
      bench={readyBench(document)}
      draft={draft}
      onDraft={setDraft}
      onDone={() => undefined}
      onCancel={() => undefined}
    />
  );
}

const yard = demoDocument('ferrow-hy-128-mod-6');
const show = (start: Partial<ChangeDraft> = {}, document = yard) =>
  renderPage(<Panel document={document} start={{ kind: 'known-good', sockets: ['', ''], ...start }} />);

beforeEach(() => {
  routes.params = {};
  said.mockReset();
});

test('the family of a fitted chip is asked once the socket is known', async () => {
  const { user } = show();
  expect(screen.queryByLabelText('Family of the chip')).not.toBeInTheDocument();
  await user.type(screen.getByLabelText('Socket'), '5F');
  const chooser = screen.getByLabelText('Family of the chip');
  expect(within(chooser).getAllByRole('option')[0]).toHaveTextContent(
    /^as the socket: 16K × 1 dynamic, three supplies/,
  );
  expect(lastSaid()).toEqual([{ kind: 'replace', socket: '5F', with: 'known-good' }]);
});

test('a chip that the socket would destroy is said to be so before it is pushed in', async () => {
  const { user } = show({ sockets: ['5F', ''] });
  await user.selectOptions(screen.getByLabelText('Family of the chip'), 'dynamic-64k-1');
  const note = within(screen.getByRole('alert'));
  expect(note.getByText('It would be destroyed.')).toBeVisible();
  expect(note.getByText('Pin 8 has +12 V; the chip wants +5 V there.')).toBeVisible();
  expect(note.getByText('Pin 8: isolate it from +12 V and join it to pin 9, which has +5 V.')).toBeVisible();
  expect(note.getByRole('link', { name: 'Pin by pin' })).toHaveAttribute(
    'href',
    '/parts?socket=dynamic-16k-1-three-rail&chip=dynamic-64k-1',
  );
  expect(lastSaid()).toEqual([{ kind: 'replace', socket: '5F', with: 'known-good', family: 'dynamic-64k-1' }]);
});

test('the rails that the layout states at the socket count before what its family wants', async () => {
  const rewired = {
    ...yard,
    rails: [
      { ...yard.rails[2]!, pins: [8, 9] },
      { name: '0 V', volts: 0, tolerancePercent: 10, pins: [1] },
    ],
  };
  const { user } = show({ sockets: ['5F', ''] }, rewired);
  await user.selectOptions(screen.getByLabelText('Family of the chip'), 'dynamic-64k-1');
  expect(screen.queryByText('It would be destroyed.')).not.toBeInTheDocument();
  expect(screen.getByText('It fits as it is.')).toBeVisible();
});

test('what was fitted can be put back to the family of the socket', async () => {
  const { user } = show({ kind: 'untested', sockets: ['5F', ''], family: 'dynamic-64k-1' });
  await user.selectOptions(screen.getByLabelText('Family of the chip'), '');
  expect(lastSaid()).toEqual([{ kind: 'replace', socket: '5F', with: 'untested' }]);
});

test('a swap asks for no family', () => {
  show({ kind: 'swap', sockets: ['5F', '6F'] });
  expect(screen.queryByLabelText('Family of the chip')).not.toBeInTheDocument();
});

test('a family that the layout describes itself can be chosen, and is compared as far as it is described', async () => {
  const terminal = demoDocument('rimstad-ct-7-rev-3');
  const label = terminal.sockets.find(({ family }) => family === terminal.families[0]!.id)!.label;
  const { user } = show({ sockets: [label, ''] }, terminal);
  await user.selectOptions(screen.getByLabelText('Family of the chip'), 'dynamic-16k-1-three-rail');
  expect(within(screen.getByRole('alert')).getByText('It would be destroyed.')).toBeVisible();
});
