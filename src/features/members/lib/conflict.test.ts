import { describe, expect, it } from 'vitest';
import type { Member } from '#shared/basis/schema/index.ts';
import { differences, merge } from './conflict.ts';

const base: Member = {
  schema: 'member/1',
  mark: 'J1',
  units: 'metric',
  choices: { use: 'floor', exposure: 'dry' },
  grade: 'A',
  section: { b: 47, h: 195, pieces: 1 },
  spanMeasured: 'centres',
  spans: [{ length: 3600 }],
  supports: [{ restraint: 'pin' }, { restraint: 'pin' }],
  loads: [],
  inputs: {},
  departures: [],
};

describe('two people changed one member', () => {
  it('finds only what differs, and tells a clash from a one-sided change', () => {
    const mine = { ...base, section: { ...base.section, h: 220 }, grade: 'B' };
    const theirs = { ...base, section: { ...base.section, h: 245 } };
    expect(differences(base, mine, theirs)).toEqual([
      { pointer: '/grade', mine: 'B', theirs: 'A', clash: false },
      { pointer: '/section/h', mine: 220, theirs: 245, clash: true },
    ]);
  });

  it('takes one-sided changes from the side that made them and clashes as chosen', () => {
    const mine = { ...base, section: { ...base.section, h: 220 }, grade: 'B' };
    const theirs = { ...base, section: { ...base.section, h: 245 }, title: 'Landing joist' };
    const merged = merge(base, mine, theirs, { '/section/h': 'theirs' });
    expect(merged.section.h).toBe(245);
    expect(merged.grade).toBe('B');
    expect(merged.title).toBe('Landing joist');
  });

  it('keeps mine for a clash nobody decided, so that nothing typed is lost', () => {
    const mine = { ...base, spans: [{ length: 4000 }] };
    const theirs = { ...base, spans: [{ length: 3900 }] };
    expect(merge(base, mine, theirs, {}).spans).toEqual([{ length: 4000 }]);
  });

  it('drops a value that the side with the change removed', () => {
    const withNote = { ...base, note: 'check bearing' };
    expect(merge(withNote, base, withNote, {})).not.toHaveProperty('note');
  });
});
