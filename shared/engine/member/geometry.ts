import type { Restraint } from '#shared/analysis/types.ts';
import type { Finding } from '../types.ts';

/** What the spans of the model are worked out from, in the edition's length unit. */
export interface Layout {
  measured: 'centres' | 'clear';
  /** As measured; on plan where the member slopes. */
  lengths: readonly number[];
  restraints: readonly Restraint[];
  /** Bearing length at each support, null where none was given. */
  bearings: readonly (number | null)[];
  /** Cosine of the slope; 1 for a level member. */
  cosine: number;
}

/** The edition's rule for the spans of the model; `allowance` is added to the clear span at each end. */
export type SpanRule = { rule: 'centres' } | { rule: 'clearPlus'; allowance: number };

/** One span of the model: `length = (measured + left + right) / cosine`. */
export interface EffectiveSpan {
  measured: number;
  left: number;
  right: number;
  length: number;
}

/** The member's axis in the model, and how places measured by people fall on it. */
export interface Geometry {
  spans: readonly EffectiveSpan[];
  /** Places of the nodes along the member, from 0. */
  nodes: readonly number[];
  cosine: number;
  /** Where the measured spans begin and end. */
  marks: readonly number[];
}

/**
 * Spans for the analysis by the edition's rule.
 *
 * `centres`: centre to centre of bearings; half a bearing is added at each end of a clear span.
 * `clearPlus`: clear span plus the allowance at each end; half a bearing is taken off a span measured
 * between centres (where a bearing is not given, that span is used as it is, which is never shorter than
 * the clear span). Free ends get nothing.
 */
export function layOut(
  layout: Layout,
  rule: SpanRule,
): { ok: true; geometry: Geometry } | { ok: false; findings: Finding[] } {
  const findings: Finding[] = [];
  const spans: EffectiveSpan[] = [];
  for (let i = 0; i < layout.lengths.length; i += 1) {
    const measured = layout.lengths[i] as number;
    const left = addition(layout, rule, i, findings);
    const right = addition(layout, rule, i + 1, findings);
    const length = (measured + left + right) / layout.cosine;
    if (length > 0) spans.push({ measured, left, right, length });
    else {
      findings.push({
        severity: 'error',
        code: 'span-too-short',
        message: `Span ${i + 1} has nothing left between its supports. Check its length and the bearings at its ends.`,
        pointer: `/spans/${i}/length`,
        in: 'member',
      });
    }
  }
  if (findings.length) return { ok: false, findings: unique(findings) };
  return {
    ok: true,
    geometry: {
      spans,
      nodes: sums(spans.map(({ length }) => length)),
      marks: sums(layout.lengths),
      cosine: layout.cosine,
    },
  };
}

/** Added to a measured span at the support of that index. */
function addition(layout: Layout, rule: SpanRule, support: number, findings: Finding[]): number {
  if (layout.restraints[support] === 'free') return 0;
  const bearing = layout.bearings[support] ?? null;
  if (rule.rule === 'clearPlus') {
    if (layout.measured === 'clear') return rule.allowance;
    return bearing === null ? 0 : rule.allowance - bearing / 2;
  }
  if (layout.measured === 'centres') return 0;
  if (bearing !== null) return bearing / 2;
  findings.push({
    severity: 'error',
    code: 'bearing-missing',
    message: `Support ${support + 1} needs a bearing length, because clear spans were given and this edition works centre to centre of bearings.`,
    pointer: `/supports/${support}/bearing`,
    in: 'member',
  });
  return 0;
}

/**
 * Place on the model's axis of a place measured from the left end along the measured spans; null outside
 * the member. The ends of measured spans fall on the nodes, so that a load over a whole span covers it.
 */
export function placeOn(geometry: Geometry, measured: number): number | null {
  const { marks, nodes, spans, cosine } = geometry;
  const total = marks[marks.length - 1] as number;
  const tolerance = total * 1e-9;
  if (!(measured >= -tolerance && measured <= total + tolerance)) return null;
  for (let i = 0; i < spans.length; i += 1) {
    const start = marks[i] as number;
    const end = marks[i + 1] as number;
    const from = nodes[i] as number;
    const to = nodes[i + 1] as number;
    if (measured <= start + tolerance) return from;
    if (measured < end - tolerance) {
      const x = from + ((spans[i] as EffectiveSpan).left + measured - start) / cosine;
      return Math.min(Math.max(x, from), to);
    }
  }
  return nodes[nodes.length - 1] as number;
}

function sums(lengths: readonly number[]): number[] {
  const places = [0];
  for (const length of lengths) places.push((places[places.length - 1] as number) + length);
  return places;
}

function unique(findings: Finding[]): Finding[] {
  return findings.filter(
    (finding, i) =>
      findings.findIndex((other) => other.pointer === finding.pointer && other.code === finding.code) === i,
  );
}
