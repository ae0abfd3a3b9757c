import type { Role } from './roles.ts';
import { rules, type AccessRecord, type Action, type Rule } from './rules.ts';

/** A signed-in person, as far as access is concerned. */
export interface Holder {
  roles: readonly Role[];
}

/**
 * Whether this person (null: signed out) may do this, on this record where the rule looks at one.
 * A rule that looks at a record refuses when none is given.
 */
export function can(person: Holder | null, action: Action, record?: AccessRecord): boolean {
  const rule: Rule = rules[action];
  return holds(person, rule) && (!rule.when || (record !== undefined && rule.when(record)));
}

/** Whether a person with these roles could ever do this, on some record in some state. */
export function couldEver(person: Holder | null, action: Action): boolean {
  return holds(person, rules[action]);
}

function holds(person: Holder | null, { who }: Rule): boolean {
  if (who === 'anyone') return true;
  if (!person) return false;
  return who === 'person' ? person.roles.length > 0 : who.some((role) => person.roles.includes(role));
}

/** Those of these actions the person may do on this record: sent with the record. */
export function abilities<A extends Action>(
  person: Holder,
  asked: readonly A[],
  record: AccessRecord = {},
): A[] {
  return asked.filter((action) => can(person, action, record));
}

/** The action whose refusal means that a thing is not seen at all: `projects.pin` → `projects.read`. */
export function readActionOf(action: Action): Action {
  const read = `${action.slice(0, action.indexOf('.'))}.read`;
  return isAction(read) ? read : action;
}

export function isAction(word: unknown): word is Action {
  return typeof word === 'string' && Object.hasOwn(rules, word);
}
