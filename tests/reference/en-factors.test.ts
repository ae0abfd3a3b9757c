import { describe, expect, it } from 'vitest';
import type { Member } from '#shared/basis/schema/index.ts';
import { behind, checkOf, demand, limit, line, member, points, run, starter } from './worked.ts';
import { lvlOf } from './lvl.ts';

const edition = starter('limit-state-en');
const beam = (bearing: number, given: Parameters<typeof member>[2]): Member =>
  member('metric', bearing, { ...given, choices: { self_weight: 'in-loads', ...given.choices } });

describe('factors of the starter edition, each against the value by hand', () => {
  const joist = beam(75, {
    grade: 'C24',
    choices: { top_edge: 'length' },
    section: { b: 47, h: 220, pieces: 1 },
    spans: [{ length: 4000 }],
    loads: [line('G', 0.5), line('QA', 0.8)],
  });
  const changed = (change: Partial<Member>, choices: Record<string, string> = {}) =>
    run(edition, { ...joist, ...change, choices: { ...joist.choices, ...choices } });
  const of = (grade: string, h: number, symbol: string, b = 90) =>
    behind(changed({ grade, section: { b, h, pieces: 1 } }), 'bending', symbol);

  it.each([
    ['C24', 60, (150 / 60) ** 0.2],
    ['C24', 40, 1.3],
    ['C24', 149, (150 / 149) ** 0.2],
    ['C24', 150, 1],
    ['C24', 300, 1],
    ['GL24h', 240, (600 / 240) ** 0.1],
    ['GL24h', 200, 1.1],
    ['GL24h', 600, 1],
    ['GL24h', 900, 1],
  ])('takes the depth factor of %s at %d mm', (grade, h, expected) => {
    expect(of(grade, h, 'k_h')).toBeCloseTo(expected, 12);
  });

  it('lets the depth factor of laminated veneer lumber fall below 1', () => {
    const r = run(lvlOf(edition, 44), { ...joist, grade: 'LVL48P', section: { b: 45, h: 400, pieces: 1 } });
    expect(behind(r, 'bending', 'k_h')).toBeCloseTo(0.75 ** 0.15, 12);
  });

  it.each([
    ['sc1', 'G', 0.6],
    ['sc2', 'QE', 0.7],
    ['sc1', 'QA', 0.8],
    ['sc2', 'S', 0.9],
    ['sc3', 'G', 0.5],
    ['sc3', 'QE', 0.55],
    ['sc3', 'QA', 0.65],
    ['sc3', 'S', 0.7],
  ])('takes duration and moisture in %s under %s', (service_class, action, expected) => {
    expect(behind(changed({ loads: [line(action, 1)] }, { service_class }), 'bending', 'k_mod')).toBe(
      expected,
    );
  });

  it('lets the permanent load alone govern where its duration outweighs its size', () => {
    const r = changed({ loads: [line('G', 1), line('S', 0.2)] });
    expect(checkOf(r, 'bending').governing.combination).toBe('fundamental/G');
    // 1.35 x 1 / 0.6 against (1.35 x 1 + 1.5 x 0.2) / 0.9
    expect(1.35 / 0.6).toBeGreaterThan(1.65 / 0.9);
  });

  it('writes out each variable load leading, and leaves out what never comes together', () => {
    const { combinations } = changed({ loads: [line('G', 1), line('QA', 1), line('S', 1), line('QH', 1)] });
    const terms = combinations
      .filter(({ state }) => state === 'strength')
      .map((c) =>
        c.terms.map(({ action, factor }) => `${String(Number(factor.toFixed(3)))} ${action}`).join(' + '),
      );
    expect(terms).toContain('1.35 G + 1.5 QA + 0.75 S');
    expect(terms).toContain('1.35 G + 1.05 QA + 1.5 S');
    expect(terms).toContain('1.35 G + 1.05 QA + 1.5 QH');
    expect(terms).toContain('1.35 G');
    expect(terms.filter((each) => each.includes('QH') && each.includes('S'))).toEqual([]);
  });

  it('holds the permanent load down where wind lifts', () => {
    const { combinations } = changed({ loads: [line('G', 0.2), line('Wu', -1)] });
    const lifting = combinations.find(({ pattern }) => pattern === 'favourable');
    expect(lifting?.terms.map(({ action, factor }) => [action, factor])).toEqual([
      ['G', 1],
      ['Wu', 1.5],
    ]);
  });

  it('lets creep and the combination values into the final deflection', () => {
    const { combinations } = changed(
      { loads: [line('G', 1), line('QA', 1), line('S', 1)] },
      { service_class: 'sc2', limits: 'parts' },
    );
    const factors = (pattern: string, leading: string) =>
      combinations
        .find((c) => c.pattern === pattern && c.leading === leading)
        ?.terms.map(({ action, factor }) => [action, Number(factor.toFixed(9))]);
    expect(factors('characteristic', 'QA')).toEqual([
      ['G', 1],
      ['QA', 1],
      ['S', 0.5],
    ]);
    expect(factors('final', 'QA')).toEqual([
      ['G', 1.8],
      ['QA', 1 + 0.3 * 0.8],
      ['S', 0.5],
    ]);
    expect(factors('added', 'S')).toEqual([
      ['G', 0.8],
      ['QA', 0.7 + 0.3 * 0.8],
      ['S', 1],
    ]);
    expect(factors('variable', 'S')).toEqual([
      ['QA', 0.7],
      ['S', 1],
    ]);
    expect(
      combinations
        .find(({ pattern }) => pattern === 'quasi-permanent')
        ?.terms.map(({ action, factor }) => [action, Number(factor.toFixed(9))]),
    ).toEqual([
      ['G', 1.8],
      ['QA', 0.54],
    ]);
  });

  const pin = (bearing: number) => ({ restraint: 'pin' as const, bearing });
  const held = { top_edge: 'supports' };
  const cantilever = (loads: Member['loads']) => ({
    supports: [{ restraint: 'fixed' as const, bearing: 75 }, { restraint: 'free' as const }],
    loads,
  });
  it.each<[string, Partial<Member>, Record<string, string>, number]>([
    ['even load on top', {}, {}, 0.9 * 4000 + 2 * 220],
    ['even load at mid-depth', {}, { load_at: 'middle' }, 0.9 * 4000],
    ['even load underneath', {}, { load_at: 'bottom' }, 0.9 * 4000 - 0.5 * 220],
    ['a point load at the middle', { loads: points('QA', 3, 2000) }, { one_point: 'yes' }, 0.8 * 4000 + 440],
    ['point loads anywhere', { loads: points('QA', 3, 1000) }, {}, 4000 + 440],
    [
      'held at points',
      { spans: [{ length: 4000, inputs: { l_top: 1000 } }] },
      { top_edge: 'points' },
      1000 + 440,
    ],
    ['a cantilever, even load', cantilever([line('QA', 1)]), {}, 0.5 * 4000 + 440],
    ['a cantilever, load at its end', cantilever(points('QA', 1, 4000)), {}, 0.8 * 4000 + 440],
  ])('takes the effective length for %s', (_, change, choices, expected) => {
    expect(behind(changed(change, { ...held, ...choices }), 'bending', 'l_ef')).toBeCloseTo(expected, 9);
  });

  it('takes the formula of softwood for solid softwood and the general one for others', () => {
    const slender = (grade: string) =>
      changed({ grade, section: { b: 60, h: 400, pieces: 1 }, spans: [{ length: 6000 }] }, held);
    const length = 0.9 * 6000 + 800;
    expect(behind(slender('C24'), 'bending', 'sigma_m_crit')).toBeCloseTo(
      (0.78 * 60 ** 2 * 7400) / (400 * length),
      9,
    );
    const I_z = (400 * 60 ** 3) / 12;
    const I_tor = ((1 - (0.63 * 60) / 400) / 3) * 400 * 60 ** 3;
    const general = (E: number, G: number) =>
      (Math.PI * Math.sqrt(E * I_z * G * I_tor)) / (length * ((60 * 400 ** 2) / 6));
    expect(behind(slender('GL28h'), 'bending', 'sigma_m_crit')).toBeCloseTo(general(10_500, 540), 9);
    expect(behind(slender('D30'), 'bending', 'sigma_m_crit')).toBeCloseTo(general(9200, 9200 / 16), 9);
  });

  it('lowers the strength with slenderness in three zones that meet', () => {
    const k = (length: number) => {
      const r = changed({ section: { b: 60, h: 200, pieces: 1 }, spans: [{ length }] }, held);
      return { k_crit: behind(r, 'bending', 'k_crit'), lambda: behind(r, 'bending', 'lambda_rel_m') };
    };
    for (const length of [1000, 2500, 4000, 6000, 9000, 12_000]) {
      const { k_crit, lambda } = k(length);
      const expected = lambda <= 0.75 ? 1 : lambda <= 1.4 ? 1.56 - 0.75 * lambda : 1 / lambda ** 2;
      expect(k_crit).toBeCloseTo(expected, 12);
    }
    expect(k(1000).lambda).toBeLessThan(0.75);
    expect(k(12_000).lambda).toBeGreaterThan(1.4);
  });

  it('does not let pieces side by side act as one sideways', () => {
    const r = (b: number, pieces: number) =>
      behind(changed({ section: { b, h: 300, pieces } }, held), 'bending', 'k_crit');
    expect(r(45, 2)).toBeCloseTo(r(45, 1), 12);
    expect(r(45, 2)).toBeLessThan(r(90, 1));
  });

  it('looks at the bottom edge where a continuous member hogs', () => {
    const two = { spans: [{ length: 4000 }, { length: 4000 }], supports: [75, 75, 75].map(pin) };
    const r = changed({ ...two, section: { b: 45, h: 300, pieces: 1 } });
    expect(behind(r, 'bending', 'k_crit')).toBeLessThan(1);
    expect(behind(changed(two, { bottom_edge: 'length' }), 'bending', 'k_crit')).toBe(1);
  });

  it('refuses a member that can turn at its supports', () => {
    expect(checkOf(changed({}, { ends_held: 'no' }), 'bending')).toMatchObject({
      word: 'fails',
      refused: expect.stringContaining('turning'),
    });
  });

  it('raises bending and shear by the system factor, not bearing', () => {
    const ratio = (id: string) => limit(changed({}, { load_sharing: 'system' }), id) / limit(changed({}), id);
    expect(['bending', 'shear', 'bearing'].map((id) => Number(ratio(id).toFixed(12)))).toEqual([1.1, 1.1, 1]);
  });

  it.each([
    ['end support, even load', 75, {}, [line('QA', 1)], 105, 1.5],
    ['end support, run on by 20 mm', 75, { beyond: 20 }, [line('QA', 1)], 125, 1.5],
    ['end support, run on far', 75, { beyond: 500 }, [line('QA', 1)], 135, 1.5],
    ['short bearing', 20, { beyond: 500 }, [line('QA', 1)], 60, 1.5],
    ['a point load, its distance not known', 75, {}, points('QA', 1, 2000), 75, 1],
    ['a point load 100 mm away', 75, { l_1: 100 }, points('QA', 1, 2000), 105, 1],
    ['a point load 40 mm away', 75, { l_1: 40 }, points('QA', 1, 2000), 95, 1],
    ['a point load at twice the depth', 75, { l_1: 440 }, points('QA', 1, 2000), 105, 1.5],
  ])('takes contact length and bearing factor: %s', (_, bearing, inputs, loads, length, factor) => {
    const r = changed({ loads, supports: [bearing, bearing].map((each) => ({ ...pin(each), inputs })) });
    expect(behind(r, 'bearing', 'l_c')).toBeCloseTo(length, 9);
    expect(behind(r, 'bearing', 'k_c90')).toBe(factor);
  });

  it.each([
    ['C24', 400, 1.5],
    ['GL24h', 400, 1.75],
    ['GL24h', 401, 1],
    ['D30', 100, 1],
  ])('takes the bearing factor of %s on %d mm', (grade, bearing, expected) => {
    expect(behind(changed({ grade, supports: [pin(bearing), pin(bearing)] }), 'bearing', 'k_c90')).toBe(
      expected,
    );
  });

  const notched = (inputs: Record<string, number>, choices: Record<string, string> = {}, grade = 'C24') =>
    changed({ grade, supports: [{ ...pin(100), inputs }, pin(100)] }, choices);
  it.each([
    ['C24', 5, 0],
    ['GL24h', 6.5, 0],
    ['C24', 5, 2],
  ])('takes the notch factor of %s', (grade, k_n, notch_slope) => {
    const r = notched({ notch_depth: 55, notch_length: 30, notch_slope }, {}, grade);
    const alpha = 165 / 220;
    const under = Math.sqrt(alpha * (1 - alpha)) + ((0.8 * 80) / 220) * Math.sqrt(1 / alpha - alpha ** 2);
    const expected = (k_n * (1 + (1.1 * notch_slope ** 1.5) / Math.sqrt(220))) / (Math.sqrt(220) * under);
    expect(behind(r, 'notch', 'k_v')).toBeCloseTo(Math.min(1, expected), 12);
    expect(demand(r, 'notch')).toBeCloseTo((1.5 * behind(r, 'notch', 'V')) / (0.67 * 47 * 165), 12);
  });

  it('leaves the strength alone at a notch on the edge away from the support', () => {
    expect(behind(notched({ notch_depth: 55 }, { notched_edge: 'top' }), 'notch', 'k_v')).toBe(1);
  });

  it('refuses a notch that leaves nothing', () => {
    expect(checkOf(notched({ notch_depth: 220 }), 'notch').refused).toContain('nothing');
  });

  it.each([
    ['ordinary', 4000 / 300, 4000 / 250, 4000 / 150],
    ['strict', 4000 / 500, 4000 / 350, 4000 / 300],
  ])('takes the %s limits of deflection', (limits, ...expected) => {
    const r = changed({}, { limits });
    const found = ['instantaneous', 'net-final', 'final'].map((id) => limit(r, `deflection-${id}`));
    expect(found.map((each) => each.toFixed(9))).toEqual(expected.map((each) => each.toFixed(9)));
  });

  it('takes precamber off the net deflection only', () => {
    const flat = changed({});
    const cambered = changed({ spans: [{ length: 4000, inputs: { camber: 5 } }] });
    expect(demand(cambered, 'deflection-net-final')).toBeCloseTo(demand(flat, 'deflection-net-final') - 5, 9);
    expect(demand(cambered, 'deflection-final')).toBeCloseTo(demand(flat, 'deflection-final'), 9);
  });
});
