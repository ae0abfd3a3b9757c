import type { Member } from '#shared/basis/schema/index.ts';

/** A member of the right shape, for the API's description. Made-up values. */
export const exampleMember: Member = {
  schema: 'member/1',
  mark: 'J1',
  title: 'Floor joist',
  units: 'metric',
  choices: {},
  grade: 'C16',
  section: { b: 47, h: 195, pieces: 1 },
  spanMeasured: 'centres',
  spans: [{ length: 3600 }],
  supports: [
    { restraint: 'pin', bearing: 75 },
    { restraint: 'pin', bearing: 75 },
  ],
  carries: { by: 'spacing', width: 400 },
  loads: [
    { id: 'floor', action: 'permanent', kind: 'area', intensity: 0.5 },
    { id: 'people', action: 'imposed', kind: 'area', intensity: 1.5 },
  ],
  inputs: {},
  departures: [],
};
