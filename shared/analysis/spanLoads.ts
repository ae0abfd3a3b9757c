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

/** Cuts line loads at the nodes and gives point loads and couples to their span or node. */
export function placeLoads(nodes: readonly number[], loads: readonly BeamLoad[]): PlacedLoads {
  const spans = nodes.slice(1).map((): SpanLoads => ({ lines: [], points: [], couples: [] }));
  const nodeForces = new Float64Array(nodes.length);
  const nodeCouples = new Float64Array(nodes.length);
  const trace = (nodes[nodes.length - 1] as number) * 1e-12;
  for (const load of loads) {
    if (load.kind === 'line') {
      placeLine(nodes, spans, load, trace);
      continue;
    }
    const node = nodes.findIndex((x) => Math.abs(x - load.x) <= trace);
    if (load.kind === 'point') {
      if (node >= 0) nodeForces[node] = (nodeForces[node] as number) + load.force;
      else inSpan(nodes, load.x, (span, at) => spans[span]?.points.push({ at, force: load.force }));
    } else if (node >= 0) nodeCouples[node] = (nodeCouples[node] as number) + load.moment;
    else inSpan(nodes, load.x, (span, at) => spans[span]?.couples.push({ at, moment: load.moment }));
  }
  return { spans, nodeForces, nodeCouples };
}

function inSpan(nodes: readonly number[], x: number, put: (span: number, at: number) => void): void {
  for (let span = 0; span + 1 < nodes.length; span += 1) {
    if (x < (nodes[span + 1] as number)) return put(span, x - (nodes[span] as number));
  }
}

function placeLine(
  nodes: readonly number[],
  spans: readonly SpanLoads[],
  load: Extract<BeamLoad, { kind: 'line' }>,
  trace: number,
): void {
  const slope = (load.endIntensity - load.startIntensity) / (load.to - load.from);
  const intensity = (x: number) => load.startIntensity + slope * (x - load.from);
  spans.forEach((span, index) => {
    const left = nodes[index] as number;
    const right = nodes[index + 1] as number;
    const from = Math.max(load.from, left);
    const to = Math.min(load.to, right);
    if (to - from <= trace) return;
    span.lines.push({
      from: from - left,
      to: to - left,
      start: from === load.from ? load.startIntensity : intensity(from),
      end: to === load.to ? load.endIntensity : intensity(to),
    });
  });
}
