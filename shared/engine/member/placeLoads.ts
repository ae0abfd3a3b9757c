import type { BeamLoad } from '#shared/analysis/types.ts';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { ActionLoads } from '../effects/model.ts';
import type { Finding } from '../types.ts';
import { type Geometry, placeOn } from './geometry.ts';
import type { Given, GivenLoad } from './given.ts';

export type Placing = { ok: true; actions: ActionLoads[] } | { ok: false; findings: Finding[] };

/**
 * Puts the loads on the model's axis, as their parts at right angles to the member. On a slope of angle a
 * a vertical load per length on plan counts cos²a per length of member, one per length on the slope
 * cos a, one at right angles in full; vertical forces count cos a.
 */
export function placeLoads(edition: Edition, given: Given, geometry: Geometry): Placing {
  const findings: Finding[] = [];
  const byAction = new Map<number, BeamLoad[]>();
  for (const each of given.loads) {
    const load = placed(each, geometry);
    if (typeof load === 'string') {
      findings.push({
        severity: 'error',
        code: 'load-outside',
        message: 'This load lies outside the member. Places are measured from its left end, along the spans.',
        pointer: `/loads/${each.index}/${load}`,
        in: 'member',
      });
      continue;
    }
    const known = byAction.get(each.action);
    if (known) known.push(load);
    else byAction.set(each.action, [load]);
  }
  if (findings.length) return { ok: false, findings };
  const actions = [...byAction.entries()]
    .sort(([a], [b]) => a - b)
    .map(([action, loads]) => ({
      action,
      patterned: edition.actions[action]?.patterned === true,
      loads,
    }));
  return { ok: true, actions };
}

/** The load on the axis, or the name of the field that lies outside. */
function placed({ load, direction }: GivenLoad, geometry: Geometry): BeamLoad | string {
  const { cosine } = geometry;
  if (load.kind !== 'line') {
    const x = placeOn(geometry, load.x);
    if (x === null) return 'x';
    if (load.kind === 'couple') return { ...load, x };
    return { kind: 'point', x, force: direction === 'normal' ? load.force : load.force * cosine };
  }
  const end = geometry.marks[geometry.marks.length - 1] as number;
  const from = placeOn(geometry, load.from);
  if (from === null) return 'from';
  const to = placeOn(geometry, load.to === Infinity ? end : load.to);
  if (to === null || to <= from) return 'to';
  const factor = direction === 'normal' ? 1 : direction === 'plan' ? cosine * cosine : cosine;
  return {
    kind: 'line',
    from,
    to,
    startIntensity: load.startIntensity * factor,
    endIntensity: load.endIntensity * factor,
  };
}
