import { NotFoundScreen } from '@/components/features/shell/not-found-screen';
import { lazyScreen } from '@/components/ui/lazy-screen';

// For developers: the primitives in every state. The condition is folded when the application is built, so that the
// product holds neither the page nor what only it uses.
const Route = __DEV__
  ? lazyScreen(
      () => import('@/components/features/gallery/gallery-screen'),
      (gallery) => gallery.GalleryScreen,
    )
  : NotFoundScreen;

export default Route;
