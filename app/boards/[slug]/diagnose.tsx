import { lazyScreen } from '@/components/ui/lazy-screen';

export default lazyScreen(
  () => import('@/components/features/engine-screens'),
  (screens) => screens.DiagnoseScreen,
);
