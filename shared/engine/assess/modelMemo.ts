import type { Model } from '../effects/model.ts';
import type { Geometry } from '../member/geometry.ts';
import type { Member } from '../types.ts';

/**
 * The last model analysed, kept for the next member where only section or grade change (a section search):
 * such members share their spans, supports and loads as objects.
 */
export class ModelMemo {
  #member: Member | null = null;
  #geometry: Geometry | null = null;
  #ratio: number | null = null;
  #model: Model | null = null;

  recall(member: Member, geometry: Geometry, ratio: number | null): Model | null {
    const known = this.#member;
    const same =
      known?.loads === member.loads &&
      known.supports === member.supports &&
      known.carries === member.carries &&
      known.slope === member.slope &&
      known.units === member.units &&
      this.#ratio === ratio &&
      this.#geometry !== null &&
      sameSpans(this.#geometry, geometry);
    return same ? this.#model : null;
  }

  keep(member: Member, geometry: Geometry, ratio: number | null, model: Model): void {
    this.#member = member;
    this.#geometry = geometry;
    this.#ratio = ratio;
    this.#model = model;
  }
}

function sameSpans({ spans, cosine }: Geometry, other: Geometry): boolean {
  return (
    cosine === other.cosine &&
    spans.length === other.spans.length &&
    spans.every((span, i) => {
      const against = other.spans[i];
      return (
        against !== undefined &&
        span.measured === against.measured &&
        span.left === against.left &&
        span.right === against.right
      );
    })
  );
}
