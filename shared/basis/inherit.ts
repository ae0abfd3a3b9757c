import type { Edition, Member } from './schema/index.ts';

/**
 * The member as it is checked: its document with the project's choices where the member made none. Only
 * choices that the edition knows as a project's are inherited, so that a project may move between editions.
 */
export function withProjectChoices(
  edition: Edition,
  projectChoices: Readonly<Record<string, string>>,
  member: Member,
): Member {
  const inherited: [string, string][] = edition.choices.flatMap(({ symbol, scope }) => {
    const chosen =
      scope === 'project' && Object.hasOwn(projectChoices, symbol) ? projectChoices[symbol] : undefined;
    return chosen === undefined ? [] : [[symbol, chosen]];
  });
  return { ...member, choices: { ...Object.fromEntries(inherited), ...member.choices } };
}
