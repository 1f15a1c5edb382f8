import { act, screen } from '@testing-library/react';
import { Text } from '@/components/ui/text';
import { Notice } from '@/components/ui/notice';
import { EmptyState, ErrorState, Loading } from '@/components/ui/states';
import { renderPage } from '@/tests/ui/support/render';

test('an error is read out at once and offers the way to try again', async () => {
  const retry = jest.fn();
  const { user } = renderPage(
    <ErrorState title="The list could not be loaded." onRetry={retry}>
      The server cannot be reached.
    </ErrorState>,
  );
  expect(screen.getByRole('alert')).toHaveTextContent('The server cannot be reached.');
  await user.click(screen.getByRole('button', { name: 'Try again' }));
  expect(retry).toHaveBeenCalledTimes(1);
});

test('what loads within a quarter of a second shows no loading state', () => {
  jest.useFakeTimers();
  try {
    renderPage(<Loading label="Loading boards" />);
    act(() => jest.advanceTimersByTime(200));
    expect(screen.queryByText('Loading boards…')).not.toBeInTheDocument();
    act(() => jest.advanceTimersByTime(100));
    expect(screen.getByText('Loading boards…')).toBeInTheDocument();
  } finally {
    jest.useRealTimers();
  }
});

test('an empty state says why, without raising its voice', () => {
  renderPage(<EmptyState title="No board answers to that.">Try the maker.</EmptyState>);
  expect(screen.getByText('Try the maker.')).toBeVisible();
  expect(screen.queryByRole('alert')).not.toBeInTheDocument();
});

test('a notice is read out only where it answers something the person did', () => {
  renderPage(
    <>
      <Notice title="Always here" />
      <Notice title="Saved" live kind="good" />
      <Notice title="Not saved" live kind="problem" />
    </>,
  );
  expect(screen.getByRole('note')).toHaveTextContent('Always here');
  expect(screen.getByRole('alert')).toHaveTextContent('Not saved');
});

test('titles are headings of their level, other words are none', () => {
  renderPage(
    <>
      <Text variant="title">Boards</Text>
      <Text variant="heading">Sources</Text>
      <Text variant="heading" level={3}>
        Under it
      </Text>
      <Text variant="heading" level={null}>
        Only large
      </Text>
    </>,
  );
  expect(screen.getByRole('heading', { level: 1, name: 'Boards' })).toBeInTheDocument();
  expect(screen.getByRole('heading', { level: 2, name: 'Sources' })).toBeInTheDocument();
  expect(screen.getByRole('heading', { level: 3, name: 'Under it' })).toBeInTheDocument();
  expect(screen.queryByRole('heading', { name: 'Only large' })).not.toBeInTheDocument();
});
