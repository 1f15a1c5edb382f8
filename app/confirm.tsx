import { lazyScreen } from '@/components/ui/lazy-screen';

export default lazyScreen(
  () => import('@/components/features/account/screens'),
  (screens) => screens.ConfirmScreen,
);
