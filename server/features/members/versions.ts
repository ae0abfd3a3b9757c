import type { listMemberVersions, Output } from '#shared/contracts/index.ts';
import type { Door } from '#server/db/door.ts';
import { instant, personJson, resultJson } from '#server/db/summaries.ts';

type Version = Output<typeof listMemberVersions>['items'][number];

/** Every version of a member, newest first, each with the newest result that it was given. */
export async function versionsOf(door: Door, memberId: string): Promise<Version[]> {
  return door.select<Version>(
    `SELECT v.version, v.document, v.hash, ${personJson('sp')} AS "savedBy",
       ${instant('v.saved_at')} AS "savedAt", ${resultJson('r', 're', 'rb')} AS result
     FROM member_versions v JOIN people sp ON sp.id = v.saved_by
     LEFT JOIN LATERAL (
       SELECT * FROM results WHERE member_id = v.member_id AND member_version = v.version
       ORDER BY seq DESC LIMIT 1) r ON true
     LEFT JOIN editions re ON re.id = r.edition_id LEFT JOIN bases rb ON rb.id = re.basis_id
     WHERE v.firm_id = :firmId AND v.member_id = :memberId ORDER BY v.version DESC`,
    { memberId },
  );
}
