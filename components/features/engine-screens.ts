/**
 * The screens that need the engine and the schemas. They are loaded together, when the first of them is shown:
 * whatever two route files shared would be put into the first load of every page.
 */
export { DiagnoseScreen } from './diagnose/diagnose-screen';
