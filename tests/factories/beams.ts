import fc from 'fast-check';
import type { Beam, BeamLoad, Effects, Restraint } from '#shared/analysis/types.ts';
import { solve } from '#shared/analysis/solve.ts';

/** A member with loads on it, as the analysis takes them. */
export interface LoadedBeam {
  beam: Beam;
  loads: BeamLoad[];
}

export const totalOf = (beam: Beam) => beam.spans.reduce((sum, length) => sum + length, 0);

/** The effects, or a failure of the test that says why there are none. */
export function effectsOf(beam: Beam, loads: readonly BeamLoad[]): Effects {
  const outcome = solve(beam, loads);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ message }) => message).join(' '));
  return outcome.effects;
}

/**
 * What the effects of the loads could come to: forces, and with the longest span moments, rotations and
 * deflections. Differences are measured against it where the effects themselves cancel out.
 */
export function gaugeOf({ beam, loads }: LoadedBeam) {
  const length = Math.max(...beam.spans);
  const force = loads.reduce((sum, load) => {
    if (load.kind === 'point') return sum + Math.abs(load.force);
    if (load.kind === 'couple') return sum + Math.abs(load.moment) / length;
    return sum + Math.max(Math.abs(load.startIntensity), Math.abs(load.endIntensity)) * (load.to - load.from);
  }, 0);
  return {
    shear: force,
    moment: force * length,
    rotation: (force * length ** 2) / beam.EI,
    deflection: (force * length ** 3) / beam.EI,
  };
}

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** Members of 1 to 8 spans that stand: pinned or fixed supports anywhere, either end free, with or without GA. */
export function aBeam(mostSpans = 8): fc.Arbitrary<Beam> {
  const inner = fc.constantFrom<Restraint>('pin', 'pin', 'pin', 'fixed');
  const end = fc.constantFrom<Restraint>('pin', 'pin', 'fixed', 'free');
  return fc
    .record({
      spans: fc.array(number(0.8, 9), { minLength: 1, maxLength: mostSpans }),
      inner: fc.array(inner, { minLength: mostSpans, maxLength: mostSpans }),
      first: end,
      last: end,
      EI: number(10, 1e5),
      softness: fc.option(number(0.001, 2), { nil: undefined }),
    })
    .map(({ spans, inner: held, first, last, EI, softness }): Beam => {
      const restraints = [first, ...held.slice(0, spans.length - 1), last];
      // Softness is EI / GA in square lengths: beside spans of some lengths, from stiff to spongy.
      return { spans, restraints, EI, ...(softness === undefined ? {} : { GA: EI / softness }) };
    })
    .filter(({ restraints }) => {
      const held = restraints.filter((each) => each !== 'free').length;
      return held >= 2 || restraints.includes('fixed');
    });
}

/** Any load on the member: partial, sloping, across supports, on a node, up or down. */
export function aLoad(beam: Beam): fc.Arbitrary<BeamLoad> {
  const total = totalOf(beam);
  const nodes = beam.spans.reduce<number[]>((all, length) => [...all, (all.at(-1) ?? 0) + length], [0]);
  // Places and sizes from a coarse scale: loads that cancel do so exactly, and none stands a hair off a node.
  const snapped = (x: number) => nodes.find((node) => Math.abs(node - x) < total / 1000) ?? x;
  const place = fc.oneof(
    fc.integer({ min: 0, max: 240 }).map((share) => snapped((share / 240) * total)),
    fc.constantFrom(...nodes),
  );
  const size = fc.integer({ min: -200, max: 200 }).map((tenths) => tenths / 10);
  return fc.oneof(
    fc.record({ kind: fc.constant('point' as const), x: place, force: size }),
    fc.record({ kind: fc.constant('couple' as const), x: place, moment: size }),
    fc
      .record({ a: place, b: place, startIntensity: size, endIntensity: size })
      .filter(({ a, b }) => a !== b)
      .map(({ a, b, startIntensity, endIntensity }) => ({
        kind: 'line' as const,
        from: Math.min(a, b),
        to: Math.max(a, b),
        startIntensity,
        endIntensity,
      })),
  );
}

export function aLoadedBeam(mostSpans = 8): fc.Arbitrary<LoadedBeam> {
  return aBeam(mostSpans).chain((beam) =>
    fc.array(aLoad(beam), { minLength: 1, maxLength: 6 }).map((loads): LoadedBeam => ({ beam, loads })),
  );
}
