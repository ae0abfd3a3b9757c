import { describe, expect, it } from 'vitest';
import { combine } from './combine.ts';
import { valueAt } from './pieces.ts';
import { scaleDeflection, stiffnessFactor } from './rescale.ts';
import { prepare } from './solve.ts';
import type { Beam, BeamLoad, Effects } from './types.ts';

const beam: Beam = { spans: [4, 3], restraints: ['pin', 'pin', 'free'], EI: 1000 };

function effectsOf(...loads: BeamLoad[]): Effects {
  const prepared = prepare(beam);
  const outcome = prepared.ok ? prepared.solver.solve(loads) : prepared;
  if (!outcome.ok) throw new Error('not solved');
  return outcome.effects;
}

const dead: BeamLoad = { kind: 'line', from: 0, to: 7, startIntensity: 1, endIntensity: 1 };
const live: BeamLoad = { kind: 'point', x: 1.5, force: 6 };

describe('superposition', () => {
  it('keeps the breaks of all parts, nodes among them', () => {
    const { moment } = combine([
      { effects: effectsOf(dead), factor: 1.35 },
      { effects: effectsOf(live), factor: 1.5 },
    ]);
    expect(moment.map(({ from, to }) => [from, to])).toEqual([
      [0, 1.5],
      [1.5, 4],
      [4, 7],
    ]);
  });

  it('adds what each part says, times its factor, on both sides of a jump', () => {
    const [a, b] = [effectsOf(dead), effectsOf(live)];
    const sum = combine([
      { effects: a, factor: 1.35 },
      { effects: b, factor: -0.5 },
    ]);
    for (const key of ['shear', 'moment', 'rotation', 'deflection'] as const) {
      for (const x of [0, 0.7, 1.5, 3, 4, 5.5, 7]) {
        for (const side of ['left', 'right'] as const) {
          const wanted = 1.35 * valueAt(a[key], x, side) - 0.5 * valueAt(b[key], x, side);
          expect(valueAt(sum[key], x, side)).toBeCloseTo(wanted, 12);
        }
      }
    }
    sum.reactions.forEach((reaction, i) =>
      expect(reaction).toBeCloseTo(1.35 * (a.reactions[i] ?? NaN) - 0.5 * (b.reactions[i] ?? NaN), 12),
    );
  });

  it('of nothing, or of different members, is refused', () => {
    const other = prepare({ ...beam, spans: [4, 2] });
    const outcome = other.ok ? other.solver.solve([]) : other;
    if (!outcome.ok) throw new Error('not solved');
    expect(() => combine([])).toThrow(RangeError);
    expect(() =>
      combine([
        { effects: effectsOf(dead), factor: 1 },
        { effects: outcome.effects, factor: 1 },
      ]),
    ).toThrow('same member');
  });
});

describe('another stiffness', () => {
  it('factor by EI alone, or by EI and GA in proportion', () => {
    expect(stiffnessFactor({ EI: 10 }, { EI: 40 })).toBe(0.25);
    expect(stiffnessFactor({ EI: 10, GA: 3 }, { EI: 20, GA: 6 })).toBe(0.5);
  });

  it('is not a matter of a factor where shear deformation comes in differently', () => {
    expect(stiffnessFactor({ EI: 10, GA: 3 }, { EI: 20, GA: 3 })).toBeNull();
    expect(stiffnessFactor({ EI: 10 }, { EI: 10, GA: 3 })).toBeNull();
    expect(stiffnessFactor({ EI: 10, GA: 3 }, { EI: 10 })).toBeNull();
  });

  it('multiplies rotation and deflection and leaves the forces', () => {
    const once = effectsOf(live);
    const twice = scaleDeflection(once, 2);
    expect(twice.moment).toBe(once.moment);
    expect(valueAt(twice.deflection, 2)).toBe(2 * valueAt(once.deflection, 2));
    expect(valueAt(twice.rotation, 2)).toBe(2 * valueAt(once.rotation, 2));
  });
});
