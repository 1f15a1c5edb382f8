// One module for all screens with forms, so that forms and schemas are loaded with them and not before.
export { PeopleScreen } from '@/components/features/admin/people-screen';
export { AccountScreen } from './account-screen';
export { ConfirmScreen } from './confirm-screen';
export { ResetScreen } from './reset-screen';
export { SignInScreen } from './sign-in-screen';
export { SignUpScreen } from './sign-up-screen';
