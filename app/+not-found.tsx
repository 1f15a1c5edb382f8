export { NotFoundScreen as default } from '@/components/features/shell/not-found-screen';
