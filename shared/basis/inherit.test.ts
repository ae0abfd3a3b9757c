import { describe, expect, it } from 'vitest';
import { exampleMember } from '#shared/contracts/example.ts';
import { testEdition } from '#tests/factories/edition.ts';
import { withProjectChoices } from './inherit.ts';

const edition = testEdition();

describe('choices of the project', () => {
  it('stand where the member chose nothing', () => {
    expect(withProjectChoices(edition, { exposure: 'wet' }, exampleMember).choices).toEqual({
      exposure: 'wet',
    });
  });

  it('give way to the member’s own', () => {
    const member = { ...exampleMember, choices: { exposure: 'dry', sharing: 'alone' } };
    expect(withProjectChoices(edition, { exposure: 'wet' }, member).choices).toEqual(member.choices);
  });

  it('are left out where the edition does not know them as a project’s', () => {
    const choices = { sharing: 'alone', family: 'softwood', other: 'x' };
    expect(withProjectChoices(edition, choices, exampleMember).choices).toEqual({});
  });

  it('leave the member’s document as it was', () => {
    const before = structuredClone(exampleMember);
    withProjectChoices(edition, { exposure: 'wet' }, exampleMember);
    expect(exampleMember).toEqual(before);
  });
});
