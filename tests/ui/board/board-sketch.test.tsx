import { act, fireEvent, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import '@testing-library/jest-dom';
import { BoardSketch, type BoardSketchProps } from '@/components/board/board-sketch';
import { noMarks, type PickTarget, type SketchMarks, type SketchView } from '@/components/board/sketch-types';
import { initialSketchView } from '@/components/board/use-sketch-view';
import type { LayoutIndex } from '@/lib/layout/layout-index';
import { board, boardOf } from './boards';

const loom = board('tarnvall-t-64-rev-b');

const answer: SketchMarks = {
  sockets: new Map([
    ['U30', { state: 'passed' }],
    ['U31', { state: 'failed', rank: 1 }],
    ['U32', { state: 'untested' }],
    ['U33', { state: 'mixed', note: 'once in three runs' }],
  ]),
  sharedParts: new Map([['U52', { rank: 3, state: 'suspect' }]]),
};

type Options = { index?: LayoutIndex; view?: Partial<SketchView> } & Partial<Omit<BoardSketchProps, 'view' | 'index'>>;

/** A sketch that keeps its own view and choice, as a screen does. */
function Held({ index = loom, view: from, ...props }: Options) {
  const [view, setView] = useState<SketchView>({ ...initialSketchView(index), ...from });
  const [picked, setPicked] = useState<PickTarget | null>(null);
  return (
    <BoardSketch
      index={index}
      marks={answer}
      view={view}
      onView={setView}
      onPick={setPicked}
      picked={picked}
      {...props}
    />
  );
}

function show(options: Options = {}) {
  const user = userEvent.setup();
  render(<Held {...options} />);
  return { user };
}

// Queries by role compute the style of every element each time, which a board of many sockets makes too slow.
const all = (selector: string) => Array.from(document.querySelectorAll<HTMLElement>(selector));
const only = (found: HTMLElement[]) => {
  expect(found).toHaveLength(1);
  return found[0]!;
};
const sketch = () => only(all('[role="listbox"]'));
/** The socket or part whose spoken name begins so. */
const option = (name: string) => only(all(`[role="option"][aria-label^="${name}"]`));
const buttons = () => all('button');
const button = (name: string) =>
  only(buttons().filter((element) => (element.getAttribute('aria-label') ?? element.textContent) === name));
const focus = () => act(() => sketch().focus());
const activeName = () =>
  document.getElementById(sketch().getAttribute('aria-activedescendant') ?? '')?.getAttribute('aria-label');

describe('what is heard of the sketch', () => {
  test('every socket and shared part is named with what it holds and what is known of it', () => {
    show();
    expect(option('U31, bit 5 of bank C, did not answer, suspect 1')).toBeInTheDocument();
    expect(option('U30, bit 4 of bank C, answered')).toBeInTheDocument();
    expect(option('U32, bit 6 of bank C, not tested')).toBeInTheDocument();
    expect(option('U33, bit 7 of bank C, failed and answered, once in three runs')).toBeInTheDocument();
    expect(option('U52, data buffer, bits 4 to 7, shared part, suspect 3')).toBeInTheDocument();
    expect(all('[role="option"]')).toHaveLength(38);
  });

  test('a label that was cut short is whole in its title and its name', () => {
    const index = boardOf({ banks: 16, bits: 16 });
    show({ index, marks: noMarks });
    expect(option('U265,').querySelector('title')).toHaveTextContent('U265, bit 15 of bank P');
  });

  test('the sketch has the name that its screen gives it', () => {
    show({ label: 'Where U31 is' });
    expect(sketch()).toHaveAccessibleName('Where U31 is');
  });
});

describe('the legend', () => {
  const legend = () => within(screen.getByRole('list', { name: 'What the marks mean' }));

  test('explains the marks that are on the sketch, and no other', () => {
    show();
    expect(legend().getByText('ring and hatching: did not answer')).toBeInTheDocument();
    expect(legend().getByText('long dashes: shared part')).toBeInTheDocument();
    expect(legend().queryByText(/possible/)).toBeNull();
    expect(legend().queryByText(/chosen/)).toBeNull();
  });

  test('is left out of a compact sketch, together with the words about the side', () => {
    show({ compact: true, showControls: false });
    expect(screen.queryByRole('list')).toBeNull();
    expect(screen.queryByText(/Component side/)).toBeNull();
  });

  test('a compact sketch says which side is up once it does not lie as drawn', () => {
    show({ compact: true, showControls: false, view: { turn: 1 } });
    expect(screen.getByText('Component side, loom harness plug at the left')).toBeInTheDocument();
  });
});

describe('turn and side', () => {
  test('the words follow the buttons', async () => {
    const { user } = show();
    expect(screen.getByText('Component side, loom harness plug at the bottom')).toBeInTheDocument();
    await user.click(button('Turn'));
    expect(screen.getByText('Component side, loom harness plug at the left')).toBeInTheDocument();
    await user.click(button('Solder side'));
    expect(screen.getByText('Solder side, loom harness plug at the left')).toBeInTheDocument();
    expect(button('Solder side')).toHaveAttribute('aria-pressed', 'true');
  });

  test('four turns draw the same sketch again', async () => {
    const { user } = show();
    const before = sketch().innerHTML;
    for (let n = 0; n < 4; n++) await user.click(button('Turn'));
    expect(sketch().innerHTML).toBe(before);
    await user.click(button('Turn'));
    expect(sketch().innerHTML).not.toBe(before);
  });

  test('a board that was drawn from its solder side starts there', () => {
    show({ index: board('hallebro-sx-40-04'), marks: noMarks });
    expect(screen.getByText('Solder side, ribbon to the synthesiser at the right')).toBeInTheDocument();
  });
});

describe('picking', () => {
  test('a tap on a socket picks it', async () => {
    const onPick = jest.fn();
    const { user } = show({ onPick });
    await user.click(option('U12,'));
    expect(onPick).toHaveBeenCalledWith({ kind: 'socket', label: 'U12' });
  });

  test('a tap beside a socket picks the nearest, and one far from all picks nothing', () => {
    const onPick = jest.fn();
    show({ onPick });
    const place = option('U31,')
      .getAttribute('transform')!
      .match(/[\d.]+/g)!
      .map(Number);
    fireEvent.click(sketch(), { clientX: place[0], clientY: place[1]! + 2 });
    expect(onPick).toHaveBeenLastCalledWith({ kind: 'socket', label: 'U31' });
    fireEvent.click(sketch(), { clientX: 5000, clientY: 5000 });
    expect(onPick).toHaveBeenCalledTimes(1);
  });

  test('a shared part is picked like a socket', async () => {
    const onPick = jest.fn();
    const { user } = show({ onPick });
    await user.click(option('U52,'));
    expect(onPick).toHaveBeenCalledWith({ kind: 'shared-part', label: 'U52' });
  });

  test('what is picked is said and explained', async () => {
    const { user } = show();
    await user.click(option('U12,'));
    expect(option('U12,')).toHaveAttribute('aria-selected', 'true');
    expect(option('U13,')).toHaveAttribute('aria-selected', 'false');
    expect(screen.getByText('double line: chosen')).toBeInTheDocument();
  });

  test('a tap on a socket that is too small comes closer', async () => {
    const onView = jest.fn();
    const index = boardOf({ banks: 16, bits: 16 });
    const { user } = show({ index, marks: noMarks, onView });
    await user.click(option('U99,'));
    expect(onView).toHaveBeenCalledWith(expect.objectContaining({ zoom: expect.any(Number) }));
  });
});

describe('the keyboard', () => {
  test('starts at the suspect, in one stop', async () => {
    const { user } = show();
    for (let n = 0; n < 4; n++) await user.tab();
    expect(sketch()).toHaveFocus();
    expect(activeName()).toMatch(/^U31,/);
  });

  test('walks by the arrow keys in the view that is seen', async () => {
    const { user } = show();
    focus();
    await user.keyboard('{ArrowRight}');
    expect(activeName()).toMatch(/^U32,/);
    await user.keyboard('{ArrowUp}');
    expect(activeName()).toMatch(/^U24,/);
    await user.keyboard('{Home}');
    expect(activeName()).toMatch(/^U10,/);
    await user.keyboard('{End}');
    expect(activeName()).toMatch(/^VR3,/);
  });

  test('an arrow to the right goes the other way on the solder side', async () => {
    const { user } = show({ view: { solderSide: true } });
    focus();
    await user.keyboard('{ArrowRight}');
    expect(activeName()).toMatch(/^U30,/);
  });

  test('Enter and Space pick where one is', async () => {
    const onPick = jest.fn();
    const { user } = show({ onPick });
    focus();
    await user.keyboard('{ArrowRight}{Enter}');
    expect(onPick).toHaveBeenLastCalledWith({ kind: 'socket', label: 'U32' });
    await user.keyboard('{ArrowLeft} ');
    expect(onPick).toHaveBeenLastCalledWith({ kind: 'socket', label: 'U31' });
  });

  test('plus, nought and t zoom in, zoom out and turn', async () => {
    const onView = jest.fn();
    const { user } = show({ onView });
    focus();
    await user.keyboard('+');
    expect(onView).toHaveBeenLastCalledWith(expect.objectContaining({ zoom: 1.5 }));
    await user.keyboard('t');
    expect(onView).toHaveBeenLastCalledWith(expect.objectContaining({ turn: 1 }));
    onView.mockClear();
    await user.keyboard('0');
    expect(onView).not.toHaveBeenCalled();
  });

  test('keys that mean the browser or nothing are left alone', () => {
    show();
    focus();
    expect(fireEvent.keyDown(sketch(), { key: 'x' })).toBe(true);
    expect(fireEvent.keyDown(sketch(), { key: '+', ctrlKey: true })).toBe(true);
    expect(fireEvent.keyDown(sketch(), { key: 'ArrowLeft' })).toBe(false);
  });
});

describe('zoom', () => {
  test('goes in, to the suspect and back to the whole board', async () => {
    const { user } = show();
    expect(button('Zoom out')).toHaveAttribute('aria-disabled', 'true');
    await user.click(button('To the suspect'));
    const close = sketch().querySelector('svg')!.getAttribute('width');
    await user.click(button('Whole board'));
    expect(Number(close)).toBeGreaterThan(Number(sketch().querySelector('svg')!.getAttribute('width')));
    expect(button('Whole board')).toHaveAttribute('aria-disabled', 'true');
  });

  test('there is no way to the suspect where there is none', () => {
    show({ marks: noMarks });
    expect(button('To the suspect')).toHaveAttribute('aria-disabled', 'true');
  });
});

describe('the table', () => {
  test('says the same as the sketch, the suspects first, and picks the same', async () => {
    const onPick = jest.fn();
    const { user } = show({ onPick });
    await user.click(button('Table'));
    expect(all('[role="listbox"]')).toEqual([]);
    const labels = buttons().flatMap(({ textContent }) => (/^(U|VR)\d+$/.test(textContent) ? [textContent] : []));
    expect(labels).toHaveLength(38);
    expect(labels.slice(0, 3)).toEqual(['U31', 'U52', 'U10']);
    expect(screen.getByText('Bit 5 of bank C')).toBeInTheDocument();
    expect(screen.getByText('Did not answer')).toBeInTheDocument();
    expect(screen.getByText('Failed and answered, once in three runs')).toBeInTheDocument();
    await user.click(button('U31'));
    expect(onPick).toHaveBeenCalledWith({ kind: 'socket', label: 'U31' });
  });

  test('of a large board is shown in parts', async () => {
    const sockets = () => buttons().filter(({ textContent }) => /^U\d+$/.test(textContent));
    const { user } = show({ index: boardOf({ banks: 16, bits: 16 }), marks: noMarks, view: { table: true } });
    expect(sockets()).toHaveLength(100);
    await user.click(only(buttons().filter(({ textContent }) => textContent.startsWith('Show all'))));
    expect(sockets()).toHaveLength(256);
  });
});

describe('on paper', () => {
  test('the sketch is whole, with its legend and without buttons, even where a table was shown', () => {
    show({ print: true, view: { zoom: 3, table: true } });
    expect(buttons()).toEqual([]);
    expect(screen.getByRole('list', { name: 'What the marks mean' })).toBeInTheDocument();
    expect(sketch().querySelector('svg')).toHaveAttribute('width', '100%');
  });
});

test('new marks draw again only the sockets of which something else is said', () => {
  const seen = jest.fn();
  const index = boardOf({ banks: 16, bits: 16 });
  const marksOf = (failed: string): SketchMarks => ({
    sockets: new Map(
      index.document.sockets.map(({ label }) => [label, { state: label === failed ? 'failed' : 'passed' }]),
    ),
    sharedParts: new Map(),
  });
  const view = initialSketchView(index);
  const { rerender, container } = render(
    <BoardSketch index={index} marks={marksOf('U40')} view={view} onView={seen} />,
  );
  const observer = new MutationObserver(() => undefined);
  for (const element of Array.from(container.querySelectorAll('[role="option"]')))
    observer.observe(element, { childList: true, subtree: true, attributes: true });
  rerender(<BoardSketch index={index} marks={marksOf('U41')} view={view} onView={seen} />);
  const touched = new Set(observer.takeRecords().map(({ target }) => (target as Element).closest('[role="option"]')));
  observer.disconnect();
  expect([...touched].map((element) => element?.getAttribute('aria-label')?.slice(0, 3)).sort()).toEqual([
    'U40',
    'U41',
  ]);
});
