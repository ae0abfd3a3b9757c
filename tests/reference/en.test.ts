import { describe, expect, it } from 'vitest';
import { peakPerSpan } from '#shared/analysis/peaks.ts';
import { solve } from '#shared/analysis/solve.ts';
import type { BeamLoad } from '#shared/analysis/types.ts';
import type { Member } from '#shared/basis/schema/index.ts';
import { compile, curves } from '#shared/engine/index.ts';
import {
  behind,
  checkOf,
  demand,
  examplesFrom,
  limit,
  line,
  member,
  points,
  proofsOf,
  rowsFor,
  run,
  setCase,
  setGrade,
  starter,
  tableOf,
  utilisation,
  variant,
  type Comparison,
} from './worked.ts';
import { lvlOf } from './lvl.ts';

const examples = examplesFrom('en-worked-examples');
const edition = starter('limit-state-en');
const beam = (bearing: number, given: Parameters<typeof member>[2]): Member =>
  member('metric', bearing, { ...given, choices: { self_weight: 'in-loads', ...given.choices } });
const area = (action: string, intensity: number): Member['loads'][number] => ({
  id: `${action}-area`,
  action,
  kind: 'area',
  intensity,
});
const comparisons: Comparison[] = [];
const add = (example: string, list: readonly Omit<Comparison, 'example'>[]) =>
  comparisons.push(...list.map((c) => ({ example, ...c })));

/** gamma_G as in the Finnish annex. */
const withLvl = (f_m_k: number) =>
  variant(lvlOf(edition, f_m_k), (e) =>
    setCase(e, 'gamma-G', 'unfavourable', { kind: 'constant', value: 1.15 }),
  );
const lvl = withLvl(44);

// EX1: joist floor of laminated veneer lumber. The stiffness across was not on the pages read: it was chosen
// to give the printed figures, and is that of 22 mm chipboard with E = 3500 N/mm2. With bracing it is printed.
const ex1 = (loads: Member['loads'], EI_b: number, limits = 'ordinary') =>
  beam(45, {
    grade: 'LVL48P',
    choices: { top_edge: 'length', vibration: 'checked', limits },
    section: { b: 45, h: 240, pieces: 1 },
    spans: [{ length: 4500 }],
    carries: { by: 'spacing', width: 400 },
    loads,
    inputs: { m_floor: 120, B_floor: 5000, EI_b },
  });
{
  const loads = [area('G', 0.9), area('QA', 2)];
  const chipboard = (3500 * 22 ** 3) / 12;
  const r = run(lvl, ex1(loads, chipboard));
  const variable = run(lvl, ex1(loads, chipboard, 'parts'));
  const permanent = run(lvl, ex1([area('G', 0.9)], chipboard));
  const braced = run(lvl, ex1(loads, 73.5e6));
  const alone = run(lvl, ex1(loads, 1));
  const load = (M: number) => ((8 * M) / 4500 ** 2 / 400) * 1000;
  add('EX1-LVL-joist-floor', [
    {
      quantity: 'gammaG',
      computed: behind(r, 'bending', 'gamma_G'),
      unit: '1',
      why: 'Variant: Finnish annex.',
    },
    { quantity: 'gammaQ', computed: behind(r, 'bending', 'gamma_Q'), unit: '1' },
    { quantity: 'kmod', computed: behind(r, 'bending', 'k_mod'), unit: '1' },
    { quantity: 'kdef', computed: behind(r, 'deflection-final', 'k_def'), unit: '1' },
    { quantity: 'gammaM', computed: behind(r, 'bending', 'gamma_M'), unit: '1' },
    { quantity: 'kh', computed: behind(r, 'bending', 'k_h'), unit: '1' },
    { quantity: 'kc90', computed: behind(r, 'bearing', 'k_c90'), unit: '1' },
    { quantity: 'extra_bearing_length_mm', computed: behind(r, 'bearing', 'l_c') - 45, unit: 'mm' },
    { quantity: 'A_mm2', computed: behind(r, 'shear', 'b') * 240, unit: 'mm2' },
    { quantity: 'W_mm3', computed: behind(r, 'bending', 'W'), unit: 'mm3' },
    {
      quantity: 'I_mm4',
      computed: (behind(r, 'bending', 'W') * 240) / 2,
      unit: 'mm4',
      tolerance: 50_000,
      why: 'Printed to three figures.',
    },
    {
      quantity: 'EI_Nmm2',
      computed: behind(r, 'deflection-final', 'EI'),
      unit: 'N mm2',
      tolerance: 5e8,
      why: 'Printed to three figures.',
    },
    {
      quantity: 'GA_N',
      computed: behind(r, 'deflection-final', 'GA') * 1.2,
      unit: 'N',
      why: 'Printed without the form factor 1.2.',
    },
    {
      quantity: 'Ed_ULS_kN_m2',
      computed: load(behind(r, 'bending', 'M')),
      unit: 'kN/m2',
      tolerance: 0.0051,
      why: 'Exactly 4.035.',
    },
    { quantity: 'M_d_kNm', computed: behind(r, 'bending', 'M') / 1e6, unit: 'kN m' },
    { quantity: 'M_d', computed: behind(r, 'bending', 'M') / 1e6, unit: 'kN m' },
    { quantity: 'sigma_md', computed: demand(r, 'bending'), unit: 'N/mm2' },
    { quantity: 'sigma_md by hand', expected: 9.457, computed: demand(r, 'bending'), unit: 'N/mm2' },
    { quantity: 'f_md', computed: limit(r, 'bending'), unit: 'N/mm2' },
    {
      quantity: 'f_md_with_44',
      computed: limit(r, 'bending'),
      unit: 'N/mm2',
      why: 'Slip: the list of properties says 48, the strengths follow from 44.',
    },
    {
      quantity: 'f_md_with_48',
      computed: limit(run(withLvl(48), ex1(loads, chipboard)), 'bending'),
      unit: 'N/mm2',
      why: 'Variant with 48, to show the slip.',
    },
    { quantity: 'V_d_kN', computed: behind(r, 'shear', 'V') / 1000, unit: 'kN' },
    { quantity: 'V_d', computed: behind(r, 'shear', 'V') / 1000, unit: 'kN' },
    { quantity: 'tau_d', computed: demand(r, 'shear'), unit: 'N/mm2' },
    { quantity: 'f_vd', computed: limit(r, 'shear'), unit: 'N/mm2' },
    { quantity: 'sigma_c90', computed: demand(r, 'bearing'), unit: 'N/mm2' },
    { quantity: 'fc90_d_x_kc90', computed: limit(r, 'bearing'), unit: 'N/mm2' },
    { quantity: 'utilisations/bending', computed: utilisation(r, 'bending'), unit: '1', tolerance: 0.0005 },
    { quantity: 'utilisations/shear', computed: utilisation(r, 'shear'), unit: '1', tolerance: 0.0005 },
    { quantity: 'utilisations/bearing', computed: utilisation(r, 'bearing'), unit: '1', tolerance: 0.0005 },
    {
      quantity: 'w_inst_G',
      computed: demand(permanent, 'deflection-instantaneous'),
      unit: 'mm',
      tolerance: 0.005,
    },
    { quantity: 'w_inst_Q', computed: demand(variable, 'deflection-variable'), unit: 'mm', tolerance: 0.005 },
    {
      quantity: 'w_inst_total',
      computed: demand(r, 'deflection-instantaneous'),
      unit: 'mm',
      tolerance: 0.05,
    },
    { quantity: 'w_fin_psi2_0.3', computed: demand(r, 'deflection-final'), unit: 'mm' },
    { quantity: 'f1_Hz', computed: limit(r, 'frequency'), unit: 'Hz' },
    { quantity: 'f1', computed: limit(r, 'frequency'), unit: 'Hz', tolerance: 0.005 },
    {
      quantity: 'n40',
      computed: behind(r, 'velocity', 'n_40'),
      unit: '1',
      why: 'Not independent: the stiffness across was chosen to give it.',
    },
    {
      quantity: 'v_m_per_Ns2',
      computed: demand(r, 'velocity'),
      unit: 'm/(N s2)',
      why: 'Not independent: the stiffness across was chosen to give it.',
    },
    {
      quantity: 'v',
      computed: demand(r, 'velocity'),
      unit: 'm/(N s2)',
      tolerance: 5e-5,
      why: 'Not independent: the stiffness across was chosen to give it.',
    },
    {
      quantity: 'v_limit',
      computed: limit(r, 'velocity'),
      unit: 'm/(N s2)',
      why: 'With b = 150, which the printed limit implies.',
    },
    {
      quantity: 'point_load_defl_mm/0',
      computed: demand(r, 'point-load'),
      unit: 'mm',
      why: 'Not independent: the stiffness across was chosen to give it.',
    },
    {
      quantity: 'point_load_defl_mm/1',
      computed: demand(alone, 'point-load'),
      unit: 'mm',
      why: 'The joist alone: hardly any stiffness across.',
    },
    {
      quantity: 'point_load_governing_mm',
      computed: demand(r, 'point-load'),
      unit: 'mm',
      why: 'Not independent: the stiffness across was chosen to give it.',
    },
    { quantity: 'after_bracing_mm', computed: demand(braced, 'point-load'), unit: 'mm' },
    {
      quantity: 'k_delta_2',
      computed: behind(braced, 'point-load', 'k_delta'),
      unit: '1',
      why: 'From the total of 7.35e4; the source then writes 6.44e4 in its place (slip).',
    },
  ]);
}

// EX2: short beam of laminated veneer lumber. The first page of the source was not reached: the effective
// length is that which its critical stress implies.
const ex2 = (near_support: string) =>
  beam(150, {
    grade: 'LVL48P',
    choices: { top_edge: 'points', load_at: 'middle', near_support },
    section: { b: 45, h: 300, pieces: 1 },
    spans: [{ length: 2300, inputs: { l_top: 602 } }],
    loads: [line('QA', 22.3 / 1.5)],
  });
{
  const full = run(lvl, ex2('kept'));
  const left = run(lvl, ex2('left-out'));
  add('EX2-LVL-short-header', [
    { quantity: 'kmod', computed: behind(full, 'bending', 'k_mod'), unit: '1' },
    { quantity: 'gammaM', computed: behind(full, 'bending', 'gamma_M'), unit: '1' },
    {
      quantity: 'sigma_m_crit',
      computed: behind(full, 'bending', 'sigma_m_crit'),
      unit: 'N/mm2',
      why: 'With the effective length of 602 mm that it implies.',
    },
    { quantity: 'lambda_rel_m', computed: behind(full, 'bending', 'lambda_rel_m'), unit: '1' },
    {
      quantity: 'lambda',
      computed: behind(full, 'bending', 'lambda_rel_m'),
      unit: '1',
      tolerance: 0.0001,
      why: 'The implied length is rounded to the millimetre.',
    },
    {
      quantity: 'kcrit',
      computed: behind(full, 'bending', 'k_crit'),
      unit: '1',
      tolerance: 0.006,
      why: 'Exactly 0.9745; the product uses 0.975.',
    },
    { quantity: 'f_md', computed: limit(full, 'bending') / behind(full, 'bending', 'k_crit'), unit: 'N/mm2' },
    { quantity: 'kcrit_f_md', computed: limit(full, 'bending'), unit: 'N/mm2' },
    { quantity: 'M_d_kNm', computed: behind(full, 'bending', 'M') / 1e6, unit: 'kN m' },
    { quantity: 'sigma_md', computed: demand(full, 'bending'), unit: 'N/mm2', tolerance: 0.006 },
    { quantity: 'V_d_kN', computed: behind(full, 'shear', 'V') / 1000, unit: 'kN' },
    {
      quantity: 'tau_d',
      computed: demand(full, 'shear'),
      unit: 'N/mm2',
      tolerance: 0.01,
      why: 'Worked on from 25.6 kN, rounded.',
    },
    { quantity: 'f_vd', computed: limit(full, 'shear'), unit: 'N/mm2' },
    {
      quantity: 'V_red_kN',
      computed: behind(left, 'shear', 'V_d') / 1000,
      unit: 'kN',
      tolerance: 0.1,
      why: 'Exactly 17.28; the source cuts it off.',
    },
    { quantity: 'tau_red', computed: demand(left, 'shear'), unit: 'N/mm2' },
    {
      quantity: 'sigma_c90',
      computed: (demand(full, 'bearing') * behind(full, 'bearing', 'l_c')) / 165,
      unit: 'N/mm2',
      tolerance: 0.06,
      why: 'Contact length 150 + 15 mm; exactly 3.454, cut off.',
    },
    { quantity: 'kc90', computed: behind(full, 'bearing', 'k_c90'), unit: '1' },
    { quantity: 'fc90_d', computed: limit(full, 'bearing'), unit: 'N/mm2' },
    {
      quantity: 'implied_l_ef_mm_general_formula_G05_400',
      computed: behind(full, 'bending', 'l_ef'),
      unit: 'mm',
    },
  ]);
}

// EX7: lintel of two pieces; the source was read as far as its list of loads, so section, spans and the
// durations that its three variable loads bring.
const withCeiling = variant(edition, (e) => {
  const storage = e.actions.find(({ id }) => id === 'QE');
  if (!storage) throw new Error('No long-term action.');
  e.actions.push({ ...structuredClone(storage), id: 'Qc', symbol: 'Q_c', title: 'Ceiling, imposed' });
});
const ex7 = beam(76, {
  grade: 'C24',
  choices: { self_weight: 'added', service_class: 'sc2', top_edge: 'length' },
  section: { b: 45, h: 195, pieces: 2 },
  spanMeasured: 'clear',
  spans: [{ length: 1800 }],
  loads: [line('G', 5), line('S', 2.1), line('Qc', 1), line('QA', 3)],
});
{
  const r = run(withCeiling, ex7);
  add('EX7-TRADA-F5-lintel', [
    { quantity: 'A_mm2', computed: behind(r, 'bending', 'A'), unit: 'mm2' },
    {
      quantity: 'W_mm3',
      computed: behind(r, 'bending', 'W'),
      unit: 'mm3',
      tolerance: 50,
      why: 'Printed to four figures.',
    },
    { quantity: 'W', computed: behind(r, 'bending', 'W'), unit: 'mm3' },
    {
      quantity: 'I_mm4',
      computed: behind(r, 'deflection-final', 'I'),
      unit: 'mm4',
      tolerance: 5000,
      why: 'Printed to four figures.',
    },
    { quantity: 'I', computed: behind(r, 'deflection-final', 'I'), unit: 'mm4' },
    { quantity: 'self_weight_kN_per_m', computed: behind(r, 'bending', 'g_self'), unit: 'kN/m' },
    { quantity: 'effective span', expected: 1876, computed: behind(r, 'deflection-final', 'L'), unit: 'mm' },
  ]);
}

// EX11: two lines of results, without section or span. 108 x 600 with the system factor was chosen to give
// them, so only the bearing strengths are a check. Strengths of the older standard; no crack factor then.
const older = (f_c90_k: number) =>
  variant(edition, (e) => {
    setGrade(e, 'GL24h', { f_c90_k });
    const cracks = e.tables.find(({ id }) => id === 'cracks');
    if (cracks) cracks.values = [1, 1, 1, 1];
  });
{
  const given = beam(150, {
    grade: 'GL24h',
    choices: { top_edge: 'length', load_sharing: 'system' },
    section: { b: 108, h: 600, pieces: 1 },
    spans: [{ length: 8000 }],
    loads: [...points('S', (2 * 33.62) / 1.5, 4000)],
  });
  const one = run(older(2.7), given);
  const two = run(older(3), given);
  add('EX11-glulam-two-results-only', [
    {
      quantity: 'case_1/f_mr_y_d',
      computed: limit(one, 'bending'),
      unit: 'N/mm2',
      why: '24 x 0.9 x 1.1 / 1.25; not independent: that the 1.1 is the system factor was chosen to give it.',
    },
    {
      quantity: 'case_1/V_d_kN',
      computed: behind(one, 'shear', 'V') / 1000,
      unit: 'kN',
      why: 'Not independent: the load was taken from it.',
    },
    {
      quantity: 'case_1/tau_d',
      computed: demand(one, 'shear'),
      unit: 'N/mm2',
      why: 'Variant without crack factor. Not independent: the section was chosen to give it.',
    },
    {
      quantity: 'case_1/kc90_fc90_d',
      computed: limit(one, 'bearing'),
      unit: 'N/mm2',
      tolerance: 0.005,
      why: 'Variant with 2.7 of the older standard.',
    },
    {
      quantity: 'case_2/kc90_fc90_d',
      computed: limit(two, 'bearing'),
      unit: 'N/mm2',
      why: 'Variant with 3.0 of the older standard.',
    },
  ]);
}

// EX12: the loads were not on the pages reached; factors and span as far as they go.
const ex12 = beam(85, {
  grade: 'C24',
  choices: { service_class: 'sc2', top_edge: 'length' },
  section: { b: 63, h: 225, pieces: 1 },
  spanMeasured: 'clear',
  spans: [{ length: 3100 }],
  loads: [line('G', 1), line('QA', 2), ...points('G', 1, 1550)],
});
{
  const r = run(edition, ex12);
  add('EX12-notched-63x225', [
    { quantity: 'kdef', computed: behind(r, 'deflection-final', 'k_def'), unit: '1' },
    { quantity: 'ksys', computed: behind(r, 'bending', 'k_sys'), unit: '1' },
    {
      quantity: 'effective span',
      expected: 3185,
      computed: behind(r, 'deflection-final', 'L'),
      unit: 'mm',
      why: 'Clear span and half a bearing at each end.',
    },
    {
      quantity: 'gammaM',
      expected: 1.3,
      computed: behind(r, 'bending', 'gamma_M'),
      unit: '1',
      why: 'Among the inputs of the source.',
    },
    { quantity: 'gammaG', expected: 1.35, computed: behind(r, 'bending', 'gamma_G'), unit: '1' },
    { quantity: 'psi2', expected: 0.3, computed: behind(r, 'deflection-final', 'psi_2'), unit: '1' },
  ]);
}

// EX17: coefficients of continuous beams, as the analysis gives them for spans and loads of 1.
const coefficients = (spans: number, loads: readonly BeamLoad[]) => {
  const lengths = Array.from({ length: spans }, () => 1);
  const restraints = Array.from({ length: spans + 1 }, () => 'pin' as const);
  const outcome = solve({ spans: lengths, restraints, EI: 1 }, loads);
  if (!outcome.ok) throw new Error(outcome.problems[0]?.message);
  const { moment, reactions } = outcome.effects;
  const found = peakPerSpan(moment, lengths);
  return {
    most: (span: number) => found[span]?.most ?? { x: NaN, value: NaN },
    least: (span: number) => found[span]?.least.value ?? NaN,
    reaction: (support: number) => reactions[support] ?? NaN,
  };
};
const over = (...spans: number[]): BeamLoad[] =>
  spans.map((i) => ({ kind: 'line', from: i, to: i + 1, startIntensity: 1, endIntensity: 1 }));
const middle = (...spans: number[]): BeamLoad[] =>
  spans.map((i) => ({ kind: 'point', x: i + 0.5, force: 1 }));
{
  const id = 'EX17-continuous-coefficients';
  const reactions = (name: string, c: ReturnType<typeof coefficients>, count: number) =>
    add(
      id,
      Array.from({ length: count }, (_, i) => ({
        quantity: `${name}/R/${i}`,
        computed: c.reaction(i),
        unit: 'q L',
      })),
    );
  const two = coefficients(2, over(0, 1));
  const one = coefficients(2, over(0));
  const three = coefficients(3, over(0, 1, 2));
  const ends = coefficients(3, over(0, 2));
  const mid = coefficients(3, over(1));
  const pointBoth = coefficients(2, middle(0, 1));
  const pointOne = coefficients(2, middle(0));
  const neighbours = coefficients(3, over(0, 1));
  add(id, [
    { quantity: 'udl/two_spans_all_loaded/M_span', computed: two.most(0).value, unit: 'q L2' },
    { quantity: 'udl/two_spans_all_loaded/at_x_over_L', computed: two.most(0).x, unit: 'L' },
    { quantity: 'udl/two_spans_all_loaded/M_support', computed: two.least(0), unit: 'q L2' },
    { quantity: 'udl/two_spans_one_loaded/M_span', computed: one.most(0).value, unit: 'q L2' },
    { quantity: 'udl/two_spans_one_loaded/at_x_over_L', computed: one.most(0).x, unit: 'L' },
    { quantity: 'udl/two_spans_one_loaded/M_support', computed: one.least(0), unit: 'q L2' },
    { quantity: 'udl/three_spans_all_loaded/M_end_span', computed: three.most(0).value, unit: 'q L2' },
    { quantity: 'udl/three_spans_all_loaded/M_mid_span', computed: three.most(1).value, unit: 'q L2' },
    { quantity: 'udl/three_spans_all_loaded/M_support', computed: three.least(0), unit: 'q L2' },
    { quantity: 'udl/three_spans_end_spans_loaded/M_end_span', computed: ends.most(0).value, unit: 'q L2' },
    { quantity: 'udl/three_spans_end_spans_loaded/M_mid', computed: ends.most(1).value, unit: 'q L2' },
    { quantity: 'udl/three_spans_middle_loaded/M_mid', computed: mid.most(1).value, unit: 'q L2' },
    { quantity: 'udl/three_spans_middle_loaded/M_support', computed: mid.least(1), unit: 'q L2' },
    { quantity: 'point_at_midspan/two_spans_all/M_span', computed: pointBoth.most(0).value, unit: 'P L' },
    { quantity: 'point_at_midspan/two_spans_all/M_support', computed: pointBoth.least(0), unit: 'P L' },
    { quantity: 'point_at_midspan/two_spans_one/M_span', computed: pointOne.most(0).value, unit: 'P L' },
    { quantity: 'point_at_midspan/two_spans_one/M_support', computed: pointOne.least(0), unit: 'P L' },
    { quantity: 'M1', computed: neighbours.most(0).value, unit: 'q L2' },
    { quantity: 'M3', computed: neighbours.least(2), unit: 'q L2' },
    {
      quantity: 'R2',
      computed: neighbours.reaction(1),
      unit: 'q L',
      tolerance: 0.00011,
      why: 'Exactly 1.2, by the equation of three moments; the source adds rounded parts.',
    },
  ]);
  reactions('udl/two_spans_all_loaded', two, 3);
  reactions('udl/two_spans_one_loaded', one, 3);
  reactions('udl/three_spans_all_loaded', three, 4);
  reactions('udl/three_spans_end_spans_loaded', ends, 4);
  reactions('udl/three_spans_middle_loaded', mid, 4);
  reactions('point_at_midspan/two_spans_all', pointBoth, 3);
}

const rows = rowsFor(examples, comparisons);

describe('worked examples of limit state design', () => {
  it.each(rows)('$example: $quantity is $given', ({ computed, expected, tolerance }) => {
    expect(Math.abs(computed - expected)).toBeLessThanOrEqual(tolerance);
  });

  it('leaves none of the examples out', () => {
    expect(new Set(rows.map((r) => r.example))).toEqual(new Set(examples.published.map(({ id }) => id)));
  });

  it('keeps the table of comparisons up to date', async () => {
    await expect(tableOf('Worked examples, limit state', examples, rows)).toMatchFileSnapshot('TABLE-en.md');
  });
});

describe('verdicts of the worked examples', () => {
  it('EX1 passes in strength and in frequency, and fails under the point load unless braced', () => {
    const loads = [area('G', 0.9), area('QA', 2)];
    const r = run(lvl, ex1(loads, (3500 * 22 ** 3) / 12));
    expect(['bending', 'shear', 'bearing', 'frequency'].map((id) => checkOf(r, id).word)).toEqual(
      Array(4).fill('passes'),
    );
    expect(checkOf(r, 'point-load').word).toBe('fails');
  });

  it('EX2 fails in shear, and passes with the load near the support left out', () => {
    expect(checkOf(run(lvl, ex2('kept')), 'shear').word).toBe('fails');
    expect(checkOf(run(lvl, ex2('left-out')), 'shear').word).toBe('passes');
  });

  it('EX7 takes the duration of each combination from its shortest load', () => {
    const { combinations } = run(withCeiling, ex7);
    const of = (...actions: string[]) =>
      combinations.find(
        (c) =>
          c.state === 'strength' &&
          c.terms
            .map((t) => t.action)
            .sort()
            .join() === actions.sort().join(),
      )?.duration;
    expect(of('G')).toBe('permanent');
    expect(of('G', 'Qc')).toBe('long');
    expect(of('G', 'QA', 'Qc')).toBe('medium');
    expect(of('G', 'QA', 'Qc', 'S')).toBe('short');
  });

  it('EX17 through the edition: spans loaded to the worst', () => {
    const unit = variant(edition, (e) => {
      setCase(e, 'gamma-Q', 'unfavourable', { kind: 'constant', value: 1 });
      delete e.analysis.shearStiffness;
    });
    const outcome = compile(unit);
    if (!outcome.ok) throw new Error('The variant does not compile.');
    const given = beam(100, {
      grade: 'C24',
      section: { b: 100, h: 300, pieces: 1 },
      spans: [{ length: 6000 }, { length: 6000 }],
      loads: [line('QA', 5)],
    });
    const M = curves(outcome.plan, given)?.peaks.filter(({ of }) => of === 'M') ?? [];
    const values = M.map(({ value }) => value / (5 * 6000 ** 2));
    expect(Math.max(...values)).toBeCloseTo(49 / 512, 9);
    expect(Math.min(...values)).toBeCloseTo(-1 / 8, 9);
    const [first] = run(unit, given).reactions;
    expect(first?.uplift).toBe(true);
    expect((first?.least.value ?? NaN) / (5 * 6000)).toBeCloseTo(-1 / 16, 9);
    expect((first?.most.value ?? NaN) / (5 * 6000)).toBeCloseTo(7 / 16, 9);
  });
});

describe('proofs of the starter edition', () => {
  it.each(proofsOf(edition))('$title', ({ problems, lines }) => {
    expect(problems).toEqual([]);
    expect(lines.filter(({ holds }) => !holds)).toEqual([]);
  });
});
