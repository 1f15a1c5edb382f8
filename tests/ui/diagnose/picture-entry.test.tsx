import { configure, fireEvent, screen } from '@testing-library/react';
import { benchOf } from '@/components/features/diagnose/bench';
import { PictureEntry } from '@/components/features/diagnose/picture/picture-entry';
import { lanesOfMarks, lanesWords, pictureOfChip } from '@/lib';
import { demoBoards } from '@/server/seeders/boards';
import { evidence, type LayoutDocument, layoutDocument, type Picture } from '@/shared';
import { buildLayout } from '@/tests/factories/layout';
import { setDevice } from '../support/device';
import { renderPage } from '../support/render';
import { control } from './find-control';

configure({ defaultHidden: true });

const display = layoutDocument.parse(demoBoards.find(({ slug }) => slug === 'penhallow-formset-2-pd-3')?.document);
const turned = layoutDocument.parse({ ...display, screenMap: { ...display.screenMap, turn: 1 } });

function show(document: LayoutDocument, before?: Picture) {
  const { index } = benchOf(document)!;
  const sent: Picture[] = [];
  const onClose = jest.fn();
  const page = renderPage(
    <PictureEntry index={index} onEvidence={(picture) => sent.push(picture)} onClose={onClose} before={before} />,
  );
  const failing = () =>
    lanesWords(
      index,
      lanesOfMarks(index, sent[0]!).failing.map(({ lane }) => lane),
    );
  const fill = async (label: string, value: string) => {
    const field = screen.getByLabelText(label, { selector: 'input' });
    await page.user.clear(field);
    await page.user.type(field, value);
  };
  const press = (name: string) => page.user.click(control(name));
  return { ...page, index, sent, onClose, failing, fill, press };
}

const glass = () => screen.getByRole('img', { name: /^The screen\./ });
/** A drag over the sketch, in px. The sketch is 358 by 268.5 px in these tests, the picture 1024 by 512 dots. */
function drag(from: readonly [number, number], to: readonly [number, number]) {
  const at = ([clientX, clientY]: readonly [number, number]) => ({ clientX, clientY, button: 0, buttons: 1 });
  fireEvent.mouseDown(glass(), at(from));
  fireEvent.mouseMove(glass(), at(to));
  fireEvent.mouseUp(glass(), { ...at(to), buttons: 0 });
}

beforeEach(() => setDevice({ width: 390 }));

describe('marking faults on the picture', () => {
  it('by figures and a colour gives the columns, the lines and the plane that is missing', async () => {
    const { sent, failing, fill, press } = show(display);
    await press('column 2');
    await fill('First line', '96');
    await fill('Last line', '191');
    await press('Lit dots are missing');
    await press('magenta');
    expect(
      screen.getByText('Every eighth column from column 2, lines 96 to 191, magenta in place of white.'),
    ).toBeInTheDocument();
    expect(screen.getByText('That is bit 2 of bank TYPE.')).toBeInTheDocument();
    await press('Use this picture');
    expect(sent).toEqual([
      {
        kind: 'picture',
        rest: 'right',
        marks: [{ looks: 'missing', planes: ['type'], x: [2, 2], everyX: 8, y: [96, 191] }],
      },
    ]);
    expect(evidence.safeParse(sent[0]).success).toBe(true);
    expect(failing()).toBe('bit 2 of bank TYPE');
  });

  it('asks for the colour before a picture of several planes can be used', async () => {
    const { press, sent } = show(display);
    expect(screen.getByText('Say which colour is wrong there.')).toBeInTheDocument();
    expect(control('Use this picture')).toHaveAttribute('aria-disabled', 'true');
    await press('grid, blue');
    expect(control('Use this picture')).not.toHaveAttribute('aria-disabled', 'true');
    expect(control('yellow')).toHaveAttribute('aria-checked', 'true');
    await press('rules, red');
    expect(control('green')).toHaveAttribute('aria-checked', 'true');
    await press('Use this picture');
    expect(sent[0]!.marks[0]!.planes).toEqual(['rules', 'grid']);
  });

  it('by a touch picks the column under the finger, and a way down the lines', async () => {
    const { press, sent } = show(display);
    await press('type, green');
    drag([181, 68], [181, 135]);
    await press('Use this picture');
    expect(sent[0]!.marks).toEqual([{ looks: 'wrong', planes: ['type'], x: [5, 5], everyX: 8, y: [129, 257] }]);
  });

  it('by a touch marks a band of lines, and a box of dots', async () => {
    const { press, sent } = show(display);
    await press('type, green');
    await press('A band of lines');
    drag([20, 135], [300, 202]);
    await press('Another mark');
    await press('Dots');
    drag([179, 135], [90, 68]);
    await press('Use this picture');
    expect(sent[0]!.marks).toEqual([
      { looks: 'wrong', planes: ['type'], x: [0, 1023], y: [257, 385] },
      { looks: 'wrong', planes: ['type'], x: [257, 512], y: [129, 257] },
    ]);
  });

  it('on a tube that stands on its side is in the lines that the eye sees, and in the columns of the memory', async () => {
    const { press, sent, failing } = show(turned);
    await press('rules, red');
    await press('A band of lines');
    await press('line 5');
    expect(screen.getByText(/^Every eighth line from line 5, wrong in rules\.$/)).toBeInTheDocument();
    await press('Use this picture');
    expect(sent[0]!.marks).toEqual([{ looks: 'wrong', planes: ['rules'], x: [5, 5], everyX: 8, y: [0, 511] }]);
    expect(failing()).toBe('bit 5 of bank RULE');
  });

  it('takes marks out again, and says when the rest was not looked at', async () => {
    const { press, sent } = show(display);
    await press('type, green');
    await press('Another mark');
    await press('column 6');
    await press('Take mark 2 out');
    await press('The rest of the picture is right');
    await press('Use this picture');
    expect(sent[0]).toMatchObject({ rest: 'unknown', marks: [{ x: [0, 0] }] });
    expect(sent[0]!.marks).toHaveLength(1);
  });

  it('refuses a figure outside the picture, and says what is possible', async () => {
    const { fill, press, sent } = show(display);
    await press('type, green');
    await fill('Last line', '512');
    expect(screen.getByText('A whole number from 0 to 511.')).toBeInTheDocument();
    await press('Use this picture');
    expect(sent[0]!.marks[0]!.y[1]).toBeLessThanOrEqual(511);
  });

  it('can be left without a mark', async () => {
    const { press, sent, onClose } = show(display);
    await press('Cancel');
    expect(onClose).toHaveBeenCalledTimes(1);
    expect(sent).toEqual([]);
  });

  it('begins with the marks of a picture that is changed, and gives them back as they were', async () => {
    for (const document of [display, turned]) {
      const { index } = benchOf(document)!;
      const { marks } = pictureOfChip(index, { socket: index.socketByLabel.get('N37')! })!;
      const before: Picture = { kind: 'picture', rest: 'right', marks: [...marks] };
      const { sent, press, unmount } = show(document, before);
      await press('Use this picture');
      expect(sent).toEqual([before]);
      unmount();
    }
  });

  it('is not offered where nobody knows how the board keeps its picture', () => {
    show(buildLayout());
    expect(screen.getByText('It is not known how this board keeps its picture.')).toBeInTheDocument();
  });
});
