export { check } from './check.ts';
export { verdict, type QuickVerdict } from './verdict.ts';
export { ENGINE_VERSION } from './version.ts';
export type * from './types.ts';
