import { useQuery } from '@tanstack/react-query';
import { roleTitles } from '#shared/access/index.ts';
import { readFirm } from '#shared/contracts/firm.ts';
import { DataTable } from '#src/components/DataTable.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { Notice, ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';

/** The firm and its people with their roles. */
export function FirmPage() {
  useCrumbs([{ label: 'Firm' }]);
  const { data, error } = useQuery({ queryKey: ['firm'], queryFn: () => call(readFirm) });
  if (error)
    return (
      <Page title="Firm">
        <ProblemNotice error={error} />
      </Page>
    );
  if (!data) return <Loading what="the firm" />;
  return (
    <Page
      title={data.name}
      lead={
        data.invented
          ? 'An invented firm for demonstration: its people, values and projects are made up.'
          : undefined
      }
    >
      {data.solePractitioner ? (
        <Notice tone="warning">
          Sole practitioner: no second person checks or releases, and every sheet says so.
        </Notice>
      ) : (
        <p className="mb-4 text-soft">
          Nobody signs or releases their own work: a second person always does.
        </p>
      )}
      <DataTable
        label="People"
        rows={data.people}
        rowKey={({ id }) => id}
        columns={[
          { key: 'name', title: 'Name', heads: true, by: ({ name }) => name, cell: ({ name }) => name },
          {
            key: 'roles',
            title: 'Roles',
            cell: ({ roles }) => roles.map((role) => roleTitles[role]).join(', '),
          },
          { key: 'email', title: 'E-mail', cell: ({ email }) => email ?? '–' },
        ]}
      />
    </Page>
  );
}
