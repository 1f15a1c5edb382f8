import { lazyScreen } from '@/components/ui/lazy-screen';

export default lazyScreen(
  () => import('@/components/features/later-screens'),
  (screens) => screens.PartsScreen,
);
