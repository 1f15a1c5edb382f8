import { act, screen } from '@testing-library/react';
import { Button } from '@/components/ui/button';
import { useAnnouncer } from '@/components/ui/announcer';
import { renderPage } from '@/tests/ui/support/render';

function Speaker({ undo }: { undo?: () => void }) {
  const { toast } = useAnnouncer();
  return (
    <Button
      label="Remove"
      onPress={() => toast({ text: 'Run 2 removed.', action: undo && { label: 'Undo', onPress: undo } })}
    />
  );
}

test('a toast is said as a status, and leaves by itself', async () => {
  jest.useFakeTimers();
  try {
    renderPage(<Speaker />);
    act(() => screen.getByRole('button', { name: 'Remove' }).click());
    expect(screen.getByText('Run 2 removed.').closest('[role="status"]')).not.toBeNull();
    act(() => jest.advanceTimersByTime(10_000));
    expect(screen.queryByText('Run 2 removed.')).not.toBeInTheDocument();
  } finally {
    jest.useRealTimers();
  }
});

test('a toast that can be undone waits for the person', async () => {
  jest.useFakeTimers();
  const undo = jest.fn();
  try {
    renderPage(<Speaker undo={undo} />);
    act(() => screen.getByRole('button', { name: 'Remove' }).click());
    act(() => jest.advanceTimersByTime(60_000));
    act(() => screen.getByRole('button', { name: 'Undo' }).click());
    expect(undo).toHaveBeenCalledTimes(1);
    expect(screen.queryByText('Run 2 removed.')).not.toBeInTheDocument();
  } finally {
    jest.useRealTimers();
  }
});
