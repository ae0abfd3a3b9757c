import type { Member } from '#shared/basis/schema/index.ts';
import { testMember } from '#tests/factories/edition.ts';

const pin = { restraint: 'pin', bearing: 100 } as const;

const floor: Member['loads'] = [
  { id: 'floor', action: 'dead', kind: 'area', intensity: 0.35 },
  { id: 'people', action: 'imposed', kind: 'area', intensity: 1.5 },
];
const snow: Member['loads'][number] = { id: 'snow', action: 'snow', kind: 'area', intensity: 0.6 };
const point: Member['loads'][number] = { id: 'post', action: 'dead', kind: 'point', force: 1.2, x: 1300 };

const over = (spans: readonly number[], loads: Member['loads']) =>
  testMember({
    spans: spans.map((length) => ({ length })),
    supports: [pin, ...spans.map(() => pin)],
    loads,
  });

/** A mixed set: single and several spans, 4 to 9 combinations. */
export const benchMembers: readonly (readonly [name: string, member: Member])[] = [
  ['joist, one span', over([3600], floor)],
  ['rafter, one span, snow', over([3200], [...floor, snow])],
  ['trimmer, one span, point load', over([3900], [...floor, point])],
  ['joist, two spans', over([3600, 3000], floor)],
  ['joist, three spans, snow', over([3600, 3000, 4200], [...floor, snow])],
  ['purlin, four spans, point load', over([3000, 3000, 3000, 3000], [...floor, snow, point])],
];
