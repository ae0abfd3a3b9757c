import type { Place } from '../assess/places.ts';

/** A place in words: "span 1", "support 2, right side". */
export function placeName({ kind, span, node, side, value }: Place, nodes: number): string {
  switch (kind) {
    case 'moment':
      return `span ${span + 1}, ${value < 0 ? 'hogging' : 'sagging'}`;
    case 'deflection':
      return `span ${span + 1}`;
    case 'shear':
      return node === 0 || node === nodes - 1 ? `support ${node + 1}` : `support ${node + 1}, ${side} side`;
    default:
      return `support ${node + 1}`;
  }
}

/** Spans in words: "span 1", "spans 1 and 3". */
export function spanNames(spans: readonly number[]): string {
  const names = spans.map((span) => String(span + 1));
  if (names.length === 1) return `span ${names[0] as string}`;
  return `spans ${names.slice(0, -1).join(', ')} and ${names[names.length - 1] as string}`;
}
