/** States of an edition and the ways between them. The only place that knows them. */
export const editionStates = ['draft', 'in_check', 'released', 'superseded', 'withdrawn'] as const;
export type EditionState = (typeof editionStates)[number];

export type EditionMove = 'submit' | 'return' | 'release' | 'supersede' | 'withdraw';

interface Rule {
  from: readonly EditionState[];
  to: EditionState;
  /** The person must not be one who wrote or submitted the edition, unless the firm works alone. */
  secondPerson: boolean;
  /** A reason has to be given. */
  reason: boolean;
}

export const editionMoves: Readonly<Record<EditionMove, Rule>> = {
  submit: { from: ['draft'], to: 'in_check', secondPerson: false, reason: true },
  return: { from: ['in_check'], to: 'draft', secondPerson: false, reason: true },
  release: { from: ['in_check'], to: 'released', secondPerson: true, reason: false },
  supersede: { from: ['released'], to: 'superseded', secondPerson: false, reason: false },
  withdraw: { from: ['released', 'superseded'], to: 'withdrawn', secondPerson: false, reason: true },
};

/** Whether an edition in this state can still change its document. */
export function isOpen(state: EditionState): boolean {
  return state === 'draft';
}

/** Whether projects can be given this edition anew. */
export function canBePinned(state: EditionState): boolean {
  return state === 'released';
}

/** What stands in the way of a release, as sentences; empty: nothing does. */
export interface ReleaseCase {
  state: EditionState;
  errors: number;
  proofs: { held: number; failed: number };
  /** People who wrote or submitted this edition. */
  authors: readonly string[];
  releasing: string;
  solePractitioner: boolean;
}

export function releaseBlockers(release: ReleaseCase): string[] {
  const { state, errors, proofs, authors, releasing, solePractitioner } = release;
  const blockers: string[] = [];
  if (!editionMoves.release.from.includes(state)) {
    blockers.push('Only an edition that was submitted for check can be released.');
  }
  if (errors > 0) {
    blockers.push(errors === 1 ? 'One error has to be put right.' : `${errors} errors have to be put right.`);
  }
  if (proofs.failed > 0) {
    blockers.push(proofs.failed === 1 ? 'One proof does not hold.' : `${proofs.failed} proofs do not hold.`);
  }
  if (!solePractitioner && authors.includes(releasing)) {
    blockers.push('A second person has to release it: you wrote or submitted this edition.');
  }
  return blockers;
}
