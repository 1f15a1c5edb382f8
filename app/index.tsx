export { LookupScreen as default } from '@/components/features/lookup/lookup-screen';
