import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { readDraft } from '#shared/contracts/drafts.ts';
import { useCrumbs } from '#src/components/crumbs.ts';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { call } from '#src/lib/api/call.ts';
import { may } from '#src/lib/api/session.ts';
import { DraftDesk } from './DraftDesk.tsx';

/** An edition as it is worked on: fetches it, then hands over. */
export function DraftPage() {
  const { editionId = '' } = useParams();
  const draft = useQuery({
    queryKey: ['draft', editionId],
    queryFn: () => call(readDraft, { params: { id: editionId } }),
    staleTime: Infinity,
  });
  const summary = draft.data?.summary;
  useCrumbs([
    { label: 'Bases', to: '/bases' },
    ...(summary ? [{ label: summary.basisTitle, to: `/bases/${summary.basisId}` }] : []),
    { label: summary ? `Edition ${summary.number}` : 'Edition' },
  ]);
  if (draft.error) {
    return (
      <Page title="Edition">
        <ProblemNotice error={draft.error} />
      </Page>
    );
  }
  if (!draft.data) return <Loading what="the draft" />;
  // A move (submit, return, release) brings another state, and with it another sheet.
  return (
    <DraftDesk
      key={`${draft.data.summary.id} ${draft.data.summary.state}`}
      draft={draft.data}
      readOnly={!may(draft.data, 'editions.edit')}
    />
  );
}
