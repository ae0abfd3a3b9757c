import type { Member } from '#shared/basis/schema/index.ts';

/** A floor joist for the test edition. Made-up values. */
export function testMember(change: Partial<Member> = {}): Member {
  return {
    schema: 'member/1',
    mark: 'J1',
    title: 'Floor joist',
    units: 'metric',
    choices: { sharing: 'shared' },
    grade: 'T24',
    section: { b: 47, h: 195, pieces: 1 },
    spanMeasured: 'centres',
    spans: [{ length: 3000 }],
    supports: [
      { restraint: 'pin', bearing: 75 },
      { restraint: 'pin', bearing: 75 },
    ],
    carries: { by: 'spacing', width: 400 },
    loads: [
      { id: 'floor', action: 'dead', kind: 'area', intensity: 0.5 },
      { id: 'people', action: 'imposed', kind: 'area', intensity: 1.5 },
    ],
    inputs: {},
    departures: [],
    ...change,
  };
}
