import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { readTrail, type TrailEntry } from '#shared/contracts/trail.ts';
import { say } from '#shared/trail/say.ts';
import { Button } from '#src/components/Button.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';
import { moment } from '#src/lib/format/time.ts';

const placeOf: Partial<Record<TrailEntry['subject']['type'], (id: string) => string>> = {
  project: (id) => `/projects/${id}`,
  basis: (id) => `/bases/${id}`,
  edition: (id) => `/editions/${id}`,
  stock: (id) => `/stock/${id}`,
};

/** Who did what, newest first. It is only ever added to. */
export function TrailPage() {
  useCrumbs([{ label: 'Trail' }]);
  const trail = useInfiniteQuery({
    queryKey: ['trail'],
    queryFn: ({ pageParam }) =>
      call(readTrail, { query: { limit: 60, ...(pageParam === null ? {} : { before: pageParam }) } }),
    initialPageParam: null as number | null,
    getNextPageParam: (last) => last.older,
  });
  const items = trail.data?.pages.flatMap((page) => page.items) ?? [];
  return (
    <Page
      title="Trail"
      lead="Who did what, newest first. Entries are only ever added; the database refuses to change or remove one."
    >
      <ProblemNotice error={trail.error} />
      {trail.isPending && <Loading what="the trail" />}
      {trail.data && items.length === 0 && <EmptyState>Nothing was done yet.</EmptyState>}
      <ol>
        {items.map((entry) => {
          const to = placeOf[entry.subject.type]?.(entry.subject.id);
          return (
            <li
              key={entry.id}
              className="grid grid-cols-[3rem_9rem_1fr] items-baseline gap-x-3 border-b border-rule py-1.5 max-md:grid-cols-[3rem_1fr]"
            >
              <span className="font-mono text-xs text-soft">{entry.id}</span>
              <time dateTime={entry.at} className="text-soft">
                {moment(entry.at)}
              </time>
              <span className="max-md:col-span-2">
                <strong className="font-semibold">{entry.person.name}</strong> {say(entry.event)}
                {to && (
                  <>
                    {' '}
                    <Link to={to} className="text-accent-ink underline decoration-1 underline-offset-2">
                      {entry.subject.label}
                    </Link>
                  </>
                )}
              </span>
            </li>
          );
        })}
      </ol>
      {trail.hasNextPage && (
        <Button
          className="mt-4"
          onClick={() => void trail.fetchNextPage()}
          disabled={trail.isFetchingNextPage}
        >
          Older entries
        </Button>
      )}
    </Page>
  );
}
