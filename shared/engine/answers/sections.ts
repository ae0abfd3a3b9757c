import { ModelMemo } from '../assess/modelMemo.ts';
import type { FoundSection, Member, Plan, StockSection } from '../types.ts';
import { type QuickVerdict, verdict } from '../verdict.ts';

export interface FindOptions {
  stock: readonly StockSection[];
  /** Grade ids; left out: every grade of the edition. */
  grades?: readonly string[];
  rank: 'depth' | 'volume' | 'cost';
}

const passing = (found: QuickVerdict) => found.word === 'passes' || found.word === 'close';

/** The member made of a stock section, ordered and finished size. */
export function withSection(member: Member, { actual, nominal, id }: StockSection, grade: string): Member {
  const { pieces } = member.section;
  return { ...member, grade, section: { b: actual.b, h: actual.h, pieces, nominal, stock: id } };
}

const tried = (plan: Plan, member: Member, memo: ModelMemo) =>
  verdict(plan, member, memo, null, 'until-failing');

const soldIn = ({ grades }: StockSection, grade: string) => grades?.includes(grade) ?? true;

/** Sizes this close are the same breadth. */
const SAME = 1e-6;

/**
 * The shallowest stock section of the member's breadth and grade that passes every check; null where
 * there is none.
 */
export function nextInStock(plan: Plan, member: Member, stock: readonly StockSection[]): StockSection | null {
  const memo = new ModelMemo();
  const fitting = stock
    .filter(
      (section) =>
        Math.abs(section.actual.b - member.section.b) <= SAME * member.section.b &&
        soldIn(section, member.grade),
    )
    .sort((a, b) => a.actual.h - b.actual.h);
  return (
    fitting.find((section) => passing(tried(plan, withSection(member, section, member.grade), memo))) ?? null
  );
}

/** Sections and grades that pass, best first. The same as running `sectionSearch` to its end. */
export function findSections(plan: Plan, member: Member, options: FindOptions): FoundSection[] {
  const search = sectionSearch(plan, member, options);
  let step = search.next();
  while (!step.done) step = search.next();
  return step.value;
}

/**
 * A section search that can be paused: yields after each section and grade tried, with the share done,
 * and returns what passes, best first. A browser runs it in slices between frames.
 */
export function* sectionSearch(
  plan: Plan,
  member: Member,
  { stock, grades, rank }: FindOptions,
): Generator<number, FoundSection[]> {
  const wanted = grades ?? plan.edition.grades.rows.map(({ id }) => id);
  const memo = new ModelMemo();
  const found: FoundSection[] = [];
  const total = stock.length * wanted.length;
  let done = 0;
  for (const section of stock) {
    for (const grade of wanted) {
      done += 1;
      if (soldIn(section, grade)) {
        const result = tried(plan, withSection(member, section, grade), memo);
        if (passing(result)) found.push(foundSection(section, grade, member.section.pieces, result));
      }
      yield done / total;
    }
  }
  return found.sort(byRank(rank));
}

function foundSection(
  section: StockSection,
  grade: string,
  pieces: number,
  { word, utilisation, check }: QuickVerdict,
): FoundSection {
  const { actual, pricePerMetre } = section;
  return {
    section,
    grade,
    pieces,
    word,
    utilisation,
    check,
    area: actual.b * actual.h * pieces,
    ...(pricePerMetre === undefined ? {} : { cost: pricePerMetre * pieces }),
  };
}

/** Ties go to the smaller area, the shallower, then the higher utilisation, then by name. */
function byRank(rank: FindOptions['rank']): (a: FoundSection, b: FoundSection) => number {
  const first = (found: FoundSection) => {
    if (rank === 'depth') return found.section.actual.h;
    return rank === 'volume' ? found.area : (found.cost ?? Infinity);
  };
  return (a, b) =>
    order(first(a), first(b)) ||
    order(a.area, b.area) ||
    order(a.section.actual.h, b.section.actual.h) ||
    order(b.utilisation ?? 0, a.utilisation ?? 0) ||
    order(`${a.section.id} ${a.grade}`, `${b.section.id} ${b.grade}`);
}

function order<T extends number | string>(a: T, b: T): number {
  return a === b ? 0 : a < b ? -1 : 1;
}
