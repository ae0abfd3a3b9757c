import type { Member } from '#shared/basis/schema/index.ts';

/** What all members of the demo share. */
export const common: Pick<Member, 'schema' | 'units' | 'spanMeasured' | 'inputs' | 'departures'> = {
  schema: 'member/1',
  units: 'metric',
  spanMeasured: 'centres',
  inputs: {},
  departures: [],
};

/** Pinned supports with these bearings, from left to right. */
export const pins = (...bearings: number[]): Member['supports'] =>
  bearings.map((bearing) => ({ restraint: 'pin', bearing }));

/** A section of the demo's stock list, ordered and finished. */
export const stock = (ordered: [number, number], b: number, h: number, pieces = 1): Member['section'] => ({
  b,
  h,
  pieces,
  nominal: { b: ordered[0], h: ordered[1] },
  stock: `${ordered[0]}x${ordered[1]}`,
});

export const shared = { load_sharing: 'system', held: 'edge', use: 'general' };
export const alone = { load_sharing: 'alone', held: 'edge', use: 'general' };
export const builtUp = { load_sharing: 'built-up', held: 'line', use: 'general' };
