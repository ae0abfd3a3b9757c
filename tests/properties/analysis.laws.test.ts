import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { combine } from '#shared/analysis/combine.ts';
import { nodesOf, valueAt } from '#shared/analysis/pieces.ts';
import { derivative, evaluate } from '#shared/analysis/polynomial.ts';
import { scaleDeflection, stiffnessFactor } from '#shared/analysis/rescale.ts';
import type { Beam, BeamLoad, Effects, Piece } from '#shared/analysis/types.ts';
import { aLoad, aLoadedBeam, effectsOf, gaugeOf, type LoadedBeam, totalOf } from '../factories/beams.ts';

const keys = ['shear', 'moment', 'rotation', 'deflection'] as const;
const shares = [0, 0.13, 0.37, 0.5, 0.71, 0.92, 1];

/** Absolute bound on a difference: a share of what the loads could cause, shear deformation counted. */
function boundsOf(loaded: LoadedBeam, share = 1e-9) {
  const gauge = gaugeOf(loaded);
  const bySlip = loaded.beam.GA ? (gauge.shear * Math.max(...loaded.beam.spans)) / loaded.beam.GA : 0;
  return {
    shear: share * gauge.shear,
    moment: share * gauge.moment,
    rotation: share * (gauge.rotation + bySlip / Math.min(...loaded.beam.spans)),
    deflection: share * (gauge.deflection + bySlip),
  };
}

function close(actual: number, wanted: number, bound: number, what = ''): void {
  expect(Math.abs(actual - wanted), what).toBeLessThanOrEqual(bound + 1e-300);
}

function eachPiece(effects: Effects, see: (pieces: Record<(typeof keys)[number], Piece>) => void): void {
  effects.shear.forEach((shear, i) => {
    const { moment, rotation, deflection } = {
      moment: effects.moment[i],
      rotation: effects.rotation[i],
      deflection: effects.deflection[i],
    };
    if (!moment || !rotation || !deflection) throw new Error('Effects have unequal numbers of pieces.');
    see({ shear, moment, rotation, deflection });
  });
}

function scaled(load: BeamLoad, factor: number): BeamLoad {
  if (load.kind === 'point') return { ...load, force: load.force * factor };
  if (load.kind === 'couple') return { ...load, moment: load.moment * factor };
  return {
    ...load,
    startIntensity: load.startIntensity * factor,
    endIntensity: load.endIntensity * factor,
  };
}

describe('equilibrium', () => {
  it('of forces and of moments on the whole member', () => {
    fc.assert(
      fc.property(aLoadedBeam(), ({ beam, loads }) => {
        const effects = effectsOf(beam, loads);
        const nodes = nodesOf(beam.spans);
        let down = 0;
        let clockwise = 0;
        for (const load of loads) {
          if (load.kind === 'couple') clockwise += load.moment;
          else if (load.kind === 'point') {
            down += load.force;
            clockwise += load.force * load.x;
          } else {
            const length = load.to - load.from;
            const { startIntensity: a, endIntensity: b } = load;
            down += ((a + b) / 2) * length;
            clockwise += length * (a * (load.from / 2 + length / 6) + b * (load.from / 2 + length / 3));
          }
        }
        const up = effects.reactions.reduce((sum, reaction) => sum + reaction, 0);
        const back = effects.reactions.reduce((sum, reaction, i) => sum + reaction * (nodes[i] ?? NaN), 0);
        const held = effects.fixingMoments.reduce((sum, moment) => sum + moment, 0);
        const bounds = boundsOf({ beam, loads });
        close(up, down, bounds.shear * 10, 'forces');
        close(clockwise + held - back, 0, bounds.shear * totalOf(beam) * 10, 'moments');
      }),
    );
  });

  it('and compatibility within each piece: M′ = V, ψ′ = −M / EI, w′ = ψ + V / GA', () => {
    fc.assert(
      fc.property(aLoadedBeam(), ({ beam, loads }) => {
        const effects = effectsOf(beam, loads);
        const bounds = boundsOf({ beam, loads });
        const shortest = Math.min(...beam.spans);
        eachPiece(effects, ({ shear, moment, rotation, deflection }) => {
          for (const share of shares) {
            const t = share * (shear.to - shear.from);
            const V = evaluate(shear.coefficients, t);
            const slip = beam.GA === undefined ? 0 : V / beam.GA;
            const M = evaluate(moment.coefficients, t);
            close(evaluate(derivative(moment.coefficients), t), V, bounds.shear);
            close(evaluate(derivative(rotation.coefficients), t), -M / beam.EI, bounds.moment / beam.EI);
            const along = evaluate(rotation.coefficients, t) + slip;
            close(evaluate(derivative(deflection.coefficients), t), along, bounds.deflection / shortest);
          }
        });
      }),
    );
  });

  it('continuity between pieces, and what each restraint demands', () => {
    fc.assert(
      fc.property(aLoadedBeam(), ({ beam, loads }) => {
        const effects = effectsOf(beam, loads);
        const bounds = boundsOf({ beam, loads });
        for (const key of ['rotation', 'deflection'] as const) {
          effects[key].slice(1).forEach((piece, i) => {
            const before = effects[key][i] as Piece;
            expect(piece.from).toBe(before.to);
            const end = evaluate(before.coefficients, before.to - before.from);
            close(piece.coefficients[0] ?? NaN, end, bounds[key], key);
          });
        }
        nodesOf(beam.spans).forEach((x, i) => {
          for (const side of ['left', 'right'] as const) {
            const restraint = beam.restraints[i];
            if (restraint !== 'free') close(valueAt(effects.deflection, x, side), 0, bounds.deflection);
            if (restraint === 'fixed') close(valueAt(effects.rotation, x, side), 0, bounds.rotation);
          }
        });
      }),
    );
  });
});

describe('symmetry', () => {
  it('a member seen from behind has the mirrored effects', () => {
    fc.assert(
      fc.property(aLoadedBeam(), ({ beam, loads }) => {
        const total = nodesOf(beam.spans).at(-1) ?? NaN;
        const mirrored: Beam = {
          ...beam,
          spans: [...beam.spans].reverse(),
          restraints: [...beam.restraints].reverse(),
        };
        const inside = (x: number) => Math.min(Math.max(total - x, 0), total);
        const effects = effectsOf(beam, loads);
        const behind = effectsOf(
          mirrored,
          loads.map((load): BeamLoad => {
            if (load.kind === 'point') return { ...load, x: inside(load.x) };
            if (load.kind === 'couple') return { ...load, x: inside(load.x), moment: -load.moment };
            return {
              kind: 'line',
              from: inside(load.to),
              to: inside(load.from),
              startIntensity: load.endIntensity,
              endIntensity: load.startIntensity,
            };
          }),
        );
        const bounds = boundsOf({ beam, loads });
        const sign = { shear: -1, moment: 1, rotation: -1, deflection: 1 };
        for (const key of keys) {
          for (const { from, to } of effects[key]) {
            if (to - from < total * 1e-9) continue;
            for (const share of [0.07, 0.5, 0.88]) {
              const x = from + share * (to - from);
              const here = valueAt(effects[key], x);
              close(valueAt(behind[key], total - x), sign[key] * here, bounds[key] * 10, key);
            }
          }
        }
        const reversed = [...behind.reactions].reverse();
        effects.reactions.forEach((reaction, i) => close(reversed[i] ?? NaN, reaction, bounds.shear * 10));
        const turned = [...behind.fixingMoments].reverse();
        effects.fixingMoments.forEach((moment, i) => close(-(turned[i] ?? NaN), moment, bounds.moment * 10));
      }),
    );
  });
});

describe('superposition', () => {
  it('of the effects of each load, factored, is the effect of the factored loads together', () => {
    const factored = aLoadedBeam().chain(({ beam, loads }) =>
      fc.record({
        beam: fc.constant(beam),
        loads: fc.constant(loads),
        factors: fc.array(fc.integer({ min: -30, max: 30 }), {
          minLength: loads.length,
          maxLength: loads.length,
        }),
      }),
    );
    fc.assert(
      fc.property(factored, ({ beam, loads, factors }) => {
        const together = effectsOf(
          beam,
          loads.map((load, i) => scaled(load, (factors[i] ?? 0) / 10)),
        );
        const sum = combine(
          loads.map((load, i) => ({ effects: effectsOf(beam, [load]), factor: (factors[i] ?? 0) / 10 })),
        );
        const bounds = boundsOf({ beam, loads }, 1e-8);
        for (const key of keys) {
          for (const { from, to } of together[key]) {
            const x = (from + to) / 2;
            if (to - from > 1e-9) close(valueAt(sum[key], x), valueAt(together[key], x), bounds[key], key);
          }
        }
        together.reactions.forEach((each, i) => close(sum.reactions[i] ?? NaN, each, bounds.shear));
        together.fixingMoments.forEach((each, i) => close(sum.fixingMoments[i] ?? NaN, each, bounds.moment));
      }),
    );
  });
});

describe('scale', () => {
  const factor = fc.double({ min: 0.01, max: 1000, noNaN: true });

  it('a stiffer member has the same forces and deflects in proportion less', () => {
    fc.assert(
      fc.property(aLoadedBeam(), factor, ({ beam, loads }, times) => {
        const stiffer: Beam = {
          ...beam,
          EI: beam.EI * times,
          ...(beam.GA === undefined ? {} : { GA: beam.GA * times }),
        };
        const ratio = stiffnessFactor(beam, stiffer);
        if (ratio === null) throw new Error('EI and GA changed in proportion.');
        const reused = scaleDeflection(effectsOf(beam, loads), ratio);
        const anew = effectsOf(stiffer, loads);
        const bounds = boundsOf({ beam: stiffer, loads });
        for (const key of keys) {
          anew[key].forEach(({ from, to }) => {
            const x = (from + to) / 2;
            close(valueAt(reused[key], x), valueAt(anew[key], x), bounds[key], key);
          });
        }
      }),
    );
  });

  it('other units of length and force give the same member', () => {
    fc.assert(
      fc.property(aLoadedBeam(), factor, factor, ({ beam, loads }, length, force) => {
        const inOtherUnits: Beam = {
          ...beam,
          spans: beam.spans.map((each) => each * length),
          EI: beam.EI * force * length ** 2,
          ...(beam.GA === undefined ? {} : { GA: beam.GA * force }),
        };
        const same = effectsOf(beam, loads);
        const total = nodesOf(inOtherUnits.spans).at(-1) ?? NaN;
        const other = effectsOf(
          inOtherUnits,
          loads.map((load): BeamLoad => {
            if (load.kind === 'point') {
              return { ...load, x: Math.min(load.x * length, total), force: load.force * force };
            }
            if (load.kind === 'couple') {
              return { ...load, x: Math.min(load.x * length, total), moment: load.moment * force * length };
            }
            return {
              kind: 'line',
              from: load.from * length,
              to: Math.min(load.to * length, total),
              startIntensity: (load.startIntensity * force) / length,
              endIntensity: (load.endIntensity * force) / length,
            };
          }),
        );
        const unit = { shear: force, moment: force * length, rotation: 1, deflection: length };
        const bounds = boundsOf({ beam, loads });
        for (const key of keys) {
          same[key].forEach(({ from, to }) => {
            const x = (from + to) / 2;
            if (to - from < 1e-9) return;
            close(valueAt(other[key], x * length) / unit[key], valueAt(same[key], x), bounds[key], key);
          });
        }
      }),
    );
  });

  it('loads times a factor are effects times that factor', () => {
    const one = aLoadedBeam().chain(({ beam }) => fc.tuple(fc.constant(beam), aLoad(beam)));
    fc.assert(
      fc.property(one, factor, ([beam, load], times) => {
        const once = effectsOf(beam, [load]);
        const more = effectsOf(beam, [scaled(load, times)]);
        const bounds = boundsOf({ beam, loads: [scaled(load, times)] });
        for (const key of keys) {
          once[key].forEach((piece, i) =>
            piece.coefficients.forEach((c, power) => {
              const longest = (piece.to - piece.from) ** power;
              close((more[key][i]?.coefficients[power] ?? NaN) * longest, c * times * longest, bounds[key]);
            }),
          );
        }
      }),
    );
  });
});
