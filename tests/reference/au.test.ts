import { describe, expect, it } from 'vitest';
import type { Member } from '#shared/basis/schema/index.ts';
import {
  behind,
  checkOf,
  demand,
  examplesFrom,
  forTest,
  limit,
  line,
  member,
  points,
  proofsOf,
  rowsFor,
  run,
  starter,
  tableOf,
  utilisation,
  variant,
  type Comparison,
} from './worked.ts';

const examples = examplesFrom('au-worked-examples');
const edition = starter('limit-state-as');
const beam = (bearing: number, given: Parameters<typeof member>[2]): Member =>
  member('metric', bearing, given);
const comparisons: Comparison[] = [];
const add = (example: string, list: readonly Omit<Comparison, 'example'>[]) =>
  comparisons.push(...list.map((c) => ({ example, ...c })));

// au-01: lintel of laminated veneer lumber under three rafters. The variant adds the material as a grade
// (its bending strength is not on the pages read: the one here is made up and compared with nothing), and
// takes 1.2 G for permanent action alone, as the older loading code had it.
const veneer = variant(edition, (e) => {
  e.grades.rows.push({
    id: 'veneer',
    title: 'Laminated veneer lumber of the example',
    choices: { seasoning: 'seasoned', strength_class: 'lower' },
    values: { f_b: 48, f_s: 5.3, E: 12_400 },
    provenance: forTest,
  });
  const permanent = e.combinations.find(({ id }) => id === 'G-135')?.terms[0];
  if (permanent) permanent.factor = '1.2';
});
const rafters = [900, 1800, 2700];
const lintel = (h: number, loads: Member['loads']) =>
  run(
    veneer,
    beam(45, {
      grade: 'veneer',
      choices: {
        category: 'category-1',
        use: 'lintel',
        region: 'tropical',
        top_edge: 'length',
        bearing_group: 'SD6',
      },
      section: { b: 45, h, pieces: 1 },
      spans: [{ length: 3600 }],
      loads,
    }),
  );
const permanent = [...points('G', 1.7, ...rafters), line('G', 0.09)];
const kNm = 1e6;
const kN = 1e3;
{
  const self = lintel(240, [line('G', 0.09)]);
  const carried = lintel(240, points('G', 1.7, ...rafters));
  const g = lintel(240, permanent);
  const spread = lintel(240, points('Qr', 0.27, ...rafters));
  const middle = lintel(240, points('Qr', 1.4, 1800));
  const gq = lintel(240, [...permanent, ...points('Qr', 0.27, ...rafters), ...points('Qr', 1.4, 1800)]);
  const wind = lintel(240, points('Wup', -8.8, ...rafters));
  const up = lintel(240, [...permanent, ...points('Wup', -8.8, ...rafters)]);
  const deep = lintel(300, permanent);
  const moment = (r: typeof g) => Math.abs(behind(r, 'bending', 'M')) / kNm;
  const strengthAlone = (r: typeof g) => limit(r, 'shear') / behind(r, 'shear', 'A_s');
  add('au-01', [
    { quantity: 'M_self', computed: moment(self) / 1.2, unit: 'kN m' },
    { quantity: 'M_G_points', computed: moment(carried) / 1.2, unit: 'kN m' },
    { quantity: 'Mstar_G', computed: moment(g), unit: 'kN m', why: 'Variant with 1.2 G.' },
    {
      quantity: 'Mstar_G_over_k1',
      computed: moment(g) / behind(g, 'bending', 'k_1'),
      unit: 'kN m',
      tolerance: 0.15,
      why: 'Slip: 3.8 / 0.57 is 6.7, exactly 6.75; the source prints 6.6.',
    },
    { quantity: 'V_G', computed: demand(g, 'shear') / 1.2 / kN, unit: 'kN' },
    {
      quantity: 'Vstar_G',
      computed: demand(g, 'shear') / kN,
      unit: 'kN',
      tolerance: 0.055,
      why: 'The source goes on from 2.7 kN.',
    },
    {
      quantity: 'Vstar_G_over_k1',
      computed: demand(g, 'shear') / behind(g, 'shear', 'k_1') / kN,
      unit: 'kN',
      tolerance: 0.11,
      why: 'As before.',
    },
    { quantity: 'M_Q_point', computed: moment(middle) / 1.5, unit: 'kN m' },
    { quantity: 'M_Q_udl', computed: moment(spread) / 1.5, unit: 'kN m' },
    {
      quantity: 'Mstar_GQ',
      computed: moment(gq),
      unit: 'kN m',
      tolerance: 0.07,
      why: 'The source adds 3.8 and 2.6, each rounded.',
    },
    {
      quantity: 'Mstar_GQ_over_k1',
      computed: moment(gq) / behind(gq, 'bending', 'k_1'),
      unit: 'kN m',
      tolerance: 0.08,
      why: 'As before.',
    },
    {
      quantity: 'M_wind_printed',
      computed: moment(wind) / 2,
      unit: 'kN m',
      why: 'Slip: P L / 4 belongs to one load at mid-span; three rafters give P L / 2, twice as much.',
    },
    { quantity: 'M_wind_consistent', computed: moment(wind), unit: 'kN m' },
    { quantity: 'V_wind', computed: demand(wind, 'shear') / kN, unit: 'kN' },
    {
      quantity: 'Mstar_uplift_total',
      computed: moment(up),
      unit: 'kN m',
      tolerance: 0.06,
      why: 'The source cuts 12.95; it needs the moment of three rafters, not the printed 7.9.',
    },
    {
      quantity: 'Vstar_uplift_total',
      computed: demand(up, 'shear') / kN,
      unit: 'kN',
      tolerance: 0.47,
      why: 'Slip: the source takes 0.9 of the shear already multiplied by 1.2; 13.2 - 0.9 x 2.712 is 10.76.',
    },
    {
      quantity: 'As_required_mm2',
      computed: 15_800 / strengthAlone(up),
      unit: 'mm2',
      why: 'Slip: 15.8 is the wind moment in kN m, taken as a shear in kN.',
    },
    {
      quantity: 'shear area required for the net uplift',
      expected: 2506,
      computed: demand(up, 'shear') / strengthAlone(up),
      unit: 'mm2',
      tolerance: 1,
      why: 'With the shear of 10.76 kN.',
    },
    { quantity: 'I_240x45_1e6_mm4', computed: behind(g, 'deflection-long', 'I') / 1e6, unit: '10^6 mm4' },
    {
      quantity: 'delta_G_unit_corrected_240x45_mm',
      computed: demand(g, 'deflection-long'),
      unit: 'mm',
      why: 'The source prints 0.6: it adds a line load in N/mm to point loads left in kN.',
    },
    {
      quantity: 'delta_G_unit_corrected_300x45_mm',
      computed: demand(deep, 'deflection-long'),
      unit: 'mm',
      tolerance: 0.005,
    },
    {
      quantity: 'limit, span/300 and 9 mm at most',
      expected: 9,
      computed: limit(g, 'deflection-long'),
      unit: 'mm',
    },
  ]);
}

// Members worked by hand.
const joist = beam(35, {
  grade: 'MGP10',
  choices: {
    category: 'category-1',
    use: 'floor-joist',
    load_sharing: 'parallel',
    top_edge: 'length',
    bearing_group: 'SD6',
  },
  section: { b: 45, h: 140, pieces: 1 },
  spans: [{ length: 2400 }],
  carries: { by: 'spacing', width: 450 },
  inputs: { n_mem: 5 },
  loads: [
    { id: 'g', action: 'G', kind: 'area', intensity: 0.4 },
    { id: 'q', action: 'Qh', kind: 'area', intensity: 1.5 },
  ],
});
const bearer = beam(75, {
  grade: 'F14-unseasoned',
  choices: { category: 'category-1', use: 'bearer', top_edge: 'length', bearing_group: 'given' },
  section: { b: 75, h: 150, pieces: 1 },
  spans: [{ length: 2100 }],
  inputs: { f_p_given: 10 },
  loads: [line('G', 0.8), line('Qh', 3)],
});
const patterns = [
  ['1.35G', 'G-135'],
  ['1.2G+1.5Q', 'G12-Q15'],
  ['1.2G+1.5psi_l*Q', 'G12-Q15-long'],
] as const;
function byHand(example: string, given: Member, quantities: readonly string[]) {
  const r = run(edition, given);
  for (const [combination, pattern] of patterns)
    add(
      example,
      quantities.map((quantity) => ({
        quantity: `${combination}/ratio_${quantity}`,
        computed: utilisation(r, quantity, pattern),
        unit: '1',
      })),
    );
  const governing = '1.2G+1.5Q';
  add(example, [
    { quantity: `${governing}/Mstar_kNm`, computed: demand(r, 'bending') / kNm, unit: 'kN m' },
    { quantity: `${governing}/Vstar_kN`, computed: demand(r, 'shear') / kN, unit: 'kN' },
    { quantity: `${governing}/Md_kNm`, computed: limit(r, 'bending') / kNm, unit: 'kN m', tolerance: 5e-7 },
    { quantity: `${governing}/Vd_kN`, computed: limit(r, 'shear') / kN, unit: 'kN', tolerance: 5e-6 },
    { quantity: `${governing}/k9`, computed: behind(r, 'bending', 'k_9'), unit: '1', tolerance: 5e-6 },
    { quantity: 'long_term_G_j2', computed: demand(r, 'deflection-long'), unit: 'mm', tolerance: 6e-6 },
    { quantity: 'psi_s_Q', computed: demand(r, 'deflection-imposed'), unit: 'mm' },
    { quantity: 'long_term_G_plus_psi_l_Q', computed: demand(r, 'sag'), unit: 'mm', tolerance: 6e-5 },
    {
      quantity: 'short_G',
      computed: demand(r, 'deflection-long') / behind(r, 'deflection-long', 'j_2'),
      unit: 'mm',
    },
    { quantity: 'span_over_300', computed: limit(r, 'deflection-long'), unit: 'mm', tolerance: 1e-9 },
    { quantity: 'span_over_360', computed: limit(r, 'deflection-imposed'), unit: 'mm' },
  ]);
}
byHand('own-au-1', joist, ['bending', 'shear', 'bearing']);
byHand('own-au-3', bearer, ['bending', 'shear']);

const rows = rowsFor(examples, comparisons);

describe('worked examples, F-grades and machine graded pine', () => {
  it.each(rows)('$example: $quantity is $given', ({ computed, expected, tolerance }) => {
    expect(Math.abs(computed - expected)).toBeLessThanOrEqual(tolerance);
  });

  it('leaves none of the examples out', () => {
    const all = [...examples.published, ...examples.constructed].map(({ id }) => id);
    expect(new Set(rows.map((r) => r.example))).toEqual(new Set(all));
  });

  it('keeps the table of comparisons up to date', async () => {
    await expect(
      tableOf('Worked examples, limit state, F-grades and machine graded pine', examples, rows),
    ).toMatchFileSnapshot('TABLE-au.md');
  });

  it('au-01: the 240 mm lintel fails the permanent deflection that the source passes', () => {
    expect(checkOf(lintel(240, permanent), 'deflection-long').word).toBe('fails');
    expect(checkOf(lintel(300, permanent), 'deflection-long').word).toBe('passes');
  });
});

describe('stability of the starter edition', () => {
  const held = (choices: Record<string, string>, inputs: Record<string, number> = {}) =>
    run(
      edition,
      beam(45, {
        grade: 'MGP12',
        choices: { category: 'category-2', use: 'rafter', bearing_group: 'SD6', ...choices },
        section: { b: 45, h: 240, pieces: 1 },
        spans: [{ length: 3000, inputs }],
        loads: [line('G', 0.5), line('Qr', 0.5)],
      }),
    );
  const slenderness = (choices: Record<string, string>, inputs?: Record<string, number>) =>
    behind(held(choices, inputs), 'bending', 'S_1');

  it('takes each of the five slenderness formulas by the edges held', () => {
    const ratio = 240 / 45;
    expect(slenderness({ top_edge: 'length' })).toBe(0);
    expect(slenderness({})).toBeCloseTo(1.25 * ratio * Math.sqrt(3000 / 240), 9);
    expect(slenderness({ top_edge: 'points' }, { L_ay_top: 900 })).toBeCloseTo(
      1.25 * ratio * Math.sqrt(900 / 240),
      9,
    );
    expect(slenderness({ bottom_edge: 'length' })).toBeCloseTo(2.25 * ratio, 9);
    expect(slenderness({ bottom_edge: 'points' }, { L_ay_bottom: 600 })).toBeCloseTo(
      ratio ** 1.35 * (600 / 240) ** 0.25,
      9,
    );
    expect(slenderness({ bottom_edge: 'length', torsion: 'yes' }, { L_a_phi: 1200 })).toBeCloseTo(
      (1.5 * ratio) / Math.sqrt(((Math.PI * 240) / 1200) ** 2 + 0.4),
      9,
    );
  });

  it('counts points held closely enough as held over the length', () => {
    expect(slenderness({ top_edge: 'points' }, { L_ay_top: 400 })).toBe(0);
    expect(behind(held({}), 'bending', 'k_12')).toBeLessThan(1);
  });

  it('counts the top edge as the tension edge where wind turns the bending round', () => {
    const r = run(
      edition,
      beam(45, {
        grade: 'MGP12',
        choices: { category: 'category-2', use: 'rafter', bearing_group: 'SD6', top_edge: 'length' },
        section: { b: 45, h: 240, pieces: 1 },
        spans: [{ length: 3000 }],
        loads: [line('G', 0.2), line('Wup', -2)],
      }),
    );
    expect(behind(r, 'bending', 'S_1')).toBeCloseTo((2.25 * 240) / 45, 9);
  });

  it('takes the strength row of the depth', () => {
    const strength = (h: number) =>
      behind(run(edition, { ...joist, section: { b: 45, h, pieces: 1 } }), 'bending', 'f_b');
    expect([90, 140, 141, 190, 240, 290].map(strength)).toEqual([17, 17, 16, 16, 15, 14]);
  });

  it('refuses a notched end', () => {
    const r = run(edition, {
      ...joist,
      supports: [
        { restraint: 'pin', bearing: 35, inputs: { notch_depth: 20 } },
        { restraint: 'pin', bearing: 35 },
      ],
    });
    expect(checkOf(r, 'notch')).toMatchObject({ word: 'fails' });
    expect(r.verdict.word).toBe('fails');
  });
});

describe('factors of the starter edition', () => {
  const changed = (change: Partial<Member>) => run(edition, { ...joist, ...change });

  it('takes the capacity factor by grade and importance', () => {
    const phi = (grade: string, category: string) =>
      behind(changed({ grade, choices: { ...joist.choices, category } }), 'bending', 'phi');
    expect(['category-1', 'category-2', 'category-3'].map((c) => phi('MGP10', c))).toEqual([0.9, 0.7, 0.6]);
    expect(['category-1', 'category-2', 'category-3'].map((c) => phi('MGP15', c))).toEqual([
      0.95, 0.85, 0.75,
    ]);
    expect(phi('F17-seasoned', 'category-2')).toBe(0.85);
    expect(phi('F14-seasoned', 'category-2')).toBe(0.7);
  });

  it('takes partial seasoning by the least dimension, and moisture of the place for seasoned timber', () => {
    const k4 = (grade: string, b: number, EMC = 12) =>
      behind(
        changed({ grade, section: { b, h: 140, pieces: 1 }, inputs: { n_mem: 5, EMC } }),
        'bending',
        'k_4',
      );
    expect([38, 45, 50, 75, 100, 125].map((b) => k4('F14-unseasoned', b))).toEqual([
      1.15, 1.1, 1.1, 1.05, 1, 1,
    ]);
    expect([12, 15, 20, 25, 30].map((emc) => k4('MGP10', 45, emc))).toEqual([1, 1, 0.85, 0.7, 0.7]);
  });

  it('does not let load sharing fall below 1', () => {
    const wide = changed({ carries: { by: 'spacing', width: 2400 } });
    expect(behind(wide, 'bending', 'k_9')).toBe(1);
  });

  it('raises the strength of a short bearing away from the end only', () => {
    const two = changed({
      spans: [{ length: 2400 }, { length: 2400 }],
      supports: [35, 50, 35].map((bearing) => ({ restraint: 'pin', bearing })),
    });
    expect(behind(two, 'bearing', 'k_7')).toBe(1.2);
    expect(behind(changed({}), 'bearing', 'k_7')).toBe(1);
  });

  it('lets creep grow with the logarithm of time and with moisture', () => {
    const j2 = (grade: string, t_load: number) =>
      behind(changed({ grade, inputs: { n_mem: 5, t_load } }), 'deflection-long', 'j_2');
    expect(j2('MGP10', 1)).toBe(1);
    expect(j2('MGP10', 18_250)).toBe(2);
    expect(j2('F14-unseasoned', 18_250)).toBe(3);
    expect(j2('MGP10', Math.sqrt(365))).toBeCloseTo(1.5, 9);
  });

  it('takes 0.9 for temperature on the tropical coast, for seasoned timber', () => {
    const k6 = (grade: string) =>
      behind(changed({ grade, choices: { ...joist.choices, region: 'tropical' } }), 'bending', 'k_6');
    expect([k6('MGP10'), k6('F14-unseasoned')]).toEqual([0.9, 1]);
  });

  it('can take the share of temporary action as it is in the combination', () => {
    const choices = { ...joist.choices, share_rule: 'actual' };
    const share = (loads: Member['loads']) => behind(changed({ choices, loads }), 'bending', 'r');
    expect(share(joist.loads)).toBeCloseTo((1.5 * 1.5) / (1.2 * 0.4 + 1.5 * 1.5), 9);
    expect(share([line('G', 0.18)])).toBe(0.25);
  });
});

describe('proofs of the starter edition', () => {
  it.each(proofsOf(edition))('$title', ({ problems, lines }) => {
    expect(problems).toEqual([]);
    expect(lines.filter(({ holds }) => !holds)).toEqual([]);
  });
});
