export * from './layout/document';
export * from './layout/problem';
export * from './evidence';
export * from './diagnosis';
export { limits } from './limits';
