import { Ajv2020 } from 'ajv/dist/2020.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { testMember } from '#tests/factories/edition.ts';
import { members } from '#tests/factories/members.ts';
import { testPlan } from '#tests/factories/plan.ts';
import { check } from './index.ts';
import { ResultSchema } from './schema.ts';

const plan = testPlan();
const validate = new Ajv2020({ strict: false }).compile(ResultSchema);

describe('the result schema', () => {
  it('holds for every result, with nothing in it that it does not know', () => {
    fc.assert(
      fc.property(members(plan.edition), (member) => {
        validate(check(plan, member));
        expect(validate.errors ?? []).toEqual([]);
      }),
      { numRuns: 100 },
    );
  });

  it('holds for results with departures, refusals and findings', () => {
    const departed = testMember({
      departures: [{ clause: 'depth', value: 1, reason: 'A test.', approvedBy: 'A. Checker' }],
    });
    departed.supports[0] = { restraint: 'pin', bearing: 100, inputs: { notch_depth: 120 } };
    for (const member of [departed, testMember({ grade: 'nothing' })]) {
      validate(check(plan, member));
      expect(validate.errors ?? []).toEqual([]);
    }
  });

  it('refuses what is not a result', () => {
    expect(validate({ ...check(plan, testMember()), extra: 1 })).toBe(false);
    expect(validate({ ...check(plan, testMember()), ledger: [{ n: 0 }] })).toBe(false);
  });
});
