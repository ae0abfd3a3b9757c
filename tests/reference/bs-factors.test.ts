import { describe, expect, it } from 'vitest';
import type { Member } from '#shared/basis/schema/index.ts';
import { behind, checkOf, demand, limit, line, member, run, starter } from './worked.ts';

const edition = starter('permissible-stress-softwood');
const beam = (bearing: number, given: Parameters<typeof member>[2]): Member =>
  member('metric', bearing, {
    ...given,
    choices: { self_weight: 'in-loads', held: 'edge', ...given.choices },
  });

describe('factors of the starter edition, each against the value by hand', () => {
  const joist = beam(75, {
    grade: 'C24',
    section: { b: 47, h: 195, pieces: 1 },
    spans: [{ length: 3600 }],
    carries: { by: 'spacing', width: 400 },
    loads: [line('G', 0.5), line('Q', 0.6)],
  });
  const changed = (change: Partial<Member>, choices: Record<string, string> = {}) =>
    run(edition, { ...joist, ...change, choices: { ...joist.choices, ...choices } });
  const deep = (h: number) => changed({ section: { b: 75, h, pieces: 1 } });

  it.each([
    [60, 1.17],
    [72, 1.17],
    [73, (300 / 73) ** 0.11],
    [300, 1],
    [301, (0.81 * (301 ** 2 + 92_300)) / (301 ** 2 + 56_800)],
    [450, (0.81 * (450 ** 2 + 92_300)) / (450 ** 2 + 56_800)],
  ])('takes the depth factor at %d mm', (h, expected) => {
    expect(behind(deep(h), 'bending', 'K_7')).toBeCloseTo(expected, 12);
  });

  it('takes the duration of each combination, and lets a smaller long-term load govern', () => {
    const floor = changed({ loads: [line('G', 1), line('S', 0.2)] });
    expect(checkOf(floor, 'bending').governing.combination).toBe('service/G');
    const snow = changed({ loads: [line('G', 1), line('S', 0.3)] });
    expect(checkOf(snow, 'bending').governing.combination).toBe('service/S');
    expect(behind(snow, 'bending', 'K_3')).toBe(1.25);
  });

  it.each([
    ['Q', 1],
    ['Qt', 1.25],
    ['S', 1.25],
    ['W15', 1.5],
    ['W3', 1.75],
  ])('takes %s for its duration, K3 = %d', (action, expected) => {
    expect(behind(changed({ loads: [line(action, 5)] }), 'bending', 'K_3')).toBe(expected);
  });

  it('lowers each property by its own factor out of doors, stiffness too', () => {
    const r = changed({}, { exposure: 'sc3' });
    expect(behind(r, 'bending', 'K_2_m')).toBe(0.8);
    expect(behind(r, 'shear', 'K_2_v')).toBe(0.9);
    expect(behind(r, 'bearing', 'K_2_p')).toBe(0.6);
    expect(behind(r, 'deflection', 'E_used')).toBeCloseTo(7200 * 0.8, 9);
  });

  it('takes the mean modulus only for members that share load, and not where floors vibrate', () => {
    const modulus = (change: Partial<Member>, choices: Record<string, string>) =>
      behind(changed(change, choices), 'deflection', 'E_used');
    const system = { load_sharing: 'system' };
    expect(modulus({}, {})).toBe(7200);
    expect(modulus({}, system)).toBe(10_800);
    expect(modulus({}, { ...system, floor_load: 'plant-storage-vibration' })).toBe(7200);
    expect(modulus({ carries: { by: 'spacing', width: 610 } }, system)).toBe(10_800);
    expect(modulus({ carries: { by: 'spacing', width: 611 } }, system)).toBe(7200);
  });

  it.each([
    ['C24', 1, 1],
    ['C24', 2, 1.14],
    ['C24', 3, 1.21],
    ['C24', 4, 1.24],
    ['C24', 6, 1.24],
    ['D40', 2, 1.06],
    ['D40', 5, 1.1],
  ])('raises the stiffness of a trimmer in %s of %d pieces by %d', (grade, pieces, expected) => {
    const r = changed({ grade, section: { b: 47, h: 195, pieces } }, { load_sharing: 'built-up' });
    expect(behind(r, 'deflection', 'K_9')).toBe(expected);
    expect(behind(r, 'bending', 'K_8')).toBe(pieces > 1 ? 1.1 : 1);
  });

  it.each([
    [50, 100, 1.2],
    [50, 75, 1.2],
    [50, 74, 1],
    [60, 100, 1.2 - (0.06 * 10) / 25],
    [150, 100, 1],
    [200, 100, 1],
  ])('takes the bearing factor for %d mm, %d mm from the end', (bearing, beyond, expected) => {
    const supports = [0, 1].map(() => ({ restraint: 'pin' as const, bearing, inputs: { beyond } }));
    expect(behind(changed({ supports }), 'bearing', 'K_4')).toBeCloseTo(expected, 12);
  });

  it('knows the distance to the end over an inner support', () => {
    const r = changed({
      spans: [{ length: 3600 }, { length: 3600 }],
      supports: [75, 50, 75].map((bearing) => ({ restraint: 'pin', bearing })),
    });
    expect(checkOf(r, 'bearing').governing.place).toContain('support 2');
    expect(behind(r, 'bearing', 'K_4')).toBe(1.2);
  });

  it.each([
    ['bottom', 45, 0, 150 / 195],
    ['top', 45, 100, (195 * (150 - 100) + 100 * 150) / 150 ** 2],
    ['top', 45, 150, 1],
    ['top', 45, 200, 1],
  ])(
    'takes a notch in the %s edge, %d mm deep and %d mm long',
    (edge, notch_depth, notch_length, expected) => {
      const supports = [0, 1].map(() => ({
        restraint: 'pin' as const,
        bearing: 75,
        inputs: { notch_depth, notch_length },
      }));
      const r = changed({ supports }, { notched_edge: edge });
      expect(behind(r, 'notch', 'K_5')).toBeCloseTo(expected, 12);
      expect(demand(r, 'notch')).toBeCloseTo((1.5 * behind(r, 'notch', 'V')) / (47 * 150), 12);
    },
  );

  it('refuses a notch that leaves less than half of the depth', () => {
    const supports = [98, 0].map((notch_depth) => ({
      restraint: 'pin' as const,
      bearing: 75,
      inputs: { notch_depth },
    }));
    expect(checkOf(changed({ supports }), 'notch')).toMatchObject({
      word: 'fails',
      refused: expect.stringContaining('half of the depth'),
    });
  });

  it.each([
    ['none', 2],
    ['ends', 3],
    ['line', 4],
    ['edge', 5],
    ['bridged', 6],
    ['both-edges', 7],
  ])('lets depth to breadth go to its bound when held by %s', (held, expected) => {
    expect(limit(changed({}, { held }), 'proportions')).toBe(expected);
  });

  it('counts pieces side by side together against turning over only where they act as one', () => {
    const pair = { section: { b: 47, h: 195, pieces: 2 } };
    expect(demand(changed(pair), 'proportions')).toBeCloseTo(195 / 47, 12);
    expect(demand(changed(pair, { load_sharing: 'built-up' }), 'proportions')).toBeCloseTo(195 / 94, 12);
  });

  it.each([
    ['general', 3600, 10.8],
    ['general', 6000, 18],
    ['domestic-floor', 3600, 10.8],
    ['domestic-floor', 6000, 14],
    ['domestic-floor-unstrutted', 6000, 12],
  ])('limits the deflection for %s on %d mm to %d mm', (use, length, expected) => {
    expect(limit(changed({ spans: [{ length }] }, { use }), 'deflection')).toBeCloseTo(expected, 12);
  });

  it('takes the higher stress across the grain only where wane is excluded', () => {
    expect(behind(changed({}), 'bearing', 'f_p')).toBe(1.9);
    expect(behind(changed({}, { wane: 'none' }), 'bearing', 'f_p')).toBe(2.4);
  });

  it('adds the self-weight from the mean density', () => {
    const r = changed({ loads: [] }, { self_weight: 'added' });
    expect(behind(r, 'bending', 'M')).toBeCloseTo((420 * 47 * 195 * 9.80665e-9 * 3600 ** 2) / 8, 6);
  });
});
