import { describe, expect, it } from 'vitest';
import {
  canBePinned,
  editionMoves,
  editionStates,
  isOpen,
  releaseBlockers,
  type ReleaseCase,
} from './lifecycle.ts';

const ready: ReleaseCase = {
  state: 'in_check',
  errors: 0,
  proofs: { held: 3, failed: 0 },
  authors: ['keeper'],
  releasing: 'checker',
  solePractitioner: false,
};

describe('the life of an edition', () => {
  it('opens only drafts and lets only released editions be pinned', () => {
    expect(editionStates.filter(isOpen)).toEqual(['draft']);
    expect(editionStates.filter(canBePinned)).toEqual(['released']);
  });

  it('never leads back from a released edition to one that can change', () => {
    const reachable = new Set<string>(['released']);
    for (let grew = true; grew;) {
      const before = reachable.size;
      for (const move of Object.values(editionMoves)) {
        if (move.from.some((state) => reachable.has(state))) reachable.add(move.to);
      }
      grew = reachable.size > before;
    }
    expect([...reachable].some((state) => state === 'draft' || state === 'in_check')).toBe(false);
  });

  it('releases when nothing stands in the way', () => {
    expect(releaseBlockers(ready)).toEqual([]);
  });

  it('asks for a second person unless the firm works alone', () => {
    expect(releaseBlockers({ ...ready, releasing: 'keeper' })).toHaveLength(1);
    expect(releaseBlockers({ ...ready, releasing: 'keeper', solePractitioner: true })).toEqual([]);
  });

  it('counts errors and failing proofs, and names a state that is too early', () => {
    const blockers = releaseBlockers({ ...ready, state: 'draft', errors: 2, proofs: { held: 0, failed: 1 } });
    expect(blockers).toHaveLength(3);
    expect(blockers[1]).toBe('2 errors have to be put right.');
  });
});
