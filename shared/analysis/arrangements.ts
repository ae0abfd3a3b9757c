import type { Beam, BeamLoad, Restraint } from './types.ts';

/**
 * The sets of spans to load with a patterned action. For a straight member of constant section the influence
 * lines change sign from span to span, so the extremes are among: all spans, every other span (both ways),
 * and for each inner support the two spans beside it with every other beyond, and the complement of that.
 *
 * @returns Sets of span numbers, each rising, without repeats.
 */
export function arrangements(spans: number, restraints: readonly Restraint[]): number[][] {
  const all = Array.from({ length: spans }, (_, i) => i);
  const sets: number[][] = [all, all.filter((i) => i % 2 === 0), all.filter((i) => i % 2 === 1)];
  for (let node = 1; node < spans; node += 1) {
    if (restraints[node] === 'free') continue;
    const beside = all.filter((i) => (i < node ? (node - 1 - i) % 2 === 0 : (i - node) % 2 === 0));
    sets.push(
      beside,
      all.filter((i) => !beside.includes(i)),
    );
  }
  const seen = new Set<string>();
  return sets.filter((set) => {
    const key = set.join();
    if (set.length === 0 || seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}

/** The parts of the loads that lie on the given spans. What stands on a node belongs to the span on its left,
 *  at the first node to the first span. */
export function clipToSpans(
  loads: readonly BeamLoad[],
  beam: Pick<Beam, 'spans'>,
  subset: readonly number[],
): BeamLoad[] {
  const nodes = [0];
  for (const length of beam.spans) nodes.push((nodes[nodes.length - 1] as number) + length);
  return loads.flatMap((load) =>
    subset.flatMap((span): BeamLoad[] => {
      const left = nodes[span] as number;
      const right = nodes[span + 1] as number;
      if (load.kind !== 'line') {
        const inside = load.x <= right && (load.x > left || (span === 0 && load.x >= left));
        return inside ? [load] : [];
      }
      const from = Math.max(load.from, left);
      const to = Math.min(load.to, right);
      if (!(to > from)) return [];
      const slope = (load.endIntensity - load.startIntensity) / (load.to - load.from);
      const at = (x: number) => load.startIntensity + slope * (x - load.from);
      return [{ kind: 'line', from, to, startIntensity: at(from), endIntensity: at(to) }];
    }),
  );
}
