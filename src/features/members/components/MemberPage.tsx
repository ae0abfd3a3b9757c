import { useParams } from 'react-router-dom';
import { useCrumbs } from '#src/components/crumbs.ts';
import { Loading } from '#src/components/Loading.tsx';
import { Notice, ProblemNotice } from '#src/components/Notice.tsx';
import { may, useSignedIn } from '#src/lib/api/session.ts';
import { useEditionDocument, useMemberRecord, useStockList } from '../api/useMember.ts';
import { MemberSheet } from './MemberSheet.tsx';

const noStock: never[] = [];

/** One member: fetches it with its edition and stock, then hands over to the sheet. */
export function MemberPage() {
  const { memberId = '' } = useParams();
  const signedIn = useSignedIn();
  const record = useMemberRecord(memberId);
  const edition = useEditionDocument(record.data?.edition?.id);
  const stock = useStockList(record.data?.project.stockListId);
  useCrumbs([
    { label: 'Projects', to: '/projects' },
    ...(record.data ? [{ label: record.data.project.title, to: `/projects/${record.data.project.id}` }] : []),
    { label: record.data?.mark ?? 'Member' },
  ]);
  const error = record.error ?? edition.error ?? stock.error;
  if (error) {
    return (
      <div className="mx-auto max-w-2xl p-6">
        <h1 className="text-2xl">This member could not be shown</h1>
        <ProblemNotice error={error} />
      </div>
    );
  }
  if (!record.data) return <Loading what="the member" />;
  if (!record.data.edition) {
    return (
      <div className="mx-auto max-w-2xl p-6">
        <h1 className="text-2xl">{record.data.mark}</h1>
        <Notice tone="warning">
          The project has no edition pinned yet, so there is nothing to check this member against. Pin one on
          the project’s page.
        </Notice>
      </div>
    );
  }
  if (!edition.data || (record.data.project.stockListId !== null && !stock.data))
    return <Loading what="the edition" />;
  return (
    <MemberSheet
      key={record.data.id}
      record={record.data}
      editionReference={record.data.edition}
      edition={edition.data.document}
      stock={stock.data?.sections ?? noStock}
      person={signedIn.person.id}
      readOnly={!may(record.data, 'members.save')}
    />
  );
}
