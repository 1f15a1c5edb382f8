import { NotFoundScreen } from '@/components/features/shell/not-found-screen';
import { lazyScreen } from '@/components/ui/lazy-screen';

// For developers: the primitives in every state. The condition is folded at build time, so that a production build
// holds neither the page nor what only it uses.
const Route =
  __DEV__ || process.env.EXPO_PUBLIC_GALLERY === '1'
    ? lazyScreen(
        () => import('@/components/features/gallery/gallery-screen'),
        (gallery) => gallery.GalleryScreen,
      )
    : NotFoundScreen;

export default Route;
