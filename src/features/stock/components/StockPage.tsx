import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { listStock } from '#shared/contracts/stock.ts';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';

/** Sizes the firm can buy, by list. */
export function StockPage() {
  useCrumbs([{ label: 'Stock' }]);
  const { data, error } = useQuery({ queryKey: ['stock'], queryFn: () => call(listStock) });
  return (
    <Page
      title="Stock"
      lead="Sizes the firm can buy: ordered, and finished. Members are checked with the finished size."
    >
      <ProblemNotice error={error} />
      {!data && !error && <Loading what="the stock lists" />}
      {data?.items.length === 0 && (
        <EmptyState>
          Stock lists stand here; a project picks one, and its sections are offered on each member.
        </EmptyState>
      )}
      <ul>
        {data?.items.map((list) => (
          <li key={list.id} className="border-b border-rule py-3 first:border-t">
            <Link to={`/stock/${list.id}`} className="font-serif text-xl font-medium hover:underline">
              {list.title}
            </Link>
            <p className="text-soft">
              {list.sectionCount} sections, {list.units}. {list.invented && 'Invented for demonstration. '}
              {list.note}
            </p>
          </li>
        ))}
      </ul>
    </Page>
  );
}
