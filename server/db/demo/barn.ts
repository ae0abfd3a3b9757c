import type { Member } from '#shared/basis/schema/index.ts';
import { alone, builtUp, common, pins, shared, stock } from './members.ts';

/** A barn made into a dwelling: the demo project on the house basis. Invented. */
export const barn = {
  title: 'Furrow End barn (invented)',
  site: 'Furrow End, north range',
  client: 'A private client (invented)',
  choices: { exposure: 'sc1', self_weight: 'added' },
};

const loft: Member['loads'] = [
  { id: 'floor', action: 'G', title: 'Boards, joists, ceiling', kind: 'area', intensity: 0.45 },
  { id: 'people', action: 'Q', title: 'Loft room', kind: 'area', intensity: 1.5 },
];

export const barnMembers: readonly Member[] = [
  {
    ...common,
    mark: 'J1',
    title: 'Loft joist',
    choices: { ...shared, use: 'domestic-floor' },
    grade: 'SL2',
    section: stock([50, 200], 47, 195),
    spans: [{ length: 3900 }],
    supports: pins(75, 75),
    carries: { by: 'spacing', width: 400 },
    loads: loft,
  },
  {
    ...common,
    mark: 'J2',
    title: 'Joist under the stone hearth',
    choices: { ...shared, use: 'stone-floor' },
    grade: 'SL1',
    section: stock([75, 225], 72, 220),
    spans: [{ length: 3900 }],
    supports: pins(75, 75),
    carries: { by: 'spacing', width: 300 },
    loads: [
      ...loft,
      { id: 'hearth', action: 'G', title: 'Hearth', kind: 'area', intensity: 2.4, from: 1000, to: 2200 },
    ],
  },
  {
    ...common,
    mark: 'B1',
    title: 'Old tie beam, kept as a floor beam',
    choices: { ...alone, held: 'both-edges', use: 'domestic-floor' },
    grade: 'OB',
    section: { b: 190, h: 240, pieces: 1 },
    spans: [{ length: 3850 }],
    supports: pins(200, 200),
    carries: { by: 'tributary', width: 2600 },
    loads: loft,
    note: 'Measured on site after the soft outer wood was taken off.',
  },
  {
    ...common,
    mark: 'L1',
    title: 'Lintel over the cart opening',
    choices: builtUp,
    grade: 'SL1',
    section: stock([75, 225], 72, 220, 2),
    spanMeasured: 'clear',
    spans: [{ length: 2700 }],
    supports: pins(150, 150),
    carries: { by: 'tributary', width: 2600 },
    loads: [
      { id: 'roof', action: 'G', title: 'Roof', kind: 'area', intensity: 1.3 },
      { id: 'snow', action: 'S', title: 'Snow', kind: 'area', intensity: 0.8 },
    ],
    departures: [
      {
        clause: 'load-sharing',
        value: 1,
        reason: 'The bolts between the two pieces were not inspected, so they are not taken to share.',
        approvedBy: 'Maud Ellerby',
      },
    ],
  },
];
