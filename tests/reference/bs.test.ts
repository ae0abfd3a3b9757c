import { describe, expect, it } from 'vitest';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { Result } from '#shared/engine/types.ts';
import {
  behind,
  checkOf,
  demand,
  examplesFrom,
  limit,
  line,
  member,
  proofsOf,
  rowsFor,
  run,
  setCase,
  setGrade,
  starter,
  tableOf,
  variant,
  type Comparison,
} from './worked.ts';

const examples = examplesFrom('bs-worked-examples');
const edition = starter('permissible-stress-softwood');
const beam = (bearing: number, given: Parameters<typeof member>[2]): Member =>
  member('metric', bearing, {
    ...given,
    choices: { self_weight: 'in-loads', held: 'edge', ...given.choices },
  });
const area = (action: string, intensity: number): Member['loads'][number] => ({
  id: `${action}-area`,
  action,
  kind: 'area',
  intensity,
});
const comparisons: Comparison[] = [];
const add = (example: string, list: readonly Omit<Comparison, 'example'>[]) =>
  comparisons.push(...list.map((c) => ({ example, ...c })));

/** Without shear deflection. */
const bendingOnly = (e: Edition) =>
  variant(e, (copy) => {
    delete copy.analysis.shearStiffness;
  });
/** Without shear deflection, depth factor and load-sharing factor, as the simpler sources work. */
const simplified = variant(bendingOnly(edition), (e) => {
  setCase(e, 'depth', 'middle', { kind: 'constant', value: 1 });
  setCase(e, 'load-sharing', 'system', { kind: 'constant', value: 1 });
});
const depthNeeded = (r: Result, h: number) => h * Math.sqrt(demand(r, 'bending') / limit(r, 'bending'));

// EX8: joist on 5 m, by a handbook that leaves out both factors and shear deflection.
const ex8 = beam(100, {
  grade: 'C24',
  choices: { load_sharing: 'system', wane: 'none' },
  section: { b: 50, h: 225, pieces: 1 },
  spans: [{ length: 5000 }],
  carries: { by: 'spacing', width: 400 },
  loads: [area('Q', 2.25)],
});
const ex8Domestic = { ...ex8, choices: { ...ex8.choices, use: 'domestic-floor' } };
{
  const printed = run(simplified, ex8);
  const full = run(edition, ex8);
  add('EX8-handbook-joist-BS', [
    { quantity: 'W_kN', computed: (2 * behind(printed, 'bearing', 'R')) / 1000, unit: 'kN' },
    { quantity: 'w_kN_per_m', computed: (2 * behind(printed, 'bearing', 'R')) / 5000, unit: 'kN/m' },
    {
      quantity: 'd_required_mm',
      computed: depthNeeded(printed, 225),
      unit: 'mm',
      why: 'Variant without K7 and K8, as in the source.',
    },
    {
      quantity: 'I_mm4',
      computed: behind(printed, 'deflection', 'I'),
      unit: 'mm4',
      tolerance: 50_000,
      why: 'Printed to three figures.',
    },
    {
      quantity: 'deflection_mm',
      computed: demand(printed, 'deflection'),
      unit: 'mm',
      tolerance: 0.02,
      why: 'Variant without shear deflection. Exactly 14.29; the source works on from a rounded second moment.',
    },
    { quantity: 'deflection_limit_mm', computed: limit(printed, 'deflection'), unit: 'mm' },
    {
      quantity: 'bearing_length_mm',
      computed: (demand(printed, 'bearing') * 100) / limit(printed, 'bearing'),
      unit: 'mm',
    },
    {
      quantity: 'min_shear_area_mm2',
      computed: (behind(printed, 'shear', 'A') * demand(printed, 'shear')) / limit(printed, 'shear'),
      unit: 'mm2',
      tolerance: 1,
      why: 'Exactly 4753.5; the source cuts it off.',
    },
    { quantity: 'provided_area_mm2', computed: behind(printed, 'shear', 'A'), unit: 'mm2' },
    { quantity: 'sigma_m', computed: demand(full, 'bending'), unit: 'N/mm2' },
    {
      quantity: 'permissible_with_K7_K8',
      computed: limit(full, 'bending'),
      unit: 'N/mm2',
      why: 'Starter edition.',
    },
    {
      quantity: 'deflection_shear_extra',
      computed: demand(full, 'deflection') - demand(printed, 'deflection'),
      unit: 'mm',
      tolerance: 0.005,
      why: 'Left out in the source (slip). With it and the cap of 14 mm for dwellings the joist fails.',
    },
  ]);
}

// EX9: joist on 4 m; the source takes E = 10 700 for C24 and span/360.
const asPrinted9 = variant(simplified, (e) => {
  setGrade(e, 'C24', { E_mean: 10_700 });
  setCase(e, 'deflection', 'general', { kind: 'spanLimit', divisor: 360 });
});
{
  const given = beam(100, {
    grade: 'C24',
    choices: { load_sharing: 'system' },
    section: { b: 50, h: 200, pieces: 1 },
    spans: [{ length: 4000 }],
    carries: { by: 'spacing', width: 400 },
    loads: [area('Q', 2.25)],
  });
  const printed = run(asPrinted9, given);
  add('EX9-joist-400-centres', [
    { quantity: 'w_kN_per_m', computed: (2 * behind(printed, 'bearing', 'R')) / 4000, unit: 'kN/m' },
    { quantity: 'R_kN', computed: behind(printed, 'bearing', 'R') / 1000, unit: 'kN' },
    { quantity: 'M_kNm', computed: behind(printed, 'bending', 'M') / 1e6, unit: 'kN m' },
    {
      quantity: 'd_required_mm',
      computed: depthNeeded(printed, 200),
      unit: 'mm',
      why: 'Variant without K7 and K8, as in the source.',
    },
    {
      quantity: 'I_mm4',
      computed: behind(printed, 'deflection', 'I'),
      unit: 'mm4',
      tolerance: 50_000,
      why: 'Printed to three figures.',
    },
    {
      quantity: 'deflection_mm',
      computed: demand(printed, 'deflection'),
      unit: 'mm',
      why: 'Variant with E = 10 700 as printed (slip: the mean value of C24 is 10 800), without shear.',
    },
    {
      quantity: 'limit_span_360_mm',
      computed: limit(printed, 'deflection'),
      unit: 'mm',
      why: 'Variant with span/360 as in the source; the code has 0.003 of the span.',
    },
    {
      quantity: 'deflection_E10800',
      computed: demand(run(simplified, given), 'deflection'),
      unit: 'mm',
      why: 'The grade’s own modulus.',
    },
  ]);
}

// EX14: one clear span, three sections. E_min, since the beam acts alone.
const ex14 = (b: number, h: number) =>
  beam(175, {
    grade: 'C18',
    section: { b, h, pieces: 1 },
    spanMeasured: 'clear',
    spans: [{ length: 2650 }],
    loads: [line('Q', 10 / 2.825)],
  });
{
  const r = run(edition, ex14(75, 225));
  const bent = demand(run(bendingOnly(edition), ex14(75, 225)), 'deflection');
  const name = (quantity: string) => `section_75x225/${quantity}`;
  add('EX14-exam-C18-beam', [
    { quantity: 'effective_span_mm', computed: behind(r, 'deflection', 'L'), unit: 'mm' },
    { quantity: 'M_kNm', computed: behind(r, 'bending', 'M') / 1e6, unit: 'kN m' },
    { quantity: 'R_kN', computed: behind(r, 'bearing', 'R') / 1000, unit: 'kN' },
    { quantity: name('sigma_m'), computed: demand(r, 'bending'), unit: 'N/mm2' },
    { quantity: name('adm'), computed: limit(r, 'bending'), unit: 'N/mm2', tolerance: 0.005 },
    { quantity: name('tau'), computed: demand(r, 'shear'), unit: 'N/mm2', tolerance: 0.0005 },
    { quantity: name('tau_adm'), computed: limit(r, 'shear'), unit: 'N/mm2' },
    { quantity: name('bearing'), computed: demand(r, 'bearing'), unit: 'N/mm2' },
    { quantity: name('bearing_adm'), computed: limit(r, 'bearing'), unit: 'N/mm2' },
    { quantity: name('deflection_bending'), computed: bent, unit: 'mm', tolerance: 0.005 },
    {
      quantity: name('deflection_shear'),
      computed: demand(r, 'deflection') - bent,
      unit: 'mm',
      tolerance: 0.005,
    },
    { quantity: name('deflection_total'), computed: demand(r, 'deflection'), unit: 'mm' },
    { quantity: name('limit'), computed: limit(r, 'deflection'), unit: 'mm' },
    { quantity: name('d_over_b'), computed: demand(r, 'proportions'), unit: '1' },
    { quantity: name('d_over_b_max'), computed: limit(r, 'proportions'), unit: '1' },
  ]);
  const narrow = run(edition, ex14(63, 250));
  const low = run(edition, ex14(63, 225));
  add('EX14-exam-C18-beam', [
    {
      quantity: 'section_63x250/sigma_m',
      computed: demand(narrow, 'bending'),
      unit: 'N/mm2',
      tolerance: 0.005,
    },
    { quantity: 'section_63x250/adm', computed: limit(narrow, 'bending'), unit: 'N/mm2', tolerance: 0.005 },
    {
      quantity: 'section_63x250/deflection_total',
      computed: demand(narrow, 'deflection'),
      unit: 'mm',
      tolerance: 0.005,
    },
    { quantity: 'section_63x225/sigma_m', computed: demand(low, 'bending'), unit: 'N/mm2', tolerance: 0.005 },
    { quantity: 'section_63x225/adm', computed: limit(low, 'bending'), unit: 'N/mm2', tolerance: 0.005 },
  ]);
}

// EX15: the imposed load that a flat roof joist can carry in bending; self-weight inside the dead load.
const ex15 = (imposed: number) =>
  beam(75, {
    grade: 'C16',
    choices: { load_sharing: 'system' },
    section: { b: 47, h: 225, pieces: 1 },
    spans: [{ length: 3700 }],
    carries: { by: 'spacing', width: 550 },
    loads: [area('G', 0.92), area('Q', imposed)],
  });
const ex15Load = (() => {
  const r = run(edition, ex15(1));
  return (1.92 * limit(r, 'bending')) / demand(r, 'bending') - 0.92;
})();
{
  const r = run(edition, ex15(ex15Load));
  add('EX15-exam-C16-flat-roof', [
    { quantity: 'K7', computed: behind(r, 'bending', 'K_7'), unit: '1' },
    { quantity: 'K8', computed: behind(r, 'bending', 'K_8'), unit: '1' },
    { quantity: 'sigma_adm', computed: limit(r, 'bending'), unit: 'N/mm2' },
    {
      quantity: 'M_adm_kNm',
      computed: (limit(r, 'bending') * behind(r, 'bending', 'Z')) / 1e6,
      unit: 'kN m',
    },
    { quantity: 'w_total_kN_m2', computed: ex15Load + 0.92, unit: 'kN/m2' },
    { quantity: 'imposed_kN_m2_by_bending', computed: ex15Load, unit: 'kN/m2' },
    {
      quantity: 'deflection_at_that_load_mm',
      computed: demand(r, 'deflection'),
      unit: 'mm',
      tolerance: 0.005,
    },
    { quantity: 'deflection_limit_mm', computed: limit(r, 'deflection'), unit: 'mm' },
  ]);
}

// EX18: beam in C16 on a clear span, two depths.
const ex18 = (h: number) =>
  beam(150, {
    grade: 'C16',
    section: { b: 75, h, pieces: 1 },
    spanMeasured: 'clear',
    spans: [{ length: 2850 }],
    loads: [line('Q', 10 / 3)],
  });
{
  const r = run(edition, ex18(250));
  const low = run(edition, ex18(225));
  const bent = demand(run(bendingOnly(edition), ex18(250)), 'deflection');
  const name = (quantity: string) => `section_75x250/${quantity}`;
  add('EX18-memory-Arya-6.1', [
    { quantity: 'M_kNm', computed: behind(r, 'bending', 'M') / 1e6, unit: 'kN m' },
    {
      quantity: 'Z_required_before_K7_mm3',
      computed: (behind(r, 'bending', 'M') * behind(r, 'bending', 'K_7')) / limit(r, 'bending'),
      unit: 'mm3',
    },
    {
      quantity: 'I_required_9mm_Emin',
      computed: (behind(r, 'deflection', 'I') * bent) / 9,
      unit: 'mm4',
      tolerance: 50_000,
      why: 'Worked by hand to three figures.',
    },
    { quantity: name('sigma_m'), computed: demand(r, 'bending'), unit: 'N/mm2' },
    { quantity: name('adm'), computed: limit(r, 'bending'), unit: 'N/mm2', tolerance: 0.005 },
    { quantity: name('deflection_bending'), computed: bent, unit: 'mm', tolerance: 0.005 },
    {
      quantity: name('deflection_shear'),
      computed: demand(r, 'deflection') - bent,
      unit: 'mm',
      tolerance: 0.005,
    },
    { quantity: name('limit'), computed: limit(r, 'deflection'), unit: 'mm' },
    { quantity: name('tau'), computed: demand(r, 'shear'), unit: 'N/mm2' },
    { quantity: name('bearing'), computed: demand(r, 'bearing'), unit: 'N/mm2', tolerance: 0.0005 },
    { quantity: 'section_75x225/sigma_m', computed: demand(low, 'bending'), unit: 'N/mm2', tolerance: 0.005 },
    { quantity: 'section_75x225/adm', computed: limit(low, 'bending'), unit: 'N/mm2', tolerance: 0.005 },
  ]);
}

// EX19: floor joists in C22.
const ex19 = beam(75, {
  grade: 'C22',
  choices: { load_sharing: 'system' },
  section: { b: 44, h: 200, pieces: 1 },
  spans: [{ length: 3800 }],
  carries: { by: 'spacing', width: 600 },
  loads: [area('G', 0.35), area('Q', 1.5)],
});
{
  const r = run(edition, ex19);
  const bent = demand(run(bendingOnly(edition), ex19), 'deflection');
  add('EX19-memory-Kermani-4.1', [
    { quantity: 'M_kNm', computed: behind(r, 'bending', 'M') / 1e6, unit: 'kN m' },
    { quantity: 'sigma_m', computed: demand(r, 'bending'), unit: 'N/mm2' },
    { quantity: 'adm_K7_K8', computed: limit(r, 'bending'), unit: 'N/mm2' },
    { quantity: 'deflection_bending', computed: bent, unit: 'mm' },
    { quantity: 'deflection_shear', computed: demand(r, 'deflection') - bent, unit: 'mm', tolerance: 0.005 },
    { quantity: 'deflection_total', computed: demand(r, 'deflection'), unit: 'mm' },
    { quantity: 'limit', computed: limit(r, 'deflection'), unit: 'mm' },
    { quantity: 'tau', computed: demand(r, 'shear'), unit: 'N/mm2', tolerance: 0.0005 },
    { quantity: 'tau_adm', computed: limit(r, 'shear'), unit: 'N/mm2' },
  ]);
}

const rows = rowsFor(examples, comparisons);

describe('worked examples of permissible stress', () => {
  it.each(rows)('$example: $quantity is $given', ({ computed, expected, tolerance }) => {
    expect(Math.abs(computed - expected)).toBeLessThanOrEqual(tolerance);
  });

  it('leaves none of the examples out', () => {
    expect(new Set(rows.map((r) => r.example))).toEqual(new Set(examples.published.map(({ id }) => id)));
  });

  it('keeps the table of comparisons up to date', async () => {
    await expect(tableOf('Worked examples, permissible stress', examples, rows)).toMatchFileSnapshot(
      'TABLE-bs.md',
    );
  });
});

describe('verdicts of the worked examples', () => {
  it.each([
    ['EX8 by its span alone', ex8, 'close', 'deflection'],
    ['EX8 as the floor of a dwelling: the cap of 14 mm turns it over', ex8Domestic, 'fails', 'deflection'],
    ['EX14 with 75 x 225', ex14(75, 225), 'passes', 'bending'],
    ['EX14 with 63 x 250', ex14(63, 250), 'passes', 'bending'],
    ['EX14 with 63 x 225', ex14(63, 225), 'fails', 'bending'],
    ['EX15 at a hundredth above its load', ex15(ex15Load * 1.01), 'fails', 'bending'],
    ['EX15 at a hundredth below it', ex15(ex15Load * 0.99), 'close', 'bending'],
    ['EX18 with 75 x 250', ex18(250), 'passes', 'bending'],
    ['EX18 with 75 x 225', ex18(225), 'fails', 'bending'],
    ['EX19', ex19, 'close', 'deflection'],
  ] as const)('%s', (_, given, word, by) => {
    expect(run(edition, given).verdict).toMatchObject({ word, check: by });
  });

  it('EX14 with 63 x 225 fails in deflection too', () => {
    expect(checkOf(run(edition, ex14(63, 225)), 'deflection').word).toBe('fails');
  });
});

describe('proofs of the starter edition', () => {
  it.each(proofsOf(edition))('$title', ({ problems, lines }) => {
    expect(problems).toEqual([]);
    expect(lines.filter(({ holds }) => !holds)).toEqual([]);
  });
});
