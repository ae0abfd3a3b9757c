import { coherentFactor, coherentUnit, pure, unitOf, type Dimension } from '#shared/units/units.ts';
import { builtInFacts, type FactDimension, type FactRange, type PlaceKind } from '../facts.ts';
import { functions } from '../formula/ast.ts';
import type { Edition, Input } from '../schema/index.ts';
import type { Findings } from './findings.ts';
import type { SymbolInfo } from './plan.ts';

const dimensions: Record<Exclude<FactDimension, 'word'>, Dimension> = {
  number: pure,
  angle: pure,
  length: { length: 1, force: 0, density: 0 },
  force: { length: 0, force: 1, density: 0 },
  moment: { length: 1, force: 1, density: 0 },
  lineLoad: { length: -1, force: 1, density: 0 },
  stress: { length: -2, force: 1, density: 0 },
};

/** Words of the built-in facts that depend on the edition. */
function wordsOf(symbol: string, edition: Edition): readonly string[] | undefined {
  const ids = (list: readonly { id: string }[]) => list.map(({ id }) => id);
  switch (symbol) {
    case 'grade':
      return ids(edition.grades.rows);
    case 'duration':
    case 'action_duration':
      return ids(edition.durations);
    case 'combination':
      return ids(edition.combinations);
    case 'state':
      return [...new Set(edition.combinations.map(({ state }) => state))];
    case 'action':
      return ids(edition.actions);
    default:
      return undefined;
  }
}

function builtIns(edition: Edition): SymbolInfo[] {
  return builtInFacts.map((fact, index) => {
    const words = fact.words ?? wordsOf(fact.symbol, edition);
    const dimension = fact.dimension === 'word' ? undefined : dimensions[fact.dimension];
    return {
      symbol: fact.symbol,
      title: fact.title,
      origin: 'builtIn',
      index,
      unit: dimension ? (coherentUnit(dimension, edition.unitSystem) ?? '1') : 'word',
      ...(dimension ? { dimension } : {}),
      ...(words ? { words } : {}),
      ...(fact.range ? { range: fact.range } : {}),
      level: fact.level,
      ...(fact.at ? { at: fact.at } : {}),
      pointer: '',
    };
  });
}

/** A number declared with a unit; it is known in the coherent unit of that dimension. */
function measured(
  findings: Findings,
  edition: Edition,
  info: Omit<SymbolInfo, 'unit' | 'dimension'>,
  unit: string,
  mustBeCoherent: boolean,
): SymbolInfo {
  const known = unitOf(unit);
  if (!known) {
    findings.error(
      'unknown-unit',
      `${info.pointer}/unit`,
      `“${unit}” of ${info.symbol} is not a known unit.`,
    );
    return { ...info, unit, dimension: pure };
  }
  const coherent = coherentUnit(known.dimension, edition.unitSystem) ?? unit;
  const fits = known.factor === 1 && (known.system === 'both' || known.system === edition.unitSystem);
  if (mustBeCoherent && !fits) {
    const message = `${info.symbol} has to be in ${coherent}, the unit that formulas here work in, not in ${unit}.`;
    findings.error('unit-not-coherent', `${info.pointer}/unit`, message);
  }
  return { ...info, unit: mustBeCoherent && fits ? unit : coherent, dimension: known.dimension };
}

/** Bounds of an input in the edition's coherent unit; a member beyond them is refused. */
function rangeOf({ minimum, maximum, unit }: Input, edition: Edition): FactRange {
  const known = unitOf(unit);
  const factor = known ? coherentFactor(known, edition.unitSystem) : 1;
  return {
    ...(minimum === undefined ? {} : { from: minimum * factor }),
    ...(maximum === undefined ? {} : { to: maximum * factor }),
  };
}

/** Names that a formula reads as something else. */
const reserved = new Set([
  ...Object.keys(functions),
  ...'and or not xor mod to in true false null undefined NaN Infinity'.split(' '),
]);

const everywhere: readonly PlaceKind[] = ['moment', 'shear', 'support', 'deflection'];

/** The table of all symbols; two declarations of one symbol are an error. Clause levels are filled in later. */
export function collectSymbols(edition: Edition, findings: Findings): Map<string, SymbolInfo> {
  const table = new Map<string, SymbolInfo>();
  const add = (info: SymbolInfo) => {
    const other = table.get(info.symbol);
    if (reserved.has(info.symbol)) {
      const message = `“${info.title}” can’t have the symbol ${info.symbol}: formulas read that as something else.`;
      findings.error('reserved-symbol', `${info.pointer}/symbol`, message);
    }
    if (other) {
      const whose = other.origin === 'builtIn' ? 'a fact that every member has' : `“${other.title}”`;
      const message = `The symbol ${info.symbol} of “${info.title}” already stands for ${whose}. Choose another.`;
      findings.error('duplicate-symbol', `${info.pointer}/symbol`, message);
    } else table.set(info.symbol, info);
  };
  builtIns(edition).forEach(add);
  edition.choices.forEach(({ symbol, title, options }, index) => {
    const words = options.map(({ id }) => id);
    add({
      symbol,
      title,
      origin: 'choice',
      index,
      unit: 'word',
      words,
      level: 'member',
      pointer: `/choices/${index}`,
    });
  });
  edition.inputs.forEach((input, index) => {
    const { symbol, title, scope, unit } = input;
    const pointer = `/inputs/${index}`;
    const place = scope === 'span' ? everywhere : (['shear', 'support'] as const);
    const level = scope === 'member' ? 'member' : 'place';
    const at = scope === 'member' ? {} : { at: place };
    add(
      measured(
        findings,
        edition,
        { symbol, title, origin: 'input', index, level, ...at, range: rangeOf(input, edition), pointer },
        unit,
        false,
      ),
    );
  });
  edition.grades.columns.forEach(({ symbol, title, unit }, index) => {
    const pointer = `/grades/columns/${index}`;
    add(
      measured(
        findings,
        edition,
        { symbol, title, origin: 'gradeColumn', index, level: 'member', range: { from: 0 }, pointer },
        unit,
        false,
      ),
    );
  });
  edition.actionValues.forEach(({ symbol, title }, index) => {
    const pointer = `/actionValues/${index}`;
    add({ symbol, title, origin: 'actionValue', index, unit: '1', dimension: pure, level: 'term', pointer });
  });
  edition.clauses.forEach(({ symbol, title, kind, unit, words }, index) => {
    const info = {
      symbol,
      title,
      origin: 'clause',
      index,
      level: 'edition',
      pointer: `/clauses/${index}`,
    } as const;
    if (kind === 'class') add({ ...info, unit: 'word', ...(words ? { words } : {}) });
    else add(measured(findings, edition, info, unit, true));
  });
  return table;
}
