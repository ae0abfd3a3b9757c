import { describe, expect, it } from 'vitest';
import { peaks } from './peaks.ts';
import { valueAt } from './pieces.ts';
import { MOST_SPANS, prepare, solve } from './solve.ts';
import type { Beam, BeamLoad, Effects, Restraint } from './types.ts';

const uniform = (w: number, from: number, to: number): BeamLoad => ({
  kind: 'line',
  from,
  to,
  startIntensity: w,
  endIntensity: w,
});

function effectsOf(beam: Beam, loads: BeamLoad[]): Effects {
  const outcome = solve(beam, loads);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ message }) => message).join(' '));
  return outcome.effects;
}

function codesOf(beam: Beam, loads: BeamLoad[] = []): string[] {
  const outcome = solve(beam, loads);
  return outcome.ok ? [] : outcome.problems.map(({ code }) => code);
}

const simple: Beam = { spans: [4], restraints: ['pin', 'pin'], EI: 1000 };

describe('what is refused', () => {
  it.each<[string, Partial<Beam>, string[]]>([
    ['no span', { spans: [], restraints: ['pin'] }, ['no-span']],
    ['a span of 0', { spans: [0] }, ['bad-length']],
    ['a span below 0', { spans: [-4] }, ['bad-length']],
    ['a span that is no number', { spans: [NaN] }, ['bad-length']],
    ['an endless span', { spans: [Infinity] }, ['bad-length']],
    [
      'a span a millionth of the others',
      { spans: [4, 1e-6], restraints: ['pin', 'pin', 'free'] },
      ['bad-length'],
    ],
    ['EI of 0', { EI: 0 }, ['bad-stiffness']],
    ['EI below 0', { EI: -1 }, ['bad-stiffness']],
    ['EI that is no number', { EI: NaN }, ['bad-stiffness']],
    ['GA of 0', { GA: 0 }, ['bad-stiffness']],
    ['GA lost beside EI', { GA: 1e-12 }, ['bad-stiffness']],
    ['a restraint too few', { restraints: ['fixed'] }, ['bad-restraints']],
    ['a free node between spans', { spans: [4, 4], restraints: ['pin', 'free', 'pin'] }, ['bad-restraints']],
    ['one pin only', { restraints: ['pin', 'free'] }, ['mechanism']],
    ['one pin between overhangs', { spans: [2, 2], restraints: ['free', 'pin', 'free'] }, ['mechanism']],
    ['no support at all', { restraints: ['free', 'free'] }, ['mechanism']],
  ])('%s', (_, change, codes) => {
    expect(codesOf({ ...simple, ...change })).toEqual(codes);
  });

  it.each<[string, BeamLoad, string]>([
    ['a point load off the end', { kind: 'point', x: 4.01, force: 1 }, 'load-outside'],
    ['a couple before the start', { kind: 'couple', x: -0.01, moment: 1 }, 'load-outside'],
    ['a line load that runs over the end', uniform(1, 3, 5), 'load-outside'],
    ['a line load without length', uniform(1, 2, 2), 'bad-load'],
    ['a line load from right to left', uniform(1, 3, 2), 'bad-load'],
    ['a force that is no number', { kind: 'point', x: 1, force: NaN }, 'bad-load'],
    ['an endless intensity', uniform(Infinity, 1, 2), 'bad-load'],
    ['a place that is no number', { kind: 'point', x: NaN, force: 1 }, 'bad-load'],
  ])('%s', (_, load, code) => {
    expect(codesOf(simple, [load])).toEqual([code]);
  });

  it('all at once, each with its place', () => {
    const outcome = solve({ spans: [4, -1, 0], restraints: ['pin', 'pin', 'pin', 'pin'], EI: 0 }, []);
    expect(outcome.ok ? [] : outcome.problems.map(({ code, index }) => [code, index])).toEqual([
      ['bad-length', 1],
      ['bad-length', 2],
      ['bad-stiffness', undefined],
    ]);
  });

  it(`more than ${MOST_SPANS} spans`, () => {
    const spans = Array.from({ length: MOST_SPANS + 1 }, () => 1);
    const restraints = Array.from({ length: MOST_SPANS + 2 }, (): Restraint => 'pin');
    expect(codesOf({ spans, restraints, EI: 1 })).toEqual(['too-many-spans']);
  });
});

describe('loads at nodes', () => {
  const two: Beam = { spans: [3, 4], restraints: ['pin', 'pin', 'pin'], EI: 1000 };

  it('a point load on a support goes straight into it', () => {
    const { reactions, moment } = effectsOf(two, [{ kind: 'point', x: 3, force: 7 }]);
    expect(reactions).toEqual([0, 7, 0]);
    expect(peaks(moment).most.value).toBeCloseTo(0, 12);
  });

  it('a couple at a pinned end is the moment there', () => {
    const { moment, reactions } = effectsOf(simple, [{ kind: 'couple', x: 0, moment: 8 }]);
    expect(moment[0]?.coefficients.slice(0, 2)).toEqual([8, -2]);
    expect(reactions).toEqual([-2, 2]);
  });

  it('no rounding is left of the moment at a pinned end or at the tip of an overhang', () => {
    const beam: Beam = { spans: [3.1, 4.7, 2.3], restraints: ['pin', 'pin', 'pin', 'pin'], EI: 7 };
    const { moment } = effectsOf(beam, [uniform(1.7, 0, 10.1)]);
    expect(moment[0]?.coefficients[0]).toBe(0);
    const tip: Beam = { ...beam, restraints: ['free', 'pin', 'pin', 'pin'] };
    const { shear, moment: overhang } = effectsOf(tip, [uniform(1.7, 0, 10.1)]);
    expect([shear[0]?.coefficients[0], overhang[0]?.coefficients[0]]).toEqual([0, 0]);
  });

  it('a couple at an inner support is shared by the spans as they are stiff: 3 EI / L', () => {
    const { moment } = effectsOf(two, [{ kind: 'couple', x: 3, moment: 7 }]);
    expect(valueAt(moment, 3, 'right') - valueAt(moment, 3, 'left')).toBeCloseTo(7, 12);
    expect(valueAt(moment, 3, 'left')).toBeCloseTo((-7 * 4) / 7, 12);
  });

  it('a couple at a fixed end goes into the restraint', () => {
    const beam: Beam = { spans: [3], restraints: ['fixed', 'free'], EI: 1000 };
    const { fixingMoments, deflection } = effectsOf(beam, [{ kind: 'couple', x: 0, moment: 5 }]);
    expect(fixingMoments).toEqual([-5, 0]);
    expect(peaks(deflection).most.value).toBe(0);
  });

  it('loads at the tip of an overhang, from either side', () => {
    const left: Beam = { spans: [1, 4], restraints: ['free', 'pin', 'pin'], EI: 1000 };
    const right: Beam = { spans: [4, 1], restraints: ['pin', 'pin', 'free'], EI: 1000 };
    const a = effectsOf(left, [{ kind: 'point', x: 0, force: 2 }]);
    const b = effectsOf(right, [{ kind: 'point', x: 5, force: 2 }]);
    expect(a.reactions).toEqual([0, 2.5, -0.5]);
    expect(b.reactions).toEqual([-0.5, 2.5, 0]);
    // P a² (L + a) / 3 EI, standard textbook result.
    expect(valueAt(a.deflection, 0)).toBeCloseTo((2 * 5) / 3000, 14);
    expect(valueAt(b.deflection, 5)).toBeCloseTo((2 * 5) / 3000, 14);
  });

  it('places that differ from a node by rounding only count as the node', () => {
    const beam: Beam = { spans: [0.1, 0.2], restraints: ['pin', 'pin', 'pin'], EI: 1 };
    for (const x of [0.1 + 0.2, 0.3]) {
      const { reactions, moment } = effectsOf(beam, [{ kind: 'point', x, force: 3 }]);
      expect(reactions).toEqual([0, 0, 3]);
      expect(moment).toHaveLength(2);
    }
    for (const x of [0.1 - 1e-16, 0.1 + 1e-16]) {
      const { reactions, moment } = effectsOf(beam, [{ kind: 'point', x, force: 3 }]);
      expect(reactions).toEqual([0, 3, 0]);
      expect(moment).toHaveLength(2);
    }
  });
});

describe('load that is easily lost', () => {
  it('several loads at one place make one break, and all count', () => {
    const { shear, moment } = effectsOf(simple, [
      { kind: 'point', x: 1, force: 4 },
      { kind: 'point', x: 1, force: 4 },
      { kind: 'couple', x: 1, moment: 2 },
      uniform(3, 1, 4),
    ]);
    expect(shear).toHaveLength(2);
    expect(valueAt(shear, 1, 'left') - valueAt(shear, 1, 'right')).toBeCloseTo(8, 12);
    expect(valueAt(moment, 1, 'right') - valueAt(moment, 1, 'left')).toBeCloseTo(2, 12);
  });

  it('a line load shorter than the rounding of places', () => {
    const to = 1.3 + 2e-14;
    const { reactions } = effectsOf(simple, [uniform(1e15, 1.3, to)]);
    const force = 1e15 * (to - 1.3);
    expect((reactions[0] ?? NaN) / (force * (2.7 / 4))).toBeCloseTo(1, 10);
    expect((reactions[1] ?? NaN) / (force * (1.3 / 4))).toBeCloseTo(1, 10);
  });

  it.each([
    ['a sliver of line load in a span', uniform(1e13, 1.3, 1.3 + 1e-12), 10],
    ['a sliver at the end', uniform(1e13, 4 - 1e-12, 4), 10],
    ['a point load beside another place', { kind: 'point', x: 2 + 1e-14, force: 10 } satisfies BeamLoad, 10],
  ])('%s arrives at the supports', (_, load, force) => {
    const { reactions } = effectsOf(simple, [load, { kind: 'point', x: 2, force: 0 }]);
    expect(reactions.reduce((sum, each) => sum + each, 0) / force).toBeCloseTo(1, 2);
  });

  it('a line load that reaches into the next span by a sliver', () => {
    const two: Beam = { spans: [3, 3], restraints: ['pin', 'pin', 'pin'], EI: 1 };
    const { reactions } = effectsOf(two, [uniform(2, 0, 3 + 1e-13)]);
    expect(reactions[0]).toBeCloseTo((2 * 3 * 7) / 16, 10);
  });
});

describe('stiffness', () => {
  it('one preparation serves many sets of loads, in any order', () => {
    const prepared = prepare({ spans: [3, 4, 5], restraints: ['fixed', 'pin', 'pin', 'free'], EI: 1000 });
    if (!prepared.ok) throw new Error('not prepared');
    const first = prepared.solver.solve([uniform(2, 0, 12)]);
    prepared.solver.solve([{ kind: 'point', x: 1, force: 9 }]);
    expect(prepared.solver.solve([uniform(2, 0, 12)])).toEqual(first);
  });

  it('moments and reactions do not depend on EI without shear deformation', () => {
    const beam: Beam = { spans: [3, 4], restraints: ['pin', 'pin', 'pin'], EI: 1 };
    const soft = effectsOf(beam, [uniform(2, 0, 7)]);
    const stiff = effectsOf({ ...beam, EI: 1e9 }, [uniform(2, 0, 7)]);
    expect(stiff.moment).toEqual(soft.moment);
    expect(stiff.reactions).toEqual(soft.reactions);
  });

  it('shear deformation adds w L² / 8 GA to a simple span and moves no force', () => {
    const bare = effectsOf(simple, [uniform(3, 0, 4)]);
    const soft = effectsOf({ ...simple, GA: 500 }, [uniform(3, 0, 4)]);
    expect(valueAt(soft.deflection, 2) - valueAt(bare.deflection, 2)).toBeCloseTo((3 * 16) / (8 * 500), 14);
    expect(soft.reactions).toEqual(bare.reactions);
  });

  it('shear deformation lowers the fixed-end moment of a propped member: w L² / 8 (1 + 3 EI / GA L²)', () => {
    // M = (w L² / 8) / (1 + 3 EI / (GA L²)) for a fixed and a pinned end, from the force method by hand.
    const beam: Beam = { spans: [4], restraints: ['fixed', 'pin'], EI: 1000, GA: 500 };
    const { fixingMoments } = effectsOf(beam, [uniform(3, 0, 4)]);
    expect(fixingMoments[0]).toBeCloseTo(-(3 * 16) / 8 / (1 + (3 * 1000) / (500 * 16)), 12);
  });

  it('spans of very unequal lengths keep their digits', () => {
    // A millimetre beside ten metres: nearly a fixed end.
    const beam: Beam = { spans: [10, 1e-3], restraints: ['pin', 'pin', 'pin'], EI: 1 };
    const { moment } = effectsOf(beam, [uniform(8, 0, 10)]);
    // Three moments: 2 M (L1 + L2) = −w L1³ / 4.
    expect(valueAt(moment, 10) / (-8000 / 4 / (2 * 10.001))).toBeCloseTo(1, 13);
  });
});
