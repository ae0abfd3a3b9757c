export * from './actions.ts';
export * from './checks.ts';
export * from './clause.ts';
export { closed, oneOf, Provenance, Source } from './common.ts';
export * from './condition.ts';
export * from './edition.ts';
export * from './materials.ts';
export * from './member.ts';
export * from './table.ts';
