import { describe, expect, it } from 'vitest';
import { peakPerSpan, peaks, spanDeflections } from './peaks.ts';
import { piecesBetween, valueAt } from './pieces.ts';
import { solve } from './solve.ts';
import type { Beam, BeamLoad, Effects } from './types.ts';
import { zeroMomentLength } from './zeroMoment.ts';

const uniform = (w: number, from: number, to: number): BeamLoad => ({
  kind: 'line',
  from,
  to,
  startIntensity: w,
  endIntensity: w,
});

function effectsOf(beam: Beam, loads: BeamLoad[]): Effects {
  const outcome = solve(beam, loads);
  if (!outcome.ok) throw new Error('not solved');
  return outcome.effects;
}

const two: Beam = { spans: [4, 4], restraints: ['pin', 'pin', 'pin'], EI: 1000 };

describe('values along the member', () => {
  const { shear, moment } = effectsOf({ spans: [4], restraints: ['pin', 'pin'], EI: 1 }, [
    { kind: 'point', x: 1, force: 8 },
    { kind: 'couple', x: 3, moment: 2 },
  ]);

  it('differ by the side where they jump', () => {
    expect(valueAt(shear, 1, 'left') - valueAt(shear, 1, 'right')).toBeCloseTo(8, 12);
    expect(valueAt(moment, 3, 'right') - valueAt(moment, 3, 'left')).toBeCloseTo(2, 12);
    expect(valueAt(shear, 1)).toBe(valueAt(shear, 1, 'left'));
  });

  it('at the ends are those of the first and last piece from either side', () => {
    expect(valueAt(shear, 0, 'left')).toBe(valueAt(shear, 0, 'right'));
    expect(valueAt(shear, 4, 'right')).toBe(valueAt(shear, 4, 'left'));
    expect(valueAt([], 1)).toBe(0);
  });

  it('the pieces of a span are those inside it', () => {
    const { moment: long } = effectsOf(two, [{ kind: 'point', x: 5, force: 1 }]);
    expect(piecesBetween(long, 4, 8).map(({ from, to }) => [from, to])).toEqual([
      [4, 5],
      [5, 8],
    ]);
  });
});

describe('peaks', () => {
  it('of a propped member under uniform load: 9 w L² / 128 at 3 L / 8 (standard textbook result)', () => {
    const { moment, shear } = effectsOf({ spans: [8], restraints: ['pin', 'fixed'], EI: 1 }, [
      uniform(2, 0, 8),
    ]);
    const { most, least } = peaks(moment);
    expect(most.x).toBeCloseTo(3, 12);
    expect(most.value).toBeCloseTo(9, 12);
    expect(least).toEqual({ x: 8, value: expect.closeTo(-16, 12) });
    expect(peaks(shear).least.value).toBeCloseTo(-10, 12);
  });

  it('of its deflection at (1 + √33) L / 16 (standard textbook result)', () => {
    const { deflection } = effectsOf({ spans: [8], restraints: ['pin', 'fixed'], EI: 1 }, [uniform(2, 0, 8)]);
    const { most } = peaks(deflection);
    expect(most.x).toBeCloseTo((1 + Math.sqrt(33)) / 2, 9);
    expect(most.value).toBeCloseTo(0.00541612 * 2 * 8 ** 4, 4);
  });

  it('of each span stand in that span', () => {
    const [first, second] = peakPerSpan(effectsOf(two, [uniform(3, 0, 4)]).moment, two.spans);
    // Three moments: the support has −w L² / 16; the far span only hogs.
    expect(first?.least).toEqual({ x: 4, value: expect.closeTo(-3, 12) });
    expect(second?.least.x).toBe(4);
    expect(second?.most.value).toBeCloseTo(0, 12);
  });

  it('deflection by span keeps its sign and counts the tip of an overhang', () => {
    const beam: Beam = { spans: [4, 1.5], restraints: ['pin', 'pin', 'free'], EI: 1000 };
    const [span, tip] = spanDeflections(effectsOf(beam, [uniform(3, 4, 5.5)]).deflection, beam);
    expect(span?.value).toBeCloseTo((-3 * 1.5 ** 2 * 16) / (18 * Math.sqrt(3) * 1000), 12);
    expect(span?.x).toBeCloseTo(4 / Math.sqrt(3), 9);
    expect(tip).toEqual({ x: 5.5, value: expect.closeTo((3 * 1.5 ** 3 * 20.5) / 24000, 12) });
  });
});

describe('length between points of zero moment', () => {
  const { moment } = effectsOf(two, [uniform(3, 0, 8)]);

  it('hogging over the middle support of two equal spans: L / 4 on each side', () => {
    expect(zeroMomentLength(moment, 4)).toBeCloseTo(2, 10);
  });

  it('sagging in a span: from the end to L / 4 before the support', () => {
    expect(zeroMomentLength(moment, 1.5)).toBeCloseTo(3, 10);
    expect(zeroMomentLength(moment, 6.5)).toBeCloseTo(3, 10);
  });

  it('between fixed ends: L / √3', () => {
    const fixed = effectsOf({ spans: [6], restraints: ['fixed', 'fixed'], EI: 1 }, [uniform(1, 0, 6)]);
    expect(zeroMomentLength(fixed.moment, 3)).toBeCloseTo(6 / Math.sqrt(3), 10);
    // At a fixed end the hogging part, which ends with the member on the other side.
    expect(zeroMomentLength(fixed.moment, 0)).toBeCloseTo(3 - Math.sqrt(3), 10);
  });

  it('ends where a couple turns the moment over', () => {
    const turned = effectsOf({ spans: [4], restraints: ['pin', 'pin'], EI: 1 }, [
      { kind: 'couple', x: 2, moment: 6 },
    ]);
    expect(zeroMomentLength(turned.moment, 1)).toBeCloseTo(2, 12);
    expect(zeroMomentLength(turned.moment, 3)).toBeCloseTo(2, 12);
  });

  it('stops at the support of an overhang without load', () => {
    const beam: Beam = { spans: [4, 2], restraints: ['pin', 'pin', 'free'], EI: 1 };
    expect(zeroMomentLength(effectsOf(beam, [uniform(3, 0, 4)]).moment, 2)).toBeCloseTo(4, 12);
  });

  it('of a cantilever is its length, and 0 where there is no moment at all', () => {
    const beam: Beam = { spans: [3], restraints: ['fixed', 'free'], EI: 1 };
    expect(zeroMomentLength(effectsOf(beam, [{ kind: 'point', x: 3, force: 1 }]).moment, 0)).toBeCloseTo(
      3,
      12,
    );
    expect(zeroMomentLength(effectsOf(beam, []).moment, 1)).toBe(0);
  });
});
