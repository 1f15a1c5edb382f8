import type * as router from 'expo-router';

/** Where the page under test believes to be, and where it went. Use with `jest.mock('expo-router', …)`. */
export const routes = {
  params: {} as Record<string, string>,
  pathname: '/',
  replaced: [] as unknown[],
  pushed: [] as unknown[],
};

/** What stands in for expo-router: links are plain, the place is `routes`. */
export function routerDouble(): Partial<typeof router> {
  const real = jest.requireActual<typeof router>('expo-router');
  return {
    ...real,
    useLocalSearchParams: (() => routes.params) as unknown as typeof router.useLocalSearchParams,
    usePathname: () => routes.pathname,
    useRouter: () =>
      ({
        replace: (to: unknown) => routes.replaced.push(to),
        push: (to: unknown) => routes.pushed.push(to),
      }) as unknown as ReturnType<typeof router.useRouter>,
  };
}
