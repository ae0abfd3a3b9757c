import { cosineOfDegrees } from '#shared/numbers/arithmetic.ts';
import type { BeamLoad, Restraint } from '#shared/analysis/types.ts';
import type { Choice, Edition, Grade, LoadInput, Member } from '#shared/basis/schema/index.ts';
import type { Finding } from '../types.ts';
import { unitFactors, type UnitFactors } from './units.ts';

/** A load in coherent units, still where it was measured and in the direction it was given. */
export interface GivenLoad {
  /** Position in the member document. */
  index: number;
  action: number;
  load: BeamLoad;
  direction: 'plan' | 'slope' | 'normal';
  /** Load on an area, before the width it reaches the member over. */
  area?: number;
}

/** A member document read against an edition, in the edition's coherent units. */
export interface Given {
  member: Member;
  units: UnitFactors;
  section: { b: number; b1: number; h: number; bNominal: number; hNominal: number; pieces: number };
  grade: Grade;
  gradeIndex: number;
  /** Spans as measured. */
  lengths: readonly number[];
  restraints: readonly Restraint[];
  bearings: readonly (number | null)[];
  slope: number;
  cosine: number;
  spacing: number | null;
  tributary: number | null;
  loads: readonly GivenLoad[];
  /** Options by choice symbol, defaults taken; null where nobody chose. */
  choices: Readonly<Record<string, string | null>>;
  /** Values of departures by clause id. */
  departures: ReadonlyMap<string, Member['departures'][number]>;
}

export type Reading = { ok: true; given: Given } | { ok: false; findings: Finding[] };

/** No size, load or self-weight of a building comes near this, in any of the units. */
export const LARGEST = 1e12;

/** Reads a member; everything that can be wrong with it by itself is found here, each at its place. */
export function readMember(edition: Edition, member: Member): Reading {
  const findings: Finding[] = [];
  const find = (code: string, pointer: string, message: string) => {
    findings.push({ severity: 'error', code, message, pointer, in: 'member' });
  };
  const units = unitFactors(member.units, edition.unitSystem);
  const length = (value: number | undefined, pointer: string, what: string): number => {
    if (isSize(value)) return value * units.length;
    find('bad-length', pointer, `${what} has to be a length above zero.`);
    return 1;
  };

  const { section } = member;
  const b1 = length(section.b, '/section/b', 'The breadth');
  const h = length(section.h, '/section/h', 'The depth');
  if (!(Number.isInteger(section.pieces) && section.pieces >= 1 && section.pieces <= 20)) {
    find('bad-pieces', '/section/pieces', 'The pieces acting together are a whole number from 1 to 20.');
  }
  const bNominal = section.nominal
    ? length(section.nominal.b, '/section/nominal/b', 'The ordered breadth')
    : b1;
  const hNominal = section.nominal ? length(section.nominal.h, '/section/nominal/h', 'The ordered depth') : h;

  if (member.spans.length < 1 || member.spans.length > 50) {
    find('bad-spans', '/spans', 'A member has from 1 to 50 spans.');
  }
  const lengths = member.spans
    .slice(0, 50)
    .map((span, i) => length(span.length, `/spans/${i}/length`, `Span ${i + 1}`));
  readSupports(member, find);
  const bearings = member.supports.map((support, i) =>
    support.bearing === undefined
      ? null
      : length(support.bearing, `/supports/${i}/bearing`, `The bearing of support ${i + 1}`),
  );

  const slope = member.slope ?? 0;
  if (!(slope >= 0 && slope <= 75)) find('bad-slope', '/slope', 'The slope is from 0 to 75 degrees.');
  const width = member.carries ? length(member.carries.width, '/carries/width', 'The width') : null;

  const gradeIndex = edition.grades.rows.findIndex(({ id }) => id === member.grade);
  const grade = edition.grades.rows[gradeIndex];
  if (!grade) {
    find('unknown-grade', '/grade', `This edition has no grade “${member.grade}”. Pick one of its grades.`);
  }
  const choices = readChoices(edition, member, grade, find);
  readNumbers(edition, member, units, find);
  const departures = readDepartures(edition, member, find);
  const loads = member.loads.map((load, i) => readLoad(edition, load, i, units, width, find));

  if (findings.length || !grade) return { ok: false, findings };
  return {
    ok: true,
    given: {
      member,
      units,
      section: { b: b1 * section.pieces, b1, h, bNominal, hNominal, pieces: section.pieces },
      grade,
      gradeIndex,
      lengths,
      restraints: member.supports.map(({ restraint }) => restraint),
      bearings,
      slope,
      cosine: slope === 0 ? 1 : cosineOfDegrees(slope),
      spacing: member.carries?.by === 'spacing' ? width : null,
      tributary: member.carries?.by === 'tributary' ? width : null,
      loads: loads.filter((load) => load !== null),
      choices,
      departures,
    },
  };
}

type Find = (code: string, pointer: string, message: string) => void;

const isSize = (value: number | undefined): value is number =>
  value !== undefined && value >= 1 / LARGEST && value <= LARGEST;
const isAmount = (value: number | undefined): value is number =>
  value !== undefined && Math.abs(value) <= LARGEST;

function readSupports(member: Member, find: Find): void {
  const { supports, spans } = member;
  if (supports.length !== spans.length + 1) {
    find(
      'supports-count',
      '/supports',
      `${spans.length} ${spans.length === 1 ? 'span needs' : 'spans need'} ${spans.length + 1} supports or free ends; ${supports.length} are given.`,
    );
  }
  supports.forEach(({ restraint }, i) => {
    if (restraint === 'free' && i > 0 && i < supports.length - 1) {
      find(
        'free-inside',
        `/supports/${i}/restraint`,
        `Support ${i + 1} is between two spans and can't be a free end. Give it a support, or join the spans.`,
      );
    }
  });
}

function readChoices(
  edition: Edition,
  member: Member,
  grade: Grade | undefined,
  find: Find,
): Record<string, string | null> {
  const chosen: Record<string, string | null> = {};
  for (const choice of edition.choices) {
    const given =
      choice.scope === 'grade' ? grade?.choices[choice.symbol] : own(member.choices, choice.symbol);
    const option = given ?? choice.default ?? null;
    chosen[choice.symbol] = option;
    if (option !== null && !hasOption(choice, option)) {
      find(
        'unknown-option',
        `/choices/${choice.symbol}`,
        `“${option}” is not an option of ${choice.title.toLowerCase()}. Pick one of: ${choice.options.map(({ title }) => title).join(', ')}.`,
      );
    }
  }
  // In a fixed order: a document means the same however its names are ordered.
  for (const symbol of Object.keys(member.choices).sort()) {
    const choice = edition.choices.find((each) => each.symbol === symbol && each.scope !== 'grade');
    if (!choice) find('unknown-choice', `/choices/${symbol}`, `This edition has no choice “${symbol}”.`);
  }
  return chosen;
}

const hasOption = (choice: Choice, option: string) => choice.options.some(({ id }) => id === option);

/** A value of a record's own, never of its prototype. */
function own<T>(record: Readonly<Record<string, T>>, key: string): T | undefined {
  return Object.hasOwn(record, key) ? record[key] : undefined;
}

/** Inputs of the member, its spans and its supports: known, numbers, and within their bounds. */
function readNumbers(edition: Edition, member: Member, units: UnitFactors, find: Find): void {
  const look = (
    values: Readonly<Record<string, number>> | undefined,
    scope: 'member' | 'span' | 'support',
    pointer: string,
  ) => {
    for (const [symbol, value] of Object.entries(values ?? {}).sort(([a], [b]) => (a < b ? -1 : 1))) {
      const input = edition.inputs.find((each) => each.symbol === symbol && each.scope === scope);
      if (!input) {
        find('unknown-input', `${pointer}/${symbol}`, `This edition has no input “${symbol}” here.`);
      } else if (!isAmount(value)) {
        find('bad-input', `${pointer}/${symbol}`, `${input.title} has to be a number.`);
      }
    }
  };
  look(member.inputs, 'member', '/inputs');
  member.spans.forEach(({ inputs }, i) => {
    look(inputs, 'span', `/spans/${i}/inputs`);
  });
  member.supports.forEach(({ inputs }, i) => {
    look(inputs, 'support', `/supports/${i}/inputs`);
  });
  if (!(units.length > 0)) find('bad-units', '/units', 'The units are metric or inch-pound.');
}

function readDepartures(
  edition: Edition,
  member: Member,
  find: Find,
): Map<string, Member['departures'][number]> {
  const departures = new Map<string, Member['departures'][number]>();
  member.departures.forEach((departure, i) => {
    const clause = edition.clauses.find(({ id }) => id === departure.clause);
    if (!clause) {
      find('unknown-clause', `/departures/${i}/clause`, `This edition has no clause “${departure.clause}”.`);
    } else if (clause.kind === 'class') {
      find(
        'departure-from-class',
        `/departures/${i}/clause`,
        `${clause.title} gives a word, and a departure sets a number. Depart from the clause that uses it.`,
      );
    } else if (!isAmount(departure.value)) {
      find('bad-departure', `/departures/${i}/value`, 'A departure has to be a number.');
    } else if (departures.has(departure.clause)) {
      find('departure-twice', `/departures/${i}/clause`, `${clause.title} is departed from twice.`);
    } else departures.set(departure.clause, departure);
  });
  return departures;
}

function readLoad(
  edition: Edition,
  load: LoadInput,
  index: number,
  units: UnitFactors,
  width: number | null,
  find: Find,
): GivenLoad | null {
  const pointer = `/loads/${index}`;
  const action = edition.actions.findIndex(({ id }) => id === load.action);
  if (action < 0) {
    find('unknown-action', `${pointer}/action`, `This edition has no action “${load.action}”.`);
    return null;
  }
  const amount = (value: number | undefined, field: string, factor: number): number => {
    if (isAmount(value)) return value * factor;
    find('bad-load', `${pointer}/${field}`, 'A load has to be a number of a sensible size.');
    return 0;
  };
  // Per length on the slope where nothing is said: for the same number that is never the smaller load.
  const common = { index, action, direction: load.direction ?? ('slope' as const) };
  if (load.kind === 'point') {
    const x = amount(load.x, 'x', units.length);
    const force = amount(load.force, 'force', units.force);
    return { ...common, load: { kind: 'point', x, force } };
  }
  if (load.kind === 'couple') {
    const x = amount(load.x, 'x', units.length);
    const moment = amount(load.moment, 'moment', units.couple);
    return { ...common, load: { kind: 'couple', x, moment } };
  }
  const from = load.from === undefined ? 0 : amount(load.from, 'from', units.length);
  const to = load.to === undefined ? Infinity : amount(load.to, 'to', units.length);
  if (!(to > from)) {
    find('load-backwards', `${pointer}/to`, 'A load has to end after it starts.');
    return null;
  }
  if (load.kind === 'line') {
    const startIntensity = amount(load.start, 'start', units.line);
    const endIntensity = load.end === undefined ? startIntensity : amount(load.end, 'end', units.line);
    return { ...common, load: { kind: 'line', from, to, startIntensity, endIntensity } };
  }
  const intensity = amount(load.intensity, 'intensity', units.area);
  if (width === null) {
    find(
      'width-missing',
      '/carries',
      'A load on an area needs the spacing of the members, or the tributary width of this one.',
    );
    return null;
  }
  const line = intensity * width;
  return {
    ...common,
    area: intensity,
    load: { kind: 'line', from, to, startIntensity: line, endIntensity: line },
  };
}
