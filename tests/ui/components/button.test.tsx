import { fireEvent, screen } from '@testing-library/react';
import { Button } from '@/components/ui/button';
import { renderPage } from '@/tests/ui/support/render';

test('a button answers to click, Enter and Space', async () => {
  const press = jest.fn();
  const { user } = renderPage(<Button label="Find the chip" onPress={press} />);
  const button = screen.getByRole('button', { name: 'Find the chip' });
  await user.click(button);
  button.focus();
  await user.keyboard('{Enter}');
  await user.keyboard(' ');
  expect(press).toHaveBeenCalledTimes(3);
});

test('a busy button keeps the focus, says that it is busy, and does nothing', async () => {
  const press = jest.fn();
  const { user } = renderPage(<Button label="Save" busy busyLabel="Saving…" onPress={press} />);
  const button = screen.getByRole('button', { name: 'Saving…' });
  await user.click(button);
  expect(press).not.toHaveBeenCalled();
  expect(button).toHaveAttribute('aria-busy', 'true');
  button.focus();
  expect(button).toHaveFocus();
});

test('a disabled button cannot be pressed', () => {
  const press = jest.fn();
  renderPage(<Button label="Save" disabled onPress={press} />);
  const button = screen.getByRole('button', { name: 'Save' });
  fireEvent.click(button);
  fireEvent.keyDown(button, { key: 'Enter' });
  expect(button).toBeDisabled();
  expect(press).not.toHaveBeenCalled();
});

test('a button drawn as an icon alone still has a name', () => {
  renderPage(<Button label="Turn the board" iconOnly icon={null} onPress={() => undefined} />);
  expect(screen.getByRole('button', { name: 'Turn the board' })).toBeInTheDocument();
});

test('a button that stays on says whether it is', () => {
  renderPage(<Button label="Solder side" pressed onPress={() => undefined} />);
  expect(screen.getByRole('button', { pressed: true })).toBeInTheDocument();
});

test('nothing that is pressed is smaller than 48 px', () => {
  renderPage(<Button label="A" onPress={() => undefined} />);
  const { minHeight, minWidth } = window.getComputedStyle(screen.getByRole('button'));
  expect([minHeight, minWidth]).toEqual(['48px', '48px']);
});
