import { dimensionInWords, sameDimension, type Dimension } from '#shared/units/units.ts';
import type { Edition } from '../schema/index.ts';
import type { Findings } from './findings.ts';
import type { SymbolInfo } from './plan.ts';

interface Need {
  symbol: string;
  at: string;
  /** What the analysis takes from the clause. */
  what: string;
  dimension: Dimension;
}

const length: Dimension = { length: 1, force: 0, density: 0 };

function needsOf({ analysis }: Edition): Need[] {
  const { bendingStiffness, shearStiffness, selfWeight, span, shear } = analysis;
  const need = (symbol: string, at: string, what: string, dimension: Dimension): Need => ({
    symbol,
    at: `/analysis/${at}`,
    what,
    dimension,
  });
  return [
    need(bendingStiffness, 'bendingStiffness', 'bending stiffness', { length: 2, force: 1, density: 0 }),
    ...(shearStiffness === undefined
      ? []
      : [need(shearStiffness, 'shearStiffness', 'shear stiffness', { length: 0, force: 1, density: 0 })]),
    ...(selfWeight
      ? [need(selfWeight.line, 'selfWeight/line', 'self-weight', { length: -1, force: 1, density: 0 })]
      : []),
    ...(span.rule === 'clearPlus'
      ? [need(span.allowance, 'span/allowance', 'allowance on the clear span', length)]
      : []),
    ...(shear.at === 'distance'
      ? [need(shear.distance, 'shear/distance', 'distance for shear', length)]
      : []),
  ];
}

/** The clauses the analysis takes: there, of the right dimension, and known before there is any analysis. */
export function checkAnalysis(
  edition: Edition,
  symbols: ReadonlyMap<string, SymbolInfo>,
  findings: Findings,
): void {
  for (const { symbol, at, what, dimension } of needsOf(edition)) {
    const info = symbols.get(symbol);
    if (info?.origin !== 'clause') {
      const message = `The analysis takes its ${what} from “${symbol}”, and there is no such clause.`;
      findings.error('unknown-symbol', at, message);
    } else if (!info.dimension || !sameDimension(info.dimension, dimension)) {
      const is = info.dimension ? dimensionInWords(info.dimension) : 'a word';
      const message = `The ${what} has to be ${dimensionInWords(dimension)}, and “${info.title}” is ${is}.`;
      findings.error('wrong-dimension', at, message);
    } else if (info.level !== 'edition' && info.level !== 'member') {
      const message = `The analysis needs the ${what} before there are combinations and places, and “${info.title}” depends on one.`;
      findings.error('fact-not-here', at, message);
    }
  }
  const own = edition.analysis.selfWeight;
  if (own && !edition.actions.some(({ id }) => id === own.action)) {
    const message = `There is no action “${own.action}” for the self-weight.`;
    findings.error('unknown-action', '/analysis/selfWeight/action', message);
  }
}
