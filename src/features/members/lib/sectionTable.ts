import { sectionSearch, verdict } from '#shared/engine/index.ts';
import type { FoundSection, Member, Plan, StockSection, VerdictWord } from '#shared/engine/types.ts';

export interface SectionCell {
  word: VerdictWord;
  utilisation: number | null;
  check: string | null;
}

/** What a search over stock and grades found: a cell for each pair sold, and those that pass, best first. */
export interface SectionTable {
  cells: ReadonlyMap<string, SectionCell>;
  ranked: readonly FoundSection[];
}

export const cellKey = (section: string, grade: string) => `${section} ${grade}`;

/** Works through stock and grades, yielding the share done, so that a browser can draw in between. */
export function* sectionTable(
  plan: Plan,
  member: Member,
  stock: readonly StockSection[],
  grades: readonly string[],
  rank: 'depth' | 'volume' | 'cost',
): Generator<number, SectionTable> {
  const cells = new Map<string, SectionCell>();
  const total = stock.length * grades.length * 2;
  let done = 0;
  for (const section of stock) {
    const { actual, nominal, id } = section;
    for (const grade of grades) {
      done += 1;
      if (section.grades?.includes(grade) ?? true) {
        const trial: Member = {
          ...member,
          grade,
          section: { ...actual, pieces: member.section.pieces, nominal, stock: id },
        };
        const { word, utilisation, check } = verdict(plan, trial);
        cells.set(cellKey(id, grade), { word, utilisation, check });
      }
      yield done / total;
    }
  }
  const search = sectionSearch(plan, member, { stock, grades, rank });
  for (let step = search.next(); ; step = search.next()) {
    if (step.done) return { cells, ranked: step.value };
    yield 0.5 + step.value / 2;
  }
}
