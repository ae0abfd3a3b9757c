import { unitOf } from '#shared/units/units.ts';
import type { Edition } from '../schema/index.ts';
import type { Findings } from './findings.ts';

type Listed = readonly { id: string }[];

/** Ids that stand twice in one list. */
function duplicates(list: Listed, pointer: string, what: string, findings: Findings): void {
  const seen = new Set<string>();
  list.forEach(({ id }, index) => {
    if (seen.has(id))
      findings.error('duplicate-id', `${pointer}/${index}/id`, `Two ${what} are called “${id}”.`);
    seen.add(id);
  });
}

/** Each place of the document that carries a provenance, with its pointer. */
export function eachProvenance(
  edition: Edition,
  visit: (provenance: Edition['tables'][number]['provenance'], pointer: string) => void,
): void {
  edition.grades.rows.forEach((row, i) => {
    visit(row.provenance, `/grades/rows/${i}/provenance`);
    for (const [symbol, cell] of Object.entries(row.cells ?? {}))
      visit(cell, `/grades/rows/${i}/cells/${symbol}`);
  });
  edition.actions.forEach(({ provenance }, i) => visit(provenance, `/actions/${i}/provenance`));
  edition.combinations.forEach(({ provenance }, i) => visit(provenance, `/combinations/${i}/provenance`));
  edition.tables.forEach((table, i) => {
    visit(table.provenance, `/tables/${i}/provenance`);
    for (const [cell, own] of Object.entries(table.cells ?? {})) visit(own, `/tables/${i}/cells/${cell}`);
  });
  edition.clauses.forEach((clause, i) =>
    clause.cases.forEach(({ provenance }, j) => visit(provenance, `/clauses/${i}/cases/${j}/provenance`)),
  );
  edition.proofs.forEach(({ provenance }, i) => visit(provenance, `/proofs/${i}/provenance`));
}

/** Names that point at nothing: sources, durations, actions, options, states, clauses of the analysis. */
export function checkReferences(edition: Edition, findings: Findings): void {
  const {
    sources,
    durations,
    actions,
    combinations,
    choices,
    inputs,
    clauses,
    checks,
    tables,
    proofs,
    grades,
  } = edition;
  duplicates(sources, '/sources', 'sources', findings);
  duplicates(durations, '/durations', 'durations', findings);
  duplicates(actions, '/actions', 'actions', findings);
  duplicates(combinations, '/combinations', 'combinations', findings);
  duplicates(tables, '/tables', 'tables', findings);
  duplicates(clauses, '/clauses', 'clauses', findings);
  duplicates(checks, '/checks', 'checks', findings);
  duplicates(proofs, '/proofs', 'proofs', findings);
  duplicates(grades.rows, '/grades/rows', 'grades', findings);
  choices.forEach(({ options }, i) => duplicates(options, `/choices/${i}/options`, 'options', findings));

  const has = (list: Listed, id: string) => list.some((each) => each.id === id);
  eachProvenance(edition, ({ source }, pointer) => {
    if (!has(sources, source))
      findings.error('unknown-source', `${pointer}/source`, `There is no source “${source}”.`);
  });
  choices.forEach(({ title, options, default: standard }, i) => {
    if (standard !== undefined && !has(options, standard)) {
      findings.error('unknown-option', `/choices/${i}/default`, `“${title}” has no option “${standard}”.`);
    }
  });
  inputs.forEach(({ title, minimum = -Infinity, maximum = Infinity, default: standard }, i) => {
    if (minimum > maximum)
      findings.error('bad-bounds', `/inputs/${i}`, `“${title}”: the least value is above the greatest.`);
    if (standard !== undefined && (standard < minimum || standard > maximum)) {
      findings.error(
        'bad-bounds',
        `/inputs/${i}/default`,
        `“${title}”: the default lies outside its bounds.`,
      );
    }
  });
  const values = new Set(edition.actionValues.map(({ symbol }) => symbol));
  actions.forEach(({ title, duration, excludes, values: given }, i) => {
    const pointer = `/actions/${i}`;
    if (!has(durations, duration))
      findings.error(
        'unknown-duration',
        `${pointer}/duration`,
        `“${title}”: there is no duration “${duration}”.`,
      );
    (excludes ?? []).forEach((id, j) => {
      if (!has(actions, id))
        findings.error('unknown-action', `${pointer}/excludes/${j}`, `There is no action “${id}”.`);
    });
    for (const symbol of Object.keys(given)) {
      if (!values.has(symbol))
        findings.error(
          'unknown-symbol',
          `${pointer}/values/${symbol}`,
          `“${symbol}” is not a value that actions have here.`,
        );
    }
    for (const symbol of values) {
      if (given[symbol] === undefined) {
        findings.warning('missing-action-value', `${pointer}/values`, `“${title}” has no ${symbol}.`);
      }
    }
  });
  combinations.forEach(({ title, terms, needs, duration }, i) => {
    const pointer = `/combinations/${i}`;
    if (duration !== undefined && !has(durations, duration)) {
      findings.error(
        'unknown-duration',
        `${pointer}/duration`,
        `“${title}”: there is no duration “${duration}”.`,
      );
    }
    (needs ?? []).forEach((id, j) => {
      if (!has(actions, id))
        findings.error('unknown-action', `${pointer}/needs/${j}`, `There is no action “${id}”.`);
    });
    const roles = terms.map(({ of }) => of);
    if (roles.includes('accompanying') && !roles.includes('leading')) {
      const message = `“${title}” has accompanying actions and none that leads. Add a leading term, or write “variable”.`;
      findings.warning('no-leading-term', `${pointer}/terms`, message);
    }
    terms.forEach(({ of }, j) => {
      if (typeof of === 'string') return;
      for (const id of of) {
        if (!has(actions, id))
          findings.error('unknown-action', `${pointer}/terms/${j}/of`, `There is no action “${id}”.`);
      }
    });
  });
  const states = new Set(combinations.map(({ state }) => state));
  checks.forEach(({ title, at, state }, i) => {
    const pointer = `/checks/${i}`;
    if (at === 'member') return;
    if (state === undefined)
      findings.error('missing-state', pointer, `“${title}” has to say for which state it is.`);
    else if (!states.has(state)) {
      findings.error(
        'unknown-state',
        `${pointer}/state`,
        `“${title}”: no combination has the state “${state}”.`,
      );
    }
  });
  combinations.forEach(({ title, state }, i) => {
    if (!checks.some((check) => check.state === state))
      findings.warning('unused', `/combinations/${i}`, `No check is for the state “${state}” of “${title}”.`);
  });
  checkProofs(edition, findings);
}

function checkProofs({ proofs, checks, clauses, grades }: Edition, findings: Findings): void {
  proofs.forEach(({ title, member, expect }, i) => {
    if (!grades.rows.some(({ id }) => id === member.grade)) {
      findings.error(
        'unknown-grade',
        `/proofs/${i}/member/grade`,
        `The proof “${title}” uses the grade “${member.grade}”, which is not there.`,
      );
    }
    expect.forEach(({ check, of, unit }, j) => {
      const pointer = `/proofs/${i}/expect/${j}`;
      if (!unitOf(unit))
        findings.error(
          'unknown-unit',
          `${pointer}/unit`,
          `“${unit}” of the proof “${title}” is not a known unit.`,
        );
      if (!checks.some(({ id }) => id === check)) {
        findings.error(
          'unknown-check',
          `${pointer}/check`,
          `The proof “${title}” expects a check “${check}”, which is not there.`,
        );
      }
      if (typeof of === 'object' && !clauses.some(({ symbol }) => symbol === of.symbol)) {
        const column = grades.columns.some(({ symbol }) => symbol === of.symbol);
        if (!column)
          findings.note(
            'unknown-symbol',
            `${pointer}/of/symbol`,
            `“${of.symbol}” is not a clause; it is looked for among the facts.`,
          );
      }
    });
  });
}
