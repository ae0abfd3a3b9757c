import { HyperFormula, type RawCellContent } from 'hyperformula';
import type { Member } from '#shared/basis/schema/index.ts';
import { type PlaceKind, PlaceVisitor } from '#shared/engine/assess/places.ts';
import { stand } from '#shared/engine/assess/stand.ts';
import { zeroMomentLength } from '#shared/engine/effects/peaks.ts';
import { preparedOf } from '#shared/engine/runtimes.ts';
import type { Plan } from '#shared/engine/index.ts';

/*
 * The same checks as a spreadsheet does them: a head with the section, its properties and factors, and one
 * row for each combination and place. The sheet is spared the analysis: the effects (with their spans,
 * bearings and lengths between zeros) are put in, as a person would paste them from an analysis program.
 */

const kinds: readonly PlaceKind[] = ['moment', 'shear', 'support', 'deflection'];
const durationFactor = [1, 1.25, 1.5];

/** What changes from member to member: the head, then one row for each place. */
interface Contents {
  head: number[];
  effects: number[][];
  formulas: string[];
}

function contentsOf(plan: Plan, member: Member): Contents {
  const outcome = stand(preparedOf(plan).runtime, member);
  if (!outcome.ok) throw new Error('The member of the bench can’t be analysed.');
  const { context, combinations } = outcome.standing;
  const { situation, geometry } = context;
  if (!situation || !geometry) throw new Error('The member of the bench was not analysed.');
  const visitor = new PlaceVisitor(situation);
  const effects: number[][] = [];
  const formulas: string[] = [];
  for (const combination of combinations) {
    for (const kind of kinds) {
      if ((kind === 'deflection') === (combination.state === 'strength')) continue;
      visitor.visit(kind, combination, (place) => {
        const r = effects.length + 3;
        const K_d = durationFactor[combination.duration] ?? 1;
        const span = geometry.spans[place.span]?.length ?? 0;
        const moment = visitor.momentSum(combination, place.arrangement);
        const L_0 = kind === 'moment' ? zeroMomentLength(situation.grid, moment, place.piece, place.x) : span;
        const value = kind === 'shear' ? place.reduced : place.value;
        effects.push([value, place.variable, K_d, L_0, span]);
        formulas.push(formulaOf(kind, combination.state, r, place.node, geometry.nodes.length - 1));
      });
    }
  }
  const { b, h, pieces } = member.section;
  return { head: [b * pieces, h, member.carries?.width ?? 0, 100], effects, formulas };
}

function formulaOf(kind: PlaceKind, state: string, r: number, node: number, last: number): string {
  switch (kind) {
    case 'moment':
      return `=ABS(A${r})/$A$2/(5.3*C${r}*$D$2*$E$2*$F$2*MIN(1,(3000/MAX(1,D${r}))^0.05)*(1-ABS(B${r}/A${r})/1000))`;
    case 'shear':
      return `=1.5*ABS(A${r})/$B$2/(0.67*C${r}*$E$2)`;
    case 'support':
      return `=MAX(0,A${r})/($A$1*$D$1)/(2.2*C${r}*$E$2*${node === 0 || node === last ? '1' : '$G$2'})`;
    default:
      return state === 'final' ? `=ABS(A${r})/MIN(0.004*E${r},18)` : `=ABS(A${r})/(E${r}/250)`;
  }
}

export class Sheet {
  readonly #sheet: HyperFormula;
  readonly #contents: readonly Contents[];
  #turn = 0;

  /** A sheet for several members of one layout. */
  constructor(plan: Plan, members: readonly Member[]) {
    this.#contents = members.map((member) => contentsOf(plan, member));
    const [first] = this.#contents;
    if (!first) throw new Error('The bench needs a member.');
    const derived: RawCellContent[] = [
      '=A1*B1*B1/6',
      '=A1*B1',
      null,
      '=IF(B1<=72,1.17,IF(B1<300,(300/B1)^0.11,0.81*(B1^2+92300)/(B1^2+56800)))',
      '=IF(C1<=610,1.1,1)',
      '=IF(B1/A1<=5,1,MIN(1,6*A1/B1,12*B1/600))',
      '=IF(D1<=10,1.7,IF(D1<=50,1.7-0.4*(D1-10)/40,IF(D1<=100,1.3-0.2*(D1-50)/50,IF(D1<=150,1.1-0.1*(D1-100)/50,1))))',
    ];
    const rows = first.effects.map((effects, i): RawCellContent[] => [...effects, first.formulas[i] ?? null]);
    const end = rows.length + 2;
    this.#sheet = HyperFormula.buildFromArray([first.head, derived, ...rows, [`=MAX(F3:F${end},B1/A1/7)`]], {
      licenseKey: 'gpl-v3',
    });
  }

  /** Puts the next member in, in one batch, and reads the governing utilisation. */
  next(): number {
    this.#turn += 1;
    const { head, effects } = this.#contents[this.#turn % this.#contents.length] as Contents;
    this.#sheet.batch(() => {
      this.#sheet.setCellContents({ sheet: 0, row: 0, col: 0 }, [head]);
      this.#sheet.setCellContents({ sheet: 0, row: 2, col: 0 }, effects);
    });
    return Number(this.#sheet.getCellValue({ sheet: 0, row: effects.length + 2, col: 0 }));
  }

  /** The governing utilisation of the member of that position. */
  of(index: number): number {
    this.#turn = index - 1 + this.#contents.length;
    return this.next();
  }
}
