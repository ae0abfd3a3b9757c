import { nodesOf } from './pieces.ts';
import type { Beam, BeamLoad, Restraint } from './types.ts';

/**
 * The sets of spans to load with a patterned action, a span being loaded whole or not at all. For a straight
 * member of constant section the influence of whole spans changes sign from span to span, so the extremes of
 * every effect are among: all spans, every other span (both ways), and for each inner support the two spans
 * beside it with every other beyond, and the complement of that (theory of continuous beams; the tests
 * compare with every possible set). Overhangs count as spans.
 *
 * Holds while a span carries moment over to its far end with the usual sign, which spans shorter than about
 * three depths lose where shear deformation counts.
 *
 * @returns Sets of span numbers, each rising, without repeats or the empty set.
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

/**
 * The parts of the loads that lie on the given spans. What stands on a node belongs to the span on its left,
 * at the first node to the first span, so that each load belongs to exactly one span.
 */
export function clipToSpans(
  loads: readonly BeamLoad[],
  beam: Pick<Beam, 'spans'>,
  subset: readonly number[],
): BeamLoad[] {
  const nodes = nodesOf(beam.spans);
  return loads.flatMap((load) =>
    subset.flatMap((span): BeamLoad[] => {
      const left = nodes[span] as number;
      const right = nodes[span + 1] as number;
      if (load.kind !== 'line') {
        // An end span also takes what rounding puts beyond the end.
        const afterLeft = span === 0 || load.x > left;
        const beforeRight = span === beam.spans.length - 1 || load.x <= right;
        return afterLeft && beforeRight ? [load] : [];
      }
      const from = Math.max(load.from, left);
      const to = Math.min(load.to, right);
      if (!(to > from)) return [];
      const slope = (load.endIntensity - load.startIntensity) / (load.to - load.from);
      const startIntensity =
        from === load.from ? load.startIntensity : load.startIntensity + slope * (from - load.from);
      const endIntensity =
        to === load.to ? load.endIntensity : load.startIntensity + slope * (to - load.from);
      return [{ kind: 'line', from, to, startIntensity, endIntensity }];
    }),
  );
}
