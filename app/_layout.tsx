import { Slot } from 'expo-router';
import { AppProviders } from '@/components/features/shell/app-providers';
import { PageCrashed } from '@/components/features/shell/page-crashed';
import { Shell } from '@/components/features/shell/shell';

export { PageCrashed as ErrorBoundary };

/** A page that throws leaves head and foot standing. */
export const unstable_settings = { screenErrorBoundary: PageCrashed };

export default function RootLayout() {
  return (
    <AppProviders>
      <Shell>
        <Slot />
      </Shell>
    </AppProviders>
  );
}
