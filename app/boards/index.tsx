export { LibraryScreen as default } from '@/components/features/boards/library-screen';
