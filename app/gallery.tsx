import { NotFoundScreen } from '@/components/features/shell/not-found-screen';
import { lazyScreen } from '@/components/ui/lazy-screen';

const Gallery = lazyScreen(
  () => import('@/components/features/gallery/gallery-screen'),
  (gallery) => gallery.GalleryScreen,
);

/** For developers: the primitives in every state. A production build has no such page. */
export default function Route() {
  return __DEV__ || process.env.EXPO_PUBLIC_GALLERY === '1' ? <Gallery /> : <NotFoundScreen />;
}
