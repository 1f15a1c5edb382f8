import { screen } from '@testing-library/react';
import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import { renderPage } from '@/tests/ui/support/render';

test('a press on the label puts the focus in the field', async () => {
  const { user } = renderPage(<Field label="Board" />);
  await user.click(screen.getByText('Board'));
  expect(screen.getByRole('textbox', { name: 'Board' })).toHaveFocus();
});

test('hint and error are read with the field, the error first', () => {
  renderPage(<Field label="Code" hint="bank A to D, then bit 0 to 7" error="Bank E is not on this board." />);
  const field = screen.getByRole('textbox', { name: 'Code' });
  expect(field).toHaveAccessibleDescription('Bank E is not on this board. bank A to D, then bit 0 to 7');
  expect(field).toBeInvalid();
});

test('a field without an error is not marked as wrong', () => {
  renderPage(<Field label="Code" />);
  expect(screen.getByRole('textbox')).toBeValid();
});

test('Enter in any field submits its form', async () => {
  const submit = jest.fn();
  const { user } = renderPage(
    <Form label="Look up" onSubmit={submit}>
      <Field label="Board" />
      <Field label="Code" />
    </Form>,
  );
  await user.type(screen.getByRole('textbox', { name: 'Board' }), 'T-64{Enter}');
  expect(submit).toHaveBeenCalledTimes(1);
});
