import { arrangements, clipToSpans } from '#shared/analysis/arrangements.ts';
import { combine } from '#shared/analysis/combine.ts';
import { peakPerSpan, spanDeflections } from '#shared/analysis/peaks.ts';
import { valueAt } from '#shared/analysis/pieces.ts';
import { prepare } from '#shared/analysis/solve.ts';
import type { BeamLoad, Effects } from '#shared/analysis/types.ts';
import { zeroMomentLength } from '#shared/analysis/zeroMoment.ts';
import { shearNear } from '#shared/analysis/shearNear.ts';
import type { Member } from '#shared/basis/schema/index.ts';

/*
 * The checks of the test edition as an engineer would program them for this one basis: factors and
 * combinations in the code, softwood T16, dry, no notches. Only the analysis is taken from the library.
 */

const grade = { f_m: 5.3, f_v: 0.67, f_p: 2.2, E_mean: 8800, E_min: 5800, rho: 370 };
const actions = ['dead', 'imposed', 'snow'] as const;
const duration = { dead: 1, imposed: 1.25, snow: 1.5 };
const psi = { dead: 1, imposed: 0.3, snow: 0.2 };
const creep = 0.6;

export interface ByHand {
  bending: number;
  shear: number;
  bearing: number;
  sag: number;
  liveSag: number;
  ratio: number;
}

type Factors = Partial<Record<(typeof actions)[number], number>>;

function loadsOf(member: Member, action: string, total: number, self: number): BeamLoad[] {
  const width = member.carries?.width ?? 0;
  const loads = member.loads
    .filter((load) => load.action === action)
    .map((load): BeamLoad => {
      if (load.kind === 'point') return { kind: 'point', x: load.x, force: load.force * 1000 };
      if (load.kind === 'couple') return { kind: 'couple', x: load.x, moment: load.moment * 1e6 };
      const size = load.kind === 'area' ? load.intensity * 1e-3 * width : load.start;
      const last = load.kind === 'line' && load.end !== undefined ? load.end : size;
      return {
        kind: 'line',
        from: load.from ?? 0,
        to: load.to ?? total,
        startIntensity: size,
        endIntensity: last,
      };
    });
  if (action !== 'dead') return loads;
  return [...loads, { kind: 'line', from: 0, to: total, startIntensity: self, endIntensity: self }];
}

/** Combinations for strength, for the final deflection and for the variable actions alone. */
function combinationsOf(carried: readonly (typeof actions)[number][]) {
  const variable = carried.filter((action) => action !== 'dead');
  const strength: Factors[] = [{ dead: 1 }];
  const final: Factors[] = variable.length ? [] : [{ dead: 1 + creep }];
  for (const lead of variable) {
    strength.push({ dead: 1, [lead]: 1 });
    const others = variable.filter((action) => action !== lead);
    if (others.length) {
      strength.push({
        dead: 1,
        [lead]: 1,
        ...Object.fromEntries(others.map((action) => [action, 0.5 + psi[action]])),
      });
    }
    final.push({
      dead: 1 + creep,
      [lead]: 1 + psi[lead] * creep,
      ...Object.fromEntries(others.map((action) => [action, psi[action] * (1 + creep)])),
    });
  }
  const live: Factors = Object.fromEntries(variable.map((action) => [action, 1]));
  return { strength, final, live: variable.length ? [live] : [] };
}

/** Utilisations of a member in T16; metric, level, supported at every node. */
export function byHand(member: Member): ByHand {
  const { b: b1, h, pieces } = member.section;
  const b = b1 * pieces;
  const A = b * h;
  const W = (b * h ** 2) / 6;
  const shared = member.choices['sharing'] === 'shared';
  const E = shared ? grade.E_mean : grade.E_min;
  const spans = member.spans.map(({ length }) => length);
  const total = spans.reduce((sum, length) => sum + length, 0);
  const beam = {
    spans,
    restraints: member.supports.map(({ restraint }) => restraint),
    EI: (E * b * h ** 3) / 12,
    GA: ((E / 16) * A * 5) / 6,
  };
  const prepared = prepare(beam);
  if (!prepared.ok) throw new Error('mechanism');
  const { solver } = prepared;
  const solve = (loads: readonly BeamLoad[]): Effects => {
    const outcome = solver.solve(loads);
    if (!outcome.ok) throw new Error('loads');
    return outcome.effects;
  };
  const self = (grade.rho * 9.80665 * b * h) / 1e9;
  const carried = actions.filter(
    (action) => action === 'dead' || member.loads.some((load) => load.action === action),
  );
  const subsets = spans.length > 1 ? arrangements(spans.length, beam.restraints) : [[0]];
  const cases = carried.map((action) => {
    const loads = loadsOf(member, action, total, self);
    const sets =
      action === 'imposed' && spans.length > 1
        ? subsets.map((subset) => clipToSpans(loads, beam, subset))
        : [loads];
    return sets.map((set) => ({ loads: set, effects: solve(set) }));
  });
  const spacing = member.carries?.by === 'spacing' ? member.carries.width : Infinity;
  const K_s = shared && (spacing <= 610 || pieces >= 4) ? 1.1 : 1;
  const K_h = h <= 72 ? 1.17 : h < 300 ? (300 / h) ** 0.11 : (0.81 * (h ** 2 + 92300)) / (h ** 2 + 56800);
  const K_l = h / b <= 5 ? 1 : Math.min(1, (6 * b) / h, (12 * h) / 600);
  const found: ByHand = { bending: 0, shear: 0, bearing: 0, sag: 0, liveSag: 0, ratio: h / b / 7 };
  const { strength, final, live } = combinationsOf(carried);

  const each = (factors: Factors, visit: (effects: Effects, a: number) => void) => {
    const patterned = factors.imposed !== undefined && spans.length > 1;
    for (let a = 0; a < (patterned ? subsets.length : 1); a += 1) {
      const parts = carried.flatMap((action, i) => {
        const factor = factors[action];
        const one = cases[i]?.[a] ?? cases[i]?.[0];
        return factor === undefined || !one ? [] : [{ effects: one.effects, factor }];
      });
      visit(combine(parts), a);
    }
  };

  for (const factors of strength) {
    const K_d = Math.max(...actions.map((action) => (factors[action] ? duration[action] : 0)));
    const size: { sagging: number; hogging: number }[] = spans.map(() => ({ sagging: 0, hogging: 0 }));
    each(factors, (effects, a) => {
      peakPerSpan(effects.moment, spans).forEach(({ most, least }, span) => {
        const worst = size[span];
        if (!worst) return;
        for (const [side, peak] of [
          ['sagging', most],
          ['hogging', { ...least, value: -least.value }],
        ] as const) {
          if (peak.value <= 1e-6 || peak.value < worst[side] * (1 - 1e-9)) continue;
          worst[side] = Math.max(worst[side], peak.value);
          const M_variable = carried.reduce((sum, action, i) => {
            const one = cases[i]?.[a] ?? cases[i]?.[0];
            const factor = factors[action];
            if (action === 'dead' || factor === undefined || !one) return sum;
            return sum + factor * valueAt(one.effects.moment, peak.x, 'left');
          }, 0);
          const r = ((side === 'sagging' ? 1 : -1) * M_variable) / peak.value;
          const L_0 = zeroMomentLength(effects.moment, peak.x);
          const K_v = Math.min(1, (3000 / Math.max(1, L_0)) ** 0.05) * (1 - r / 1000);
          const limit = grade.f_m * K_d * K_h * K_s * K_l * K_v;
          found.bending = Math.max(found.bending, peak.value / W / limit);
        }
      });
      effects.reactions.forEach((reaction, node) => {
        const l_b = member.supports[node]?.bearing ?? 0;
        const stress = Math.max(0, reaction) / (b * l_b);
        found.bearing = Math.max(
          found.bearing,
          stress / (grade.f_p * K_d * K_s * bearingFactor(spans, node, l_b)),
        );
        for (const side of ['left', 'right'] as const) {
          if (side === 'left' ? node === 0 : node === spans.length) continue;
          const V = carried.reduce((sum, action, i) => {
            const one = cases[i]?.[a] ?? cases[i]?.[0];
            const factor = factors[action];
            if (factor === undefined || !one) return sum;
            const near = shearNear(
              { spans, solver, loads: one.loads, effects: one.effects },
              { node, side, toFace: l_b / 2 },
              { from: 'face', distance: h, pointLoads: 'keep' },
            );
            return sum + factor * near;
          }, 0);
          found.shear = Math.max(found.shear, (1.5 * Math.abs(V)) / A / (grade.f_v * K_d * K_s));
        }
      });
    });
  }
  for (const factors of final) {
    each(factors, ({ deflection }) => {
      spanDeflections(deflection, beam).forEach(({ value }, span) => {
        found.sag = Math.max(found.sag, Math.abs(value) / Math.min(0.004 * (spans[span] ?? 0), 18));
      });
    });
  }
  for (const factors of live) {
    each(factors, ({ deflection }) => {
      spanDeflections(deflection, beam).forEach(({ value }, span) => {
        found.liveSag = Math.max(found.liveSag, Math.abs(value) / ((spans[span] ?? 0) / 250));
      });
    });
  }
  return found;
}

function bearingFactor(spans: readonly number[], node: number, length: number): number {
  if (node === 0 || node === spans.length) return 1;
  const before = spans.slice(0, node).reduce((sum, span) => sum + span, 0);
  const after = spans.slice(node).reduce((sum, span) => sum + span, 0);
  if (Math.min(before, after) - length / 2 < 75) return 1;
  const points = [10, 50, 100, 150];
  const values = [1.7, 1.3, 1.1, 1];
  if (length <= 10) return 1.7;
  for (let i = 1; i < points.length; i += 1) {
    const [x0, x1, y0, y1] = [points[i - 1], points[i], values[i - 1], values[i]] as [
      number,
      number,
      number,
      number,
    ];
    if (length <= x1) return y0 + ((y1 - y0) * (length - x0)) / (x1 - x0);
  }
  return 1;
}
