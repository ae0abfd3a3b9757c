import type { Edition } from '#shared/basis/schema/index.ts';

/** What differs between the editions of the demo firm's house basis. All of it is made up. */
export interface HouseValues {
  reclaimedFactor: number;
  stoneCap: number;
}

export const houseFirst: HouseValues = {
  reclaimedFactor: 0.9,
  stoneCap: 9,
};
export const houseNext: HouseValues = {
  reclaimedFactor: 0.85,
  stoneCap: 8,
};

const source = 'wrenlock';
const invented = { source, standing: 'invented' } as const;

const grade = (id: string, title: string, origin: string, values: Record<string, number>) => ({
  id,
  title,
  choices: { timber: 'softwood', origin },
  values,
  provenance: invented,
});

const rows: Edition['grades']['rows'] = [
  grade('SL1', 'Sallow Lane first sort', 'new', {
    f_m: 7,
    f_v: 0.7,
    f_p_wane: 2,
    f_p_clean: 2.4,
    E_mean: 10_000,
    E_min: 6800,
    rho_mean: 430,
  }),
  grade('SL2', 'Sallow Lane second sort', 'new', {
    f_m: 5,
    f_v: 0.65,
    f_p_wane: 1.8,
    f_p_clean: 2.2,
    E_mean: 8600,
    E_min: 5600,
    rho_mean: 400,
  }),
  grade('OB', 'Old beams, sorted by eye on site', 'reclaimed', {
    f_m: 6.5,
    f_v: 0.75,
    f_p_wane: 2.2,
    f_p_clean: 2.6,
    E_mean: 9800,
    E_min: 6400,
    rho_mean: 480,
  }),
];

const reclaimed = (value: number): Edition['clauses'][number] => ({
  id: 'reclaimed',
  symbol: 'K_old',
  title: 'House reduction for reclaimed timber',
  reference: 'W1',
  kind: 'factor',
  unit: '1',
  cases: [
    {
      id: 'reclaimed',
      title: 'Reclaimed',
      when: { fact: 'origin', operator: 'equal', value: 'reclaimed' },
      gives: { kind: 'constant', value },
      provenance: invented,
    },
    { id: 'new', title: 'New', gives: { kind: 'constant', value: 1 }, provenance: invented },
  ],
});

const proof: Edition['proofs'][number] = {
  id: 'joist-by-hand',
  title: 'Joist 47 × 195 of the first sort over 3 m',
  member: {
    schema: 'member/1',
    mark: 'P1',
    units: 'metric',
    choices: { load_sharing: 'system', held: 'edge', self_weight: 'in-loads' },
    grade: 'SL1',
    section: { b: 47, h: 195, pieces: 1 },
    spanMeasured: 'centres',
    spans: [{ length: 3000 }],
    supports: [
      { restraint: 'pin', bearing: 75 },
      { restraint: 'pin', bearing: 75 },
    ],
    carries: { by: 'spacing', width: 400 },
    loads: [
      { id: 'floor', action: 'G', kind: 'area', intensity: 0.5 },
      { id: 'people', action: 'Q', kind: 'area', intensity: 1.5 },
    ],
    inputs: {},
    departures: [],
  },
  expect: [
    // 0.8 kN/m x 3 m squared / 8 = 0.9 kNm; Z = 47 x 195 squared / 6 = 297 862.5 mm3.
    { check: 'bending', of: 'demand', value: 3.0215, unit: 'N/mm2', tolerance: 0.0005, why: 'By hand.' },
    // 7.0 x (300 / 195)^0.11 x 1.1.
    { check: 'bending', of: 'limit', value: 8.0737, unit: 'N/mm2', tolerance: 0.0005, why: 'By hand.' },
  ],
  verdict: 'passes',
  provenance: invented,
};

/**
 * The demo firm's own edition, made from the permissible-stress starter the way a firm would: its own grades,
 * a factor of its own in bending and shear, a limit for floors under stone. Every changed value is invented.
 */
export function houseEdition(starter: Edition, { reclaimedFactor, stoneCap }: HouseValues): Edition {
  const own = structuredClone(starter);
  const stone: Edition['clauses'][number]['cases'][number] = {
    id: 'stone',
    title: 'Floor under stone or tiles',
    when: { fact: 'use', operator: 'equal', value: 'stone-floor' },
    gives: { kind: 'spanLimit', fraction: 0.0025, cap: stoneCap },
    provenance: invented,
  };
  return {
    ...own,
    title: 'House basis: barns (invented values)',
    purpose: 'How the demo firm checks joists, rafters and beams in barns, with new and with old timber.',
    caution: `Made for a demonstration; its grades and house values are invented and belong to no timber. Not for any real building. ${own.caution}`,
    sources: [...own.sources, { id: source, title: 'Values made up for the demo firm', kind: 'invented' }],
    choices: [
      ...own.choices.map((choice) =>
        choice.symbol === 'use'
          ? {
              ...choice,
              options: [...choice.options, { id: 'stone-floor', title: 'Floor under stone or tiles' }],
            }
          : choice,
      ),
      {
        symbol: 'origin',
        title: 'Where the timber comes from',
        scope: 'grade',
        options: [
          { id: 'new', title: 'New' },
          { id: 'reclaimed', title: 'Reclaimed' },
        ],
      },
    ],
    grades: { ...own.grades, rows },
    clauses: [
      ...own.clauses.map((clause) =>
        clause.symbol === 'w_max' ? { ...clause, cases: [stone, ...clause.cases] } : clause,
      ),
      reclaimed(reclaimedFactor),
    ],
    checks: own.checks.map((check) =>
      check.limit && (check.id === 'bending' || check.id === 'shear')
        ? { ...check, limit: { ...check.limit, formula: `${check.limit.formula} * K_old` } }
        : check,
    ),
    proofs: [proof],
  };
}
