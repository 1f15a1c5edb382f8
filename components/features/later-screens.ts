/**
 * The screens that need the engine, the schemas or forms. They come in one file, when the first of them is shown:
 * the bundler puts whatever two such files have in common into the first load of every page.
 */
export { AccountScreen } from './account/account-screen';
export { ConfirmScreen } from './account/confirm-screen';
export { ResetScreen } from './account/reset-screen';
export { SignInScreen } from './account/sign-in-screen';
export { SignUpScreen } from './account/sign-up-screen';
export { PeopleScreen } from './admin/people-screen';
export { BoardScreen } from './boards/board-screen';
export { ContributeScreen } from './contribute/contribute-screen';
export { DiagnoseScreen } from './diagnose/diagnose-screen';
export { PartsScreen } from './parts/parts-screen';
export { ReviewListScreen } from './review/review-list-screen';
export { ReviewScreen } from './review/review-screen';
