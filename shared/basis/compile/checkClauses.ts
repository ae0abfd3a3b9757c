import { coherentFactor, sameDimension, unitOf, type UnitSystem } from '#shared/units/units.ts';
import type { Clause, TableKey } from '../schema/index.ts';
import { checkCondition } from './conditions.ts';
import { dimensionProblem } from './dimensions.ts';
import type { Findings } from './findings.ts';
import type { ReadClause, ReadKey, ReadOutcome, SymbolInfo } from './plan.ts';

type Symbols = ReadonlyMap<string, SymbolInfo>;
type Where = { clause: string; case: string };

/** Names every symbol of a formula that the edition doesn't have. */
export function unknownSymbols(
  used: readonly string[],
  pointer: string,
  symbols: Symbols,
  findings: Findings,
  where: Partial<Where> = {},
): void {
  for (const symbol of used) {
    const info = symbols.get(symbol);
    if (!info) {
      findings.error('unknown-symbol', pointer, `There is no symbol “${symbol}” in this edition.`, where);
    } else if (info.dimension === undefined) {
      const message = `${symbol} is a word and can’t stand in a formula. Use it in a condition or as a key.`;
      findings.error('word-in-formula', pointer, message, where);
    }
  }
}

function checkKeyFormula(
  clause: Clause,
  { formula }: ReadKey & { kind: 'formula' },
  axis: TableKey,
  pointer: string,
  symbols: Symbols,
  findings: Findings,
  where: Where,
): void {
  const unit = unitOf(axis.unit);
  if (clause.empirical || !unit || !formula.symbols.every((s) => symbols.get(s)?.dimension)) return;
  const problem = dimensionProblem(formula.ast, unit.dimension, symbols);
  if (problem) findings.error('wrong-dimension', pointer, `“${axis.title}”: ${problem}`, where);
}

function checkKeyArgument(
  clause: Clause,
  key: ReadKey,
  index: number,
  gives: ReadOutcome & { kind: 'table' },
  pointer: string,
  symbols: Symbols,
  findings: Findings,
  where: Where,
): void {
  const axis = gives.table.table.keys[index];
  if (!axis) return;
  const wantsWord = axis.match === 'exact' && typeof axis.points[0] === 'string';
  const at = `${pointer}/keys/${index}`;
  if (key.kind === 'word') {
    if (!wantsWord)
      findings.error('key-type', at, `“${axis.title}” needs a number, not the word “${key.value}”.`, where);
    else if (!axis.points.includes(key.value)) {
      findings.error(
        'unknown-key',
        at,
        `“${gives.table.table.title}” has no “${key.value}” for ${axis.title}.`,
        where,
      );
    }
    return;
  }
  if (key.kind === 'formula') {
    unknownSymbols(key.formula.symbols, `${at}/formula`, symbols, findings, where);
    if (wantsWord) findings.error('key-type', at, `“${axis.title}” needs a word, not a formula.`, where);
    else checkKeyFormula(clause, key, axis, `${at}/formula`, symbols, findings, where);
    return;
  }
  const info = symbols.get(key.symbol);
  if (!info) {
    findings.error(
      'unknown-symbol',
      `${at}/fact`,
      `There is no fact “${key.symbol}” in this edition.`,
      where,
    );
    return;
  }
  if (!wantsWord && info.dimension && !sameUnit(axis.unit, info.unit)) {
    const message = `“${axis.title}” is in ${axis.unit}, and ${key.symbol} is known in ${info.unit}.`;
    findings.error('wrong-dimension', `${at}/fact`, message, where);
  }
  if (wantsWord !== (info.dimension === undefined)) {
    const message = `“${axis.title}” needs a ${wantsWord ? 'word' : 'number'}, and ${key.symbol} is a ${wantsWord ? 'number' : 'word'}.`;
    findings.error('key-type', `${at}/fact`, message, where);
  } else if (wantsWord && axis.outside === 'refuse') {
    const missing = (info.words ?? []).filter((word) => !axis.points.includes(word));
    if (missing.length) {
      const message = `“${gives.table.table.title}” has nothing for ${key.symbol} ${missing.join(', ')}; a member with it is refused.`;
      findings.warning('table-option-missing', at, message, where);
    }
  }
}

/** What a table holds has to be what the clause gives, in the same unit: look-ups are not converted. */
function checkTableFits(
  clause: Clause,
  gives: ReadOutcome & { kind: 'table' },
  pointer: string,
  symbols: Symbols,
  findings: Findings,
  where: Where,
): void {
  const { table } = gives.table;
  if (clause.kind === 'class') {
    const strange = table.values.find((value) => value !== null && !clause.words?.includes(String(value)));
    if (clause.words && strange !== undefined) {
      const message = `“${table.title}” gives “${String(strange)}”, which is not among the words of “${clause.title}”.`;
      findings.error('unknown-word', `${pointer}/table`, message, where);
    }
  } else if (!sameUnit(table.unit, symbols.get(clause.symbol)?.unit ?? clause.unit)) {
    const message = `“${table.title}” is in ${table.unit}, and “${clause.title}” in ${clause.unit}.`;
    findings.error('wrong-dimension', `${pointer}/table`, message, where);
  }
}

/** Whether a number means the same in both units. */
function sameUnit(a: string, b: string): boolean {
  const [one, other] = [unitOf(a), unitOf(b)];
  if (!one || !other) return a === b;
  const system: UnitSystem = other.system === 'both' ? 'metric' : other.system;
  return (
    sameDimension(one.dimension, other.dimension) &&
    Math.abs(coherentFactor(one, system) / coherentFactor(other, system) - 1) < 1e-12
  );
}

function checkOutcome(
  clause: Clause,
  gives: ReadOutcome,
  pointer: string,
  symbols: Symbols,
  findings: Findings,
  where: Where,
): void {
  const info = symbols.get(clause.symbol);
  const isClass = clause.kind === 'class';
  const givesWord =
    gives.kind === 'word' ||
    (gives.kind === 'table' && typeof gives.table.table.values.find((v) => v !== null) === 'string');
  if (gives.kind !== 'refuse' && isClass !== givesWord) {
    const message = isClass
      ? `“${clause.title}” has to give a word here.`
      : `“${clause.title}” has to give a number here.`;
    findings.error('wrong-outcome', pointer, message, where);
    return;
  }
  if (gives.kind === 'word' && clause.words && !clause.words.includes(gives.value)) {
    findings.error(
      'unknown-word',
      pointer,
      `“${gives.value}” is not among the words of “${clause.title}”.`,
      where,
    );
  }
  if (gives.kind === 'formula') {
    unknownSymbols(gives.formula.symbols, `${pointer}/formula`, symbols, findings, where);
    if (
      !clause.empirical &&
      info?.dimension &&
      gives.formula.symbols.every((s) => symbols.get(s)?.dimension)
    ) {
      const problem = dimensionProblem(gives.formula.ast, info.dimension, symbols);
      if (problem) findings.error('wrong-dimension', `${pointer}/formula`, problem, where);
    }
  }
  if (
    gives.kind === 'spanLimit' &&
    info?.dimension &&
    !sameDimension(info.dimension, { length: 1, force: 0, density: 0 })
  ) {
    findings.error('wrong-dimension', pointer, 'A span limit gives a length.', where);
  }
  if (gives.kind === 'table') {
    checkTableFits(clause, gives, pointer, symbols, findings, where);
    const { keys } = gives.table.table;
    if (keys.length !== gives.keys.length) {
      const message = `“${gives.table.table.title}” has ${keys.length} keys and is given ${gives.keys.length}.`;
      findings.error('key-count', `${pointer}/keys`, message, where);
    }
    gives.keys.forEach((key, i) =>
      checkKeyArgument(clause, key, i, gives, pointer, symbols, findings, where),
    );
  }
}

/**
 * Checks the cases of a clause: order, conditions, outcomes.
 *
 * @returns Whether its cases are sound enough to be compared with each other.
 */
export function checkClause(
  { clause, index, cases }: ReadClause,
  symbols: Symbols,
  findings: Findings,
): boolean {
  const before = findings.list.length;
  const pointer = `/clauses/${index}`;
  if (clause.kind === 'class' && !clause.words) {
    findings.warning('no-words', pointer, `“${clause.title}” should list the words it can give.`, {
      clause: clause.id,
    });
  }
  const open = clause.cases.findIndex(({ when }) => when === undefined);
  if (open >= 0 && open < clause.cases.length - 1) {
    const message = `“${clause.title}”: the case without a condition has to be the last; those after it are never reached.`;
    findings.error('otherwise-not-last', `${pointer}/cases/${open}`, message, { clause: clause.id });
  }
  const ids = new Set<string>();
  clause.cases.forEach((each, i) => {
    const where = { clause: clause.id, case: each.id };
    if (ids.has(each.id))
      findings.error(
        'duplicate-id',
        `${pointer}/cases/${i}/id`,
        `Two cases of “${clause.title}” are called “${each.id}”.`,
        where,
      );
    ids.add(each.id);
    if (each.when) checkCondition(each.when, `${pointer}/cases/${i}/when`, symbols, findings, where);
  });
  cases.forEach(({ gives }, i) => {
    const id = clause.cases[i]?.id ?? '';
    if (cases.length === clause.cases.length) {
      checkOutcome(clause, gives, `${pointer}/cases/${i}/gives`, symbols, findings, {
        clause: clause.id,
        case: id,
      });
    }
  });
  return !findings.list.slice(before).some(({ severity }) => severity === 'error');
}
