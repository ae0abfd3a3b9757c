import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { arrangements, clipToSpans } from '#shared/analysis/arrangements.ts';
import { combine } from '#shared/analysis/combine.ts';
import { nodesOf, valueAt } from '#shared/analysis/pieces.ts';
import type { Beam, BeamLoad, Effects } from '#shared/analysis/types.ts';
import { aBeam, aLoadedBeam, effectsOf } from '../factories/beams.ts';

/** Downward loads, at least one on every span. */
function gravityOn(beam: Beam): fc.Arbitrary<BeamLoad[]> {
  const nodes = nodesOf(beam.spans);
  const ofSpan = (from: number, to: number): fc.Arbitrary<BeamLoad> => {
    const size = fc.integer({ min: 1, max: 50 });
    return fc.oneof(
      size.map((w) => ({ kind: 'line' as const, from, to, startIntensity: w, endIntensity: w })),
      size.map((force) => ({ kind: 'point' as const, x: from + 0.3 * (to - from), force })),
      fc.tuple(size, size).map(([startIntensity, endIntensity]) => ({
        kind: 'line' as const,
        from: from + 0.1 * (to - from),
        to: from + 0.6 * (to - from),
        startIntensity,
        endIntensity,
      })),
    );
  };
  return fc.tuple(...beam.spans.map((_, i) => ofSpan(nodes[i] as number, nodes[i + 1] as number)));
}

function everySet(count: number): number[][] {
  return Array.from({ length: 2 ** count - 1 }, (_, code) =>
    Array.from({ length: count }, (_, i) => i).filter((i) => ((code + 1) >> i) & 1),
  );
}

/** Effects looked at: all kinds at several places of each span, and all reactions. */
function samplesOf(effects: Effects, beam: Beam): number[] {
  const nodes = nodesOf(beam.spans);
  const samples = [...effects.reactions, ...effects.fixingMoments];
  beam.spans.forEach((length, i) => {
    for (const share of [0.02, 0.15, 0.22, 0.4, 0.5, 0.65, 0.8, 0.95]) {
      const x = (nodes[i] as number) + share * length;
      for (const key of ['shear', 'moment', 'deflection'] as const) samples.push(valueAt(effects[key], x));
    }
  });
  return samples;
}

describe('arrangements of a patterned action', () => {
  it('reach the extremes of all sets of spans, in members without shear deformation', () => {
    const members = aBeam(6)
      .map(({ GA: _, ...beam }): Beam => beam)
      .chain((beam) => fc.tuple(fc.constant(beam), gravityOn(beam)));
    fc.assert(
      fc.property(members, ([beam, loads]) => {
        const perSpan = beam.spans.map((_, i) => effectsOf(beam, clipToSpans(loads, beam, [i])));
        const alone = perSpan.map((effects) => samplesOf(effects, beam));
        const sum = (set: readonly number[]) =>
          (alone[0] ?? []).map((_, k) => set.reduce((total, i) => total + (alone[i]?.[k] ?? NaN), 0));
        const few = arrangements(beam.spans.length, beam.restraints).map(sum);
        const all = everySet(beam.spans.length).map(sum);
        (alone[0] ?? []).forEach((_, k) => {
          const of = (sets: number[][]) => sets.map((samples) => samples[k] ?? NaN);
          const scale = Math.max(...of(all).map(Math.abs));
          // Without load there is no effect: the empty set needs no analysis, but bounds the extremes.
          expect(Math.max(0, ...of(few))).toBeGreaterThanOrEqual(Math.max(0, ...of(all)) - 1e-9 * scale);
          expect(Math.min(0, ...of(few))).toBeLessThanOrEqual(Math.min(0, ...of(all)) + 1e-9 * scale);
        });
      }),
    );
  });

  it('each part of a load belongs to one span: the parts of all spans add up to the whole', () => {
    fc.assert(
      fc.property(aLoadedBeam(), ({ beam, loads }) => {
        const whole = effectsOf(beam, loads);
        const sum = combine(
          beam.spans.map((_, i) => ({ effects: effectsOf(beam, clipToSpans(loads, beam, [i])), factor: 1 })),
        );
        const scale = Math.max(...samplesOf(whole, beam).map(Math.abs), 1);
        samplesOf(whole, beam).forEach((value, k) => {
          expect(Math.abs(value - (samplesOf(sum, beam)[k] ?? NaN))).toBeLessThan(1e-8 * scale);
        });
      }),
    );
  });
});
