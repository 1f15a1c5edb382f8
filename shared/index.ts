export * from './layout/document';
export * from './layout/problem';
export * from './evidence';
export * from './readings';
export * from './picture';
export * from './signs';
export * from './diagnosis';
export { limits } from './limits';
