import { TextDecoder } from 'node:util';
import { act, screen, waitFor, within } from '@testing-library/react';
import { LogImport } from '@/components/features/diagnose/logs/log-import';
import { openLogWorker } from '@/components/features/diagnose/logs/log-worker';
import type { LogMessage, LogTask } from '@/components/features/diagnose/logs/log-task';
import { buildLayoutIndex } from '@/lib';
import { evidence as evidenceSchema, type LogEvidence } from '@/shared';
import { buildLayout } from '../../../factories/layout';
import { renderPage } from '../../support/render';

// Jest has no bundler that makes a worker's file; what the worker runs is tested through the other way.
jest.mock('@/components/features/diagnose/logs/log-worker', () => ({ openLogWorker: jest.fn(() => null) }));
const worker = openLogWorker as jest.MockedFunction<typeof openLogWorker>;

// Browsers have it; jsdom does not. And jsdom's files can be cut, but not read.
beforeAll(() => {
  Object.assign(globalThis, { TextDecoder });
  Object.defineProperty(Blob.prototype, 'arrayBuffer', {
    configurable: true,
    value(this: Blob) {
      return new Promise((resolve, reject) => {
        const reader = new FileReader();
        reader.onload = () => resolve(reader.result);
        reader.onerror = () => reject(reader.error);
        reader.readAsArrayBuffer(this);
      });
    },
  });
});

const hex = (value: number, digits: number) => value.toString(16).toUpperCase().padStart(digits, '0');
const lines = (count: number) =>
  Array.from({ length: count }, (_, n) => `${hex(0x1000 + 2 * n, 5)} W 00 R 20\n`).join('');

/** A board of its own: an import outlives the page that shows it. */
function show(index = buildLayoutIndex(buildLayout({ banks: 2 }))) {
  const onEvidence = jest.fn<undefined, [LogEvidence]>();
  const onClose = jest.fn();
  const view = renderPage(<LogImport index={index} onEvidence={onEvidence} onClose={onClose} />);
  const choose = (text: string | Uint8Array, name = 'night.log') =>
    view.user.upload(screen.getByLabelText('Log as a file'), new File([text as BlobPart], name));
  const press = (name: string | RegExp) => view.user.click(screen.getByRole('button', { name }));
  return { ...view, index, onEvidence, onClose, choose, press };
}

it('leads a log file through its pattern and its summary to one piece of evidence', async () => {
  const { choose, press, onEvidence } = show();
  await choose(`${lines(300)}the end\n`);
  expect(
    await screen.findByRole('radio', { name: /^Address word 1, written after W, read after R; hex/ }),
  ).toBeChecked();
  const meanings = screen.getByRole('list', { name: 'What its first lines mean' });
  expect(within(meanings).getAllByText(/Bit 5 of bank A/).length).toBeGreaterThan(0);
  await press('Read the log');
  expect(await screen.findByText('One bit failed.')).toBeInTheDocument();
  expect(screen.getByText(/^301 lines; 300 readings, 300 of them wrong; 1 line not read/)).toBeInTheDocument();
  const row = screen.getByText('Bit 5 of bank A').closest('[role="row"], [role="listitem"]') as HTMLElement;
  expect(row).toHaveTextContent('U15');
  expect(row).toHaveTextContent('reads 1');
  expect(screen.getByText(/Line 301/)).toBeInTheDocument();
  await press('Use this log');
  const [seen] = onEvidence.mock.calls[0]!;
  expect(evidenceSchema.parse(seen)).toMatchObject({
    ...{ kind: 'log', name: 'night.log', lines: 301, readings: 300, unread: 1, outside: 0, rest: 'unknown' },
    lanes: [{ bank: 'A', bit: 5, readsOne: 300, readsZero: 0, words: 300, first: 1, last: 300 }],
  });
});

it('reads pasted lines the same way, and keeps that all else passed', async () => {
  const { user, press, onEvidence } = show();
  await user.click(screen.getByLabelText('Or paste lines of it'));
  await user.paste('10001 W FF R FE\n10003 W FF R FE');
  await press('Take these lines');
  await user.click(await screen.findByRole('button', { name: 'All else was tested and passed' }));
  await press('Read the log');
  await press(await screen.findByText('Use this log').then(() => 'Use this log'));
  expect(onEvidence.mock.calls[0]![0]).toMatchObject({
    name: 'Pasted lines',
    rest: 'passed',
    lanes: [{ bank: 'B', bit: 0, readsOne: 0, readsZero: 2, words: 2 }],
  });
});

it('takes a file that is dropped on it', async () => {
  show();
  const area = screen.getByText('A file of the memory test').parentElement!.parentElement!;
  const event = new Event('drop', { bubbles: true, cancelable: true });
  Object.assign(event, { dataTransfer: { files: [new File([lines(4)], 'dropped.txt')] } });
  act(() => void area.dispatchEvent(event));
  expect(await screen.findByText(/^dropped.txt, /)).toBeInTheDocument();
  expect(event.defaultPrevented).toBe(true);
});

it('says what is wrong with an empty file, and with one that is no text', async () => {
  const { choose } = show();
  await choose('', 'nothing.log');
  expect(screen.getByRole('alert')).toHaveTextContent('nothing.log is empty.');
  await choose('no numbers here\n', 'letter.txt');
  expect(await screen.findByText(/No line looks like an address/)).toBeInTheDocument();
  expect(screen.getByRole('button', { name: 'Read the log' })).toHaveAttribute('aria-disabled', 'true');
});

it('lets the words of a line be pointed at, and shows at once what they come to', async () => {
  const { choose, user, press, onEvidence } = show();
  await choose('at 0 cell 10A02 got 7F good value FF x\n'.repeat(3).replaceAll('good', 'u').replaceAll('got', 'v'));
  await user.click(await screen.findByRole('radio', { name: /^I point at the words/ }));
  await user.selectOptions(screen.getByLabelText('The address is'), 'word 4: 10A02');
  await user.selectOptions(screen.getByLabelText('What was read is'), 'word 6: 7F');
  await user.selectOptions(screen.getByLabelText('What was written is'), 'word 9: FF');
  await user.selectOptions(screen.getByLabelText('The failing bits are'), 'not in the line');
  const meanings = screen.getByRole('list', { name: 'What its first lines mean' });
  expect(within(meanings).getAllByText(/Bit 7 of bank B/)).toHaveLength(3);
  await press('Read the log');
  await user.click(await screen.findByRole('button', { name: 'Use this log' }));
  expect(onEvidence.mock.calls[0]![0].lanes).toMatchObject([{ bank: 'B', bit: 7, readsZero: 3 }]);
});

it('names the nearest window for lines outside the memory, and offers no use of a log that is all outside', async () => {
  const { choose, press } = show();
  await choose('F0000 W 00 R 01\nF0001 W 00 R 01\n');
  await press(await screen.findByText('Read the log').then(() => 'Read the log'));
  expect(await screen.findByText("No reading lies in this board's memory.")).toBeInTheDocument();
  const outside = screen.getByRole('list', { name: "Outside this board's memory" });
  expect(outside).toHaveTextContent(
    "Line 1: F0000 lies outside this board's memory; the nearest window is 10000 to 1FFFF.",
  );
  expect(screen.getByRole('button', { name: 'Use this log' })).toHaveAttribute('aria-disabled', 'true');
});

it('is put away without a log', async () => {
  const { press, onClose, onEvidence } = show();
  await press('Close without a log');
  expect(onClose).toHaveBeenCalledTimes(1);
  expect(onEvidence).not.toHaveBeenCalled();
});

describe('with a worker', () => {
  class FakeWorker {
    onmessage: ((event: { data: LogMessage }) => void) | null = null;
    onerror: (() => void) | null = null;
    task: LogTask | null = null;
    terminated = false;
    postMessage(task: LogTask) {
      this.task = task;
    }
    terminate() {
      this.terminated = true;
    }
  }
  const counts = { bytes: 0, lines: 1_500_000, readings: 1_499_000, failing: 0, unread: 1000, blank: 0, outside: 0 };
  const progress = { read: 40_000_000, total: 80_000_000, counts, seconds: 0.5 };

  async function begun() {
    const fake = new FakeWorker();
    worker.mockReturnValueOnce(fake as unknown as Worker);
    const view = show();
    await view.choose(lines(10));
    await view.press(await screen.findByText('Read the log').then(() => 'Read the log'));
    expect(fake.task).toMatchObject({ name: 'night.log', rest: 'unknown', pattern: { address: 1 } });
    return { fake, ...view };
  }

  it('shows how far it is: bytes, lines, lines a second', async () => {
    const { fake } = await begun();
    act(() => fake.onmessage?.({ data: { kind: 'progress', progress } }));
    expect(screen.getByRole('progressbar')).toHaveAttribute('aria-valuenow', '50');
    expect(
      screen.getByText(/^40\.0 MB of 80\.0 MB; 1.500.000 lines, 1.000 not read; 3\.0 million lines a second$/),
    ).toBeInTheDocument();
    expect(screen.queryByText(/cannot read it in the background/)).not.toBeInTheDocument();
  });

  it('can be stopped, and listens to the stopped worker no more', async () => {
    const { fake, press } = await begun();
    await press('Stop reading');
    expect(fake.terminated).toBe(true);
    expect(screen.getByRole('button', { name: 'Read the log' })).toBeInTheDocument();
    act(() => fake.onmessage?.({ data: { kind: 'progress', progress } }));
    expect(screen.queryByRole('progressbar')).not.toBeInTheDocument();
  });

  it('goes on while the page is built anew, as when a phone is turned', async () => {
    const { fake, unmount, index } = await begun();
    unmount();
    expect(fake.terminated).toBe(false);
    show(index);
    act(() => fake.onmessage?.({ data: { kind: 'progress', progress } }));
    expect(screen.getByRole('progressbar')).toHaveAttribute('aria-valuenow', '50');
    expect(fake.terminated).toBe(false);
  });

  it('is stopped where nobody looks at it any more', async () => {
    const { fake, unmount } = await begun();
    unmount();
    await waitFor(() => expect(fake.terminated).toBe(true), { timeout: 5000 });
  });

  it('says why it failed, and goes on without the worker where its file could not be loaded', async () => {
    const { fake } = await begun();
    act(() => fake.onmessage?.({ data: { kind: 'failed', reason: 'The file is packed, and its packing is broken.' } }));
    expect(screen.getByRole('alert')).toHaveTextContent('night.log: The file is packed, and its packing is broken.');
    const second = await begunAgain();
    act(() => second.onerror?.());
    expect(await screen.findByText('One bit failed.')).toBeInTheDocument();

    async function begunAgain() {
      const next = new FakeWorker();
      worker.mockReturnValueOnce(next as unknown as Worker);
      const file = new File([lines(10)], 'again.log');
      const input = screen.getByLabelText('Log as a file');
      await act(async () => {
        Object.defineProperty(input, 'files', { configurable: true, value: [file] });
        input.dispatchEvent(new Event('change', { bubbles: true }));
      });
      const read = await screen.findByRole('button', { name: 'Read the log' });
      act(() => read.click());
      await waitFor(() => expect(next.task).not.toBeNull());
      return next;
    }
  });
});
