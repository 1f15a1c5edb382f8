import { QueryClientProvider } from '@tanstack/react-query';
import { useEffect, useState, type ReactNode } from 'react';
import { createQueryClient } from '@/components/api/query-client';
import { loadFonts, ThemeProvider } from '@/components/theme';
import { AnnouncerProvider } from '@/components/ui/announcer';

/** Everything that the pages rely on: the store of server data, the theme, the voice. */
export function AppProviders({ children }: { children: ReactNode }) {
  const [queryClient] = useState(createQueryClient);
  useEffect(() => {
    void loadFonts();
  }, []);
  return (
    <QueryClientProvider client={queryClient}>
      <ThemeProvider>
        <AnnouncerProvider>{children}</AnnouncerProvider>
      </ThemeProvider>
    </QueryClientProvider>
  );
}
