import { describe, expect, it } from 'vitest';
import { shearNear, type ShearNearRule, type SupportSide } from './shearNear.ts';
import { prepare } from './solve.ts';
import type { Beam, BeamLoad } from './types.ts';

const simple: Beam = { spans: [4], restraints: ['pin', 'pin'], EI: 1000 };
const line: BeamLoad = { kind: 'line', from: 0, to: 4, startIntensity: 3, endIntensity: 3 };
const left: SupportSide = { node: 0, side: 'right', toFace: 0.05 };
const right: SupportSide = { node: 1, side: 'left', toFace: 0.05 };
const rule: ShearNearRule = { from: 'centre', distance: 0.2, pointLoads: 'keep' };

function shearOf(loads: BeamLoad[], place: SupportSide, by: ShearNearRule, beam = simple): number {
  const prepared = prepare(beam);
  const outcome = prepared.ok ? prepared.solver.solve(loads) : prepared;
  if (!prepared.ok || !outcome.ok) throw new Error('not solved');
  return shearNear(
    { spans: beam.spans, solver: prepared.solver, loads, effects: outcome.effects },
    place,
    by,
  );
}

describe('line load', () => {
  it('within the distance is left out: w (L / 2 − d), on both sides alike', () => {
    expect(shearOf([line], left, rule)).toBeCloseTo(3 * (2 - 0.2), 12);
    expect(shearOf([line], right, rule)).toBeCloseTo(-3 * (2 - 0.2), 12);
  });

  it('from the face of the bearing', () => {
    expect(shearOf([line], left, { ...rule, from: 'face' })).toBeCloseTo(3 * (2 - 0.25), 12);
  });

  it('is not left out by a distance of 0, or one that reaches the next node', () => {
    expect(shearOf([line], left, { ...rule, distance: 0 })).toBeCloseTo(6, 12);
    expect(shearOf([line], left, { ...rule, distance: 4 })).toBeCloseTo(6, 12);
  });

  it('that varies counts by its force within the distance', () => {
    const ramp: BeamLoad = { kind: 'line', from: 0.1, to: 1.1, startIntensity: 0, endIntensity: 10 };
    const whole = shearOf([ramp], left, { ...rule, distance: 0 });
    expect(shearOf([ramp], left, rule)).toBeCloseTo(whole - 0.05, 12);
  });
});

describe('point loads within the distance', () => {
  // At 0.1 m: brings 8 (1 − 0.1 / 4) = 7.8 to the shear at the left support.
  const point: BeamLoad = { kind: 'point', x: 0.1, force: 8 };

  it.each<[ShearNearRule['pointLoads'], number]>([
    ['keep', 7.8],
    ['omit', 0],
    ['scale', 7.8 * 0.5],
  ])('%s', (pointLoads, wanted) => {
    expect(shearOf([point], left, { ...rule, pointLoads })).toBeCloseTo(wanted, 12);
    expect(shearOf([line, point], left, { ...rule, pointLoads })).toBeCloseTo(5.4 + wanted, 12);
  });

  it('mirror on the other side', () => {
    const mirrored: BeamLoad = { kind: 'point', x: 3.9, force: 8 };
    expect(shearOf([mirrored], right, { ...rule, pointLoads: 'scale' })).toBeCloseTo(-3.9, 12);
  });

  it('at the distance itself count whole when scaled, and beyond it under every rule', () => {
    const at: BeamLoad = { kind: 'point', x: 0.2, force: 8 };
    expect(shearOf([at], left, { ...rule, pointLoads: 'scale' })).toBeCloseTo(7.6, 12);
    const beyond: BeamLoad = { kind: 'point', x: 0.3, force: 8 };
    expect(shearOf([beyond], left, { ...rule, pointLoads: 'omit' })).toBeCloseTo(7.4, 12);
  });

  it('between centre and face count for nothing when scaled from the face', () => {
    const over: BeamLoad = { kind: 'point', x: 0.04, force: 8 };
    expect(shearOf([over], left, { ...rule, from: 'face', pointLoads: 'scale' })).toBeCloseTo(0, 12);
  });

  it('within the distance from the face, though not from the centre, are within', () => {
    const near: BeamLoad = { kind: 'point', x: 0.22, force: 8 };
    expect(shearOf([near], left, { ...rule, from: 'face', pointLoads: 'omit' })).toBeCloseTo(0, 12);
    expect(shearOf([near], left, { ...rule, pointLoads: 'omit' })).toBeCloseTo(8 * (1 - 0.22 / 4), 12);
  });

  it('upwards are left out as well, so that they relieve nothing', () => {
    const up: BeamLoad = { kind: 'point', x: 0.1, force: -8 };
    expect(shearOf([line, up], left, { ...rule, pointLoads: 'omit' })).toBeCloseTo(5.4, 12);
  });
});

describe('supports of a continuous member', () => {
  const two: Beam = { spans: [4, 4], restraints: ['pin', 'pin', 'pin'], EI: 1000 };
  const both: BeamLoad = { kind: 'line', from: 0, to: 8, startIntensity: 3, endIntensity: 3 };

  it('each side of the inner support by its own span: 5 w L / 8 − w d', () => {
    const wanted = (5 * 3 * 4) / 8 - 3 * 0.2;
    expect(shearOf([both], { node: 1, side: 'left', toFace: 0 }, rule, two)).toBeCloseTo(-wanted, 12);
    expect(shearOf([both], { node: 1, side: 'right', toFace: 0 }, rule, two)).toBeCloseTo(wanted, 12);
  });

  it('0 on the side where there is no member', () => {
    expect(shearOf([both], { node: 0, side: 'left', toFace: 0 }, rule, two)).toBe(0);
    expect(shearOf([both], { node: 2, side: 'right', toFace: 0 }, rule, two)).toBe(0);
  });
});
