import { screen, waitFor } from '@testing-library/react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Text } from '@/components/ui/text';
import { renderPage } from '@/tests/ui/support/render';

function Removal() {
  const [open, setOpen] = useState(false);
  const close = () => setOpen(false);
  return (
    <>
      <Button label="Remove run 2" onPress={() => setOpen(true)} />
      <Dialog open={open} title="Remove run 2?" onClose={close} actions={<Button label="Remove" onPress={close} />}>
        <Text>Its readings go with it.</Text>
      </Dialog>
    </>
  );
}

test('a dialog takes the focus, keeps it, and gives it back when Escape closes it', async () => {
  const { user } = renderPage(<Removal />);
  const opener = screen.getByRole('button', { name: 'Remove run 2' });
  await user.click(opener);
  const dialog = await screen.findByRole('dialog', { name: 'Remove run 2?' });
  await waitFor(() => expect(dialog).toContainElement(document.activeElement as HTMLElement));
  for (let presses = 0; presses < 6; presses += 1) {
    await user.tab();
    expect(dialog.parentElement).toContainElement(document.activeElement as HTMLElement);
  }
  await user.keyboard('{Escape}');
  await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
  await waitFor(() => expect(opener).toHaveFocus());
});
