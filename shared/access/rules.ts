import type { EditionState } from '#shared/basis/lifecycle.ts';
import { roles, type Role } from './roles.ts';

/** What a rule may look at on the record concerned. Everything a feature loads fits into this. */
export interface AccessRecord {
  /** State of a project or of the project around a member. */
  projectState?: ProjectState;
  memberState?: MemberState;
  editionState?: EditionState;
}

export const projectStates = ['live', 'closed'] as const;
export type ProjectState = (typeof projectStates)[number];

export const memberStates = ['live', 'removed'] as const;
export type MemberState = (typeof memberStates)[number];

/** Who may do something, and in which state of the record. */
export interface Rule {
  /** `anyone`: also signed out. `person`: whoever is signed in to the firm. Else: holders of a role. */
  who: 'anyone' | 'person' | readonly Role[];
  /** The state that allows it; the person's role alone is not enough. */
  when?: (record: AccessRecord) => boolean;
}

const live = (record: AccessRecord) => record.projectState === 'live';
const liveMember = (record: AccessRecord) => live(record) && record.memberState === 'live';
const inState =
  (...states: readonly EditionState[]) =>
  ({ editionState }: AccessRecord) =>
    editionState !== undefined && states.includes(editionState);
const notReader: readonly Role[] = roles.filter((role) => role !== 'reader');

/**
 * The whole of who may do what. Every endpoint names one of these actions; the same table gives the
 * abilities that travel with each record.
 */
export const rules = {
  'health.read': { who: 'anyone' },
  'openapi.read': { who: 'anyone' },
  'session.read': { who: 'anyone' },
  'session.create': { who: 'anyone' },
  'session.delete': { who: 'anyone' },

  'desk.read': { who: 'person' },
  'firm.read': { who: 'person' },
  'trail.read': { who: notReader },

  'projects.read': { who: 'person' },
  'projects.create': { who: ['principal', 'engineer'] },
  'projects.update': { who: ['principal', 'engineer'] },
  'projects.pin': { who: ['principal', 'engineer'], when: live },

  'members.read': { who: 'person' },
  'members.create': { who: ['engineer'], when: live },
  'members.save': { who: ['engineer'], when: liveMember },
  'members.remove': { who: ['engineer'], when: liveMember },
  'members.verify': { who: 'person' },

  'bases.read': { who: 'person' },
  'bases.create': { who: ['keeper'] },
  'editions.read': { who: 'person' },
  'editions.draft': { who: ['keeper'] },
  'editions.edit': { who: ['keeper'], when: inState('draft') },
  'editions.submit': { who: ['keeper'], when: inState('draft') },
  'editions.return': { who: ['principal', 'keeper', 'checker'], when: inState('in_check') },
  'editions.release': { who: ['principal', 'keeper', 'checker'], when: inState('in_check') },
  'editions.withdraw': { who: ['principal', 'keeper'], when: inState('released', 'superseded') },

  'stock.read': { who: 'person' },
} as const satisfies Readonly<Record<string, Rule>>;

export type Action = keyof typeof rules;

export const actions: readonly Action[] = Object.keys(rules).filter((key): key is Action => key in rules);
