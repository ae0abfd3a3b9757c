export { drivers } from './answers/drivers.ts';
export { findSections, type FindOptions, nextInStock, sectionSearch } from './answers/sections.ts';
export { requiredDepth } from './answers/sizing.ts';
export { check } from './check.ts';
export type * from './types.ts';
export { type QuickVerdict, verdict } from './verdict.ts';
export { ENGINE_VERSION } from './version.ts';
