import { usePathname } from 'expo-router';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/states';
import { Page } from '@/components/ui/page';
import { Text } from '@/components/ui/text';

/** Nobody answers at this address. */
export function NotFoundScreen() {
  const pathname = usePathname();
  return (
    <Page title="Nobody answers here" width="prose">
      <EmptyState
        title="There is no page at this address."
        action={
          <>
            <ButtonLink href="/" kind="primary" label="Look up a failure" />
            <ButtonLink href="/boards" label="All boards" />
          </>
        }
      >
        <Text variant="mono" tone="soft" numberOfLines={3}>
          {pathname}
        </Text>
      </EmptyState>
    </Page>
  );
}
