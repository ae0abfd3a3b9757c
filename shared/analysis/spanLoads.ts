import type { BeamLoad } from './types.ts';

/** A line load within one span: places from the span's left end. */
export interface LinePart {
  from: number;
  to: number;
  start: number;
  end: number;
}

/** Loads of one span, places from its left end. */
export interface SpanLoads {
  lines: LinePart[];
  points: { at: number; force: number }[];
  couples: { at: number; moment: number }[];
}

/** Loads sorted by where they act: inside a span, or on a node, where they go straight to the support. */
export interface PlacedLoads {
  spans: readonly SpanLoads[];
  nodeForces: Float64Array;
  nodeCouples: Float64Array;
}

/** Places nearer than this share of the member are one place: the rounding of a sum of lengths. */
export const SAME_PLACE = 1e-14;

/** A line load over less than this share of the member acts as a point load; the error is of its square. */
const SLIVER = 1e-11;

/** Cuts line loads at the nodes and gives point loads and couples to their span or node. No load is lost. */
export function placeLoads(nodes: readonly number[], loads: readonly BeamLoad[]): PlacedLoads {
  const spans: SpanLoads[] = [];
  for (let i = 0; i + 1 < nodes.length; i += 1) spans.push({ lines: [], points: [], couples: [] });
  const placed = {
    spans,
    nodeForces: new Float64Array(nodes.length),
    nodeCouples: new Float64Array(nodes.length),
  };
  // Twice, so that nothing inside a span is as near to its ends as places inside the span are to each other.
  const trace = 2 * SAME_PLACE * (nodes[nodes.length - 1] as number);
  for (const load of loads) {
    if (load.kind === 'line') placeLine(nodes, placed, load, trace);
    else placeAt(nodes, placed, load, trace);
  }
  return placed;
}

function placeAt(
  nodes: readonly number[],
  { spans, nodeForces, nodeCouples }: PlacedLoads,
  load: Exclude<BeamLoad, { kind: 'line' }>,
  trace: number,
): void {
  let node = 0;
  while (node + 1 < nodes.length && load.x >= (nodes[node + 1] as number) - trace) node += 1;
  const at = load.x - (nodes[node] as number);
  const span = spans[node];
  const onNode = at <= trace || span === undefined;
  if (load.kind === 'point') {
    if (onNode) nodeForces[node] = (nodeForces[node] as number) + load.force;
    else span.points.push({ at, force: load.force });
  } else if (onNode) nodeCouples[node] = (nodeCouples[node] as number) + load.moment;
  else span.couples.push({ at, moment: load.moment });
}

function placeLine(
  nodes: readonly number[],
  placed: PlacedLoads,
  load: Extract<BeamLoad, { kind: 'line' }>,
  trace: number,
): void {
  const { spans } = placed;
  const sliver = SLIVER * (nodes[nodes.length - 1] as number);
  const slope = (load.endIntensity - load.startIntensity) / (load.to - load.from);
  for (let i = 0; i < spans.length; i += 1) {
    const left = nodes[i] as number;
    const right = nodes[i + 1] as number;
    // What rounding puts beyond an end belongs to the end span.
    const from = i === 0 || load.from > left ? load.from : left;
    const to = i === spans.length - 1 || load.to < right ? load.to : right;
    if (!(to > from)) continue;
    const start = from === load.from ? load.startIntensity : load.startIntensity + slope * (from - load.from);
    const end = to === load.to ? load.endIntensity : load.startIntensity + slope * (to - load.from);
    if (to - from <= sliver) {
      const force = ((start + end) / 2) * (to - from);
      placeAt(nodes, placed, { kind: 'point', x: (from + to) / 2, force }, trace);
      continue;
    }
    (spans[i] as SpanLoads).lines.push({
      from: Math.max(from - left, 0),
      to: Math.min(to, right) - left,
      start,
      end,
    });
  }
}
