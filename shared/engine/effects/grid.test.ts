import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { peakPerSpan, spanDeflections } from '#shared/analysis/peaks.ts';
import { solve } from '#shared/analysis/solve.ts';
import type { Beam, BeamLoad, Effects } from '#shared/analysis/types.ts';
import { combine } from '#shared/analysis/combine.ts';
import { addTo, toGrid } from './grid.ts';
import { deflectionPeak, type GridPeak, momentPeaks } from './peaks.ts';

const beams = fc.record({
  spans: fc.array(fc.integer({ min: 5, max: 60 }), { minLength: 1, maxLength: 4 }),
  overhang: fc.boolean(),
});

const sets = fc.array(
  fc.array(
    fc.record({
      kind: fc.constantFrom('whole', 'part', 'point', 'couple'),
      size: fc.integer({ min: -20, max: 30 }),
      a: fc.integer({ min: 1, max: 9 }),
      b: fc.integer({ min: 1, max: 9 }),
    }),
    { minLength: 1, maxLength: 3 },
  ),
  { minLength: 2, maxLength: 3 },
);

function beamOf({ spans, overhang }: { spans: number[]; overhang: boolean }): Beam {
  const restraints: Beam['restraints'] = spans.map(() => 'pin');
  const last = overhang && spans.length > 1 ? 'free' : 'pin';
  return { spans, restraints: [...restraints, last], EI: 1 };
}

type Raw = { kind: string; size: number; a: number; b: number };

function loadOf({ kind, size, a, b }: Raw, total: number): BeamLoad {
  const at = (tenths: number) => (total * tenths) / 10;
  if (kind === 'point') return { kind: 'point', x: at(a), force: size };
  if (kind === 'couple') return { kind: 'couple', x: at(a), moment: size * 5 };
  const [from, to] = kind === 'whole' || a === b ? [0, total] : [at(Math.min(a, b)), at(Math.max(a, b))];
  return { kind: 'line', from, to, startIntensity: size, endIntensity: kind === 'whole' ? size : size / 2 };
}

const peak = (): GridPeak => ({ x: 0, piece: 0, value: 0 });

describe('the grid', () => {
  it('superposes and finds the same peaks as the analysis does piece by piece', () => {
    fc.assert(
      fc.property(beams, sets, (raw, loads) => {
        const beam = beamOf(raw);
        const nodes = beam.spans.reduce((all, l) => [...all, (all[all.length - 1] ?? 0) + l], [0]);
        const total = nodes[nodes.length - 1] ?? 0;
        const effects = loads.map((set): Effects => {
          const outcome = solve(
            beam,
            set.map((each) => loadOf(each, total)),
          );
          if (!outcome.ok) throw new Error('the analysis refuses');
          return outcome.effects;
        });
        const factors = [1.35, -0.5, 1.2];
        const whole = combine(effects.map((each, i) => ({ effects: each, factor: factors[i] ?? 1 })));
        const grid = toGrid(nodes, effects);
        const sum = (key: 'moment' | 'deflection') => {
          const out = new Float64Array(grid.cases[0]?.[key].length ?? 0);
          grid.cases.forEach((each, i) => {
            addTo(out, each[key], factors[i] ?? 1);
          });
          return out;
        };
        const moment = sum('moment');
        const deflection = sum('deflection');
        const perSpan = peakPerSpan(whole.moment, beam.spans);
        const sags = spanDeflections(whole.deflection, beam);
        const size = Math.max(...perSpan.map(({ most, least }) => Math.max(most.value, -least.value)));
        const sagSize = Math.max(...sags.map(({ value }) => Math.abs(value)));
        beam.spans.forEach((_, span) => {
          const most = peak();
          const least = peak();
          momentPeaks(grid, moment, span, most, least);
          expect(Math.abs(most.value - (perSpan[span]?.most.value ?? 0))).toBeLessThan(size * 1e-9 + 1e-12);
          expect(Math.abs(least.value - (perSpan[span]?.least.value ?? 0))).toBeLessThan(size * 1e-9 + 1e-12);
          const sag = peak();
          deflectionPeak(grid, deflection, span, sag);
          expect(Math.abs(Math.abs(sag.value) - Math.abs(sags[span]?.value ?? 0))).toBeLessThan(
            sagSize * 1e-9 + 1e-12,
          );
        });
      }),
      { numRuns: 300 },
    );
  });
});
