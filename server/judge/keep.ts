import type { Door } from '#server/db/door.ts';
import type { EditionRow, MemberRow, ProjectRow } from '#server/models/rows.ts';
import type { VerdictWord } from '#shared/engine/types.ts';
import type { Judge, Judgement } from './judge.ts';

/** Checks a member as it stands against an edition and stores the result. Gives the verdict. */
export async function judgeAndKeep(
  door: Door,
  judge: Judge,
  edition: EditionRow,
  { choices }: Pick<ProjectRow, 'choices'>,
  member: MemberRow,
): Promise<VerdictWord> {
  const judgement = await judge.judge(edition, choices, member.document);
  await door.results.add(resultOf(judgement, edition, member));
  return judgement.result.verdict.word;
}

/** Checks every live member of a project against an edition and stores the results. Gives their number. */
export async function judgeProject(
  door: Door,
  judge: Judge,
  edition: EditionRow,
  project: ProjectRow,
): Promise<number> {
  const members = await door.members.all({ projectId: project.id, state: 'live' });
  for (const member of members) await judgeAndKeep(door, judge, edition, project, member);
  return members.length;
}

function resultOf(
  { inputs, memberHash, result, resultHash }: Judgement,
  edition: EditionRow,
  member: MemberRow,
) {
  const { word, check, utilisation, because } = result.verdict;
  return {
    memberId: member.id,
    memberVersion: member.version,
    editionId: edition.id,
    editionHash: edition.hash,
    inputs,
    memberHash,
    engine: result.engine,
    document: result,
    resultHash,
    verdict: word,
    governingCheck: check,
    checkTitle: result.checks.find(({ id }) => id === check)?.title ?? null,
    utilisation,
    because: because ?? null,
    unverified: result.marks.unverified,
    departures: result.marks.departures.length,
  };
}
