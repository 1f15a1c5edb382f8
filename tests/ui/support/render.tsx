import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactElement } from 'react';
import { createQueryClient } from '@/components/api/query-client';
import { ThemeProvider } from '@/components/theme';
import { AnnouncerProvider } from '@/components/ui/announcer';

/** Shows an element inside all that a page relies on, with a person at the keyboard. */
export function renderPage(element: ReactElement) {
  const queryClient = createQueryClient();
  const view = render(
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <AnnouncerProvider>{element}</AnnouncerProvider>
      </ThemeProvider>
    </QueryClientProvider>,
  );
  return { ...view, queryClient, user: userEvent.setup({ delay: null }) };
}
