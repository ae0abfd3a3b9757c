export * from './can.ts';
export * from './roles.ts';
export * from './rules.ts';
