import { lazy, Suspense, type ComponentType } from 'react';
import { Loading } from './states';
import { Page } from './page';

/**
 * A screen whose code is loaded when it is first shown, for route files:
 * `export default lazyScreen(() => import('…/screens'), (screens) => screens.SignInScreen)`.
 *
 * The bundler puts whatever two route files share into the file of the first load. Screens that share something
 * heavy (schemas, forms, the engine) are therefore exported from one module and shown through this.
 */
export function lazyScreen<Module>(
  load: () => Promise<Module>,
  pick: (module: Module) => ComponentType,
): ComponentType {
  const Screen = lazy(async () => ({ default: pick(await load()) }));
  return function LazyScreen() {
    return (
      <Suspense
        fallback={
          <Page title="" hideTitle>
            <Loading />
          </Page>
        }
      >
        <Screen />
      </Suspense>
    );
  };
}
