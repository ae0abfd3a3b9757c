import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { peaks, spanDeflections } from '#shared/analysis/peaks.ts';
import { MOST_SPANS, solve } from '#shared/analysis/solve.ts';
import type { Beam, BeamLoad, Restraint } from '#shared/analysis/types.ts';
import { zeroMomentLength } from '#shared/analysis/zeroMoment.ts';

/** Any number a machine knows, and now and then a sensible one. */
const wild = fc.oneof(
  fc.double(),
  fc.double({ min: 0.1, max: 100, noNaN: true }),
  fc.constantFrom(0, -0, NaN, Infinity, -Infinity, Number.MIN_VALUE, Number.MAX_VALUE, 1e-300, 1e300, 1e150),
);
const restraint = fc.constantFrom<Restraint>('pin', 'fixed', 'free');
const wildLoad: fc.Arbitrary<BeamLoad> = fc.oneof(
  fc.record({ kind: fc.constant('point' as const), x: wild, force: wild }),
  fc.record({ kind: fc.constant('couple' as const), x: wild, moment: wild }),
  fc.record({
    kind: fc.constant('line' as const),
    from: wild,
    to: wild,
    startIntensity: wild,
    endIntensity: wild,
  }),
);
const wildBeam = fc
  .record({
    spans: fc.array(wild, { maxLength: 6 }),
    restraints: fc.array(restraint, { maxLength: 7 }),
    EI: wild,
    GA: fc.option(wild, { nil: undefined }),
  })
  .map(({ GA, ...beam }): Beam => (GA === undefined ? beam : { ...beam, GA }));

/** Sound in form and of any size up to and over the bounds, so that arithmetic is driven to its ends. */
const exponent = fc.integer({ min: -31, max: 31 });
const vast = fc
  .record({
    unit: exponent,
    shares: fc.array(fc.double({ min: 1e-5, max: 1, noNaN: true }), { minLength: 1, maxLength: 4 }),
    restraints: fc.array(restraint, { minLength: 5, maxLength: 5 }),
    EI: exponent,
    GA: fc.option(exponent, { nil: undefined }),
    loads: fc.array(fc.record({ share: fc.double({ min: 0, max: 1, noNaN: true }), size: exponent }), {
      minLength: 1,
      maxLength: 4,
    }),
  })
  .map(({ unit, shares, restraints, EI, GA, loads }): { beam: Beam; loads: BeamLoad[] } => {
    const spans = shares.map((share) => share * 10 ** unit);
    const total = spans.reduce((sum, length) => sum + length, 0);
    return {
      beam: {
        spans,
        restraints: restraints.slice(0, spans.length + 1),
        EI: 10 ** EI,
        ...(GA === undefined ? {} : { GA: 10 ** GA }),
      },
      loads: loads.map(({ share, size }, i): BeamLoad => {
        const x = share * total;
        if (i % 3 === 0) return { kind: 'point', x, force: 10 ** size };
        if (i % 3 === 1) return { kind: 'couple', x, moment: -(10 ** size) };
        return { kind: 'line', from: 0, to: total, startIntensity: 10 ** size, endIntensity: 0 };
      }),
    };
  });

/** Neither throws nor hides: finite effects, or problems in words. */
function holds(beam: Beam, loads: BeamLoad[]): boolean {
  const outcome = solve(beam, loads);
  if (!outcome.ok) {
    expect(outcome.problems.length).toBeGreaterThan(0);
    for (const { message } of outcome.problems) expect(message).toMatch(/\.$/);
    return false;
  }
  const { shear, moment, rotation, deflection, reactions, fixingMoments } = outcome.effects;
  for (const pieces of [shear, moment, rotation, deflection]) {
    for (const { from, to, coefficients } of pieces) {
      expect([from, to, ...coefficients].every(Number.isFinite)).toBe(true);
      expect(to).toBeGreaterThan(from);
    }
    const { most, least } = peaks(pieces);
    expect([most.x, most.value, least.x, least.value].every(Number.isFinite)).toBe(true);
  }
  expect([...reactions, ...fixingMoments].every(Number.isFinite)).toBe(true);
  expect(spanDeflections(deflection, beam).every(({ value }) => Number.isFinite(value))).toBe(true);
  expect(Number.isFinite(zeroMomentLength(moment, (beam.spans[0] ?? 0) / 2))).toBe(true);
  return true;
}

describe('absurd input', () => {
  it('of any numbers and shapes is analysed or refused', () => {
    fc.assert(
      fc.property(wildBeam, fc.array(wildLoad, { maxLength: 5 }), (beam, loads) => void holds(beam, loads)),
      { numRuns: 5000 },
    );
  });

  it('of sound form but any size is analysed or refused', () => {
    let analysed = 0;
    fc.assert(
      fc.property(vast, ({ beam, loads }) => {
        if (holds(beam, loads)) analysed += 1;
      }),
      { numRuns: 5000 },
    );
    expect(analysed).toBeGreaterThan(1000);
  });

  it('the bound on spans: the largest member is analysed, one more span is refused', () => {
    const member = (count: number): Beam => ({
      spans: Array.from({ length: count }, () => 3),
      restraints: Array.from({ length: count + 1 }, (): Restraint => 'pin'),
      EI: 1000,
    });
    const load: BeamLoad = { kind: 'line', from: 0, to: 3, startIntensity: 2, endIntensity: 2 };
    expect(solve(member(MOST_SPANS), [load]).ok).toBe(true);
    const outcome = solve(member(MOST_SPANS + 1), [load]);
    expect(outcome.ok ? [] : outcome.problems.map(({ code }) => code)).toEqual(['too-many-spans']);
  });
});
