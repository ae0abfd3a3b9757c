export * from './events.ts';
export * from './say.ts';
