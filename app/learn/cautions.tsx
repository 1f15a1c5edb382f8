export { CautionsScreen as default } from '@/components/features/cautions/cautions-screen';
