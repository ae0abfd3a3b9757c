import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { valueAt } from '#shared/analysis/pieces.ts';
import type { Effects } from '#shared/analysis/types.ts';
import { aLoadedBeam, effectsOf, gaugeOf } from '../factories/beams.ts';
import { type Sample, solveDensely } from '../factories/denseBeam.ts';

/*
 * An independent way: the same members solved as one dense system of integration constants by the
 * general-purpose library mathjs. Differences are measured against the largest value of that effect in the
 * member (or a thousandth of what the loads could cause, where they cancel out), since near a zero of it only
 * the rounding of both solutions is left.
 */

const keys = ['shear', 'moment', 'rotation', 'deflection'] as const;

describe('members of 1 to 8 spans, any restraints and loads, with and without shear deformation', () => {
  it('agree with a dense solution by mathjs to 1e-8', () => {
    fc.assert(
      fc.property(aLoadedBeam(), ({ beam, loads }) => {
        const effects = effectsOf(beam, loads);
        const dense = solveDensely(beam, loads);
        const gauge = gaugeOf({ beam, loads });
        const all = dense.samples.flatMap(({ start, inside, end }) => [start, ...inside, end]);
        for (const key of keys) {
          const scale = Math.max(...all.map((sample) => Math.abs(sample[key])), gauge[key] / 1000, 1e-12);
          for (const { start, inside, end } of dense.samples) {
            near(effects, key, start, 'right', scale);
            for (const sample of inside) near(effects, key, sample, 'left', scale);
            near(effects, key, end, 'left', scale);
          }
        }
        const forces = Math.max(...dense.reactions.map(Math.abs), gauge.shear / 1000, 1e-12);
        dense.reactions.forEach((reaction, node) => {
          expect(Math.abs((effects.reactions[node] ?? NaN) - reaction)).toBeLessThan(1e-8 * forces);
        });
        const moments = Math.max(...dense.fixingMoments.map(Math.abs), gauge.moment / 1000, 1e-12);
        dense.fixingMoments.forEach((moment, node) => {
          expect(Math.abs((effects.fixingMoments[node] ?? NaN) - moment)).toBeLessThan(1e-8 * moments);
        });
      }),
      { numRuns: 400 },
    );
  });
});

function near(
  effects: Effects,
  key: (typeof keys)[number],
  sample: Sample,
  side: 'left' | 'right',
  scale: number,
): void {
  // A hair inside the segment, so that a jump at its end is seen from the right side.
  const x = sample.x + (side === 'right' ? 1e-12 : 0) - (side === 'left' ? 1e-12 : 0);
  const difference = Math.abs(valueAt(effects[key], x, side) - sample[key]);
  expect(difference, `${key} at ${sample.x} from the ${side}`).toBeLessThan(1e-8 * scale);
}
