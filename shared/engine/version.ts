import type { EngineVersion } from './types.ts';

/** Raised whenever a change of the engine alters any number, word or order of any result. */
export const ENGINE_VERSION: EngineVersion = '1.0.0';
