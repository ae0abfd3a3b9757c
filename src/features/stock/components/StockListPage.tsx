import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { readStock, type Section } from '#shared/contracts/stock.ts';
import { DataTable, type DataColumn } from '#src/components/DataTable.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { useCrumbs } from '#src/components/crumbs.ts';
import { call } from '#src/lib/api/call.ts';
import { useNumbers } from '#src/lib/format/locale.ts';

/** One stock list: ordered and finished sizes, lengths, grades, prices. */
export function StockListPage() {
  const { stockId = '' } = useParams();
  const numbers = useNumbers();
  const { data, error } = useQuery({
    queryKey: ['stock', stockId],
    queryFn: () => call(readStock, { params: { id: stockId } }),
  });
  useCrumbs([{ label: 'Stock', to: '/stock' }, { label: data?.title ?? 'Stock list' }]);
  if (error)
    return (
      <Page title="Stock list">
        <ProblemNotice error={error} />
      </Page>
    );
  if (!data) return <Loading what="the stock list" />;
  const unit = data.units === 'metric' ? 'mm' : 'in';
  const size = ({ b, h }: { b: number; h: number }) => `${numbers.exact(b)} × ${numbers.exact(h)}`;
  const columns: DataColumn<Section>[] = [
    {
      key: 'actual',
      title: 'Finished',
      unit,
      align: 'right',
      heads: true,
      by: ({ actual }) => actual.b * 10_000 + actual.h,
      cell: ({ actual }) => size(actual),
    },
    {
      key: 'nominal',
      title: 'Ordered',
      unit,
      align: 'right',
      by: ({ nominal }) => nominal.b * 10_000 + nominal.h,
      cell: ({ nominal }) => size(nominal),
    },
    {
      key: 'lengths',
      title: 'Lengths',
      unit: data.units === 'metric' ? 'mm' : 'in',
      cell: ({ lengths }) => (lengths.length ? lengths.map(numbers.exact).join(', ') : 'to order'),
    },
    {
      key: 'grades',
      title: 'Grades',
      cell: ({ grades }) => (grades.length ? grades.join(', ') : 'not stated'),
    },
    {
      key: 'price',
      title: 'Price',
      unit: `${data.currency ?? ''}/m`,
      align: 'right',
      by: ({ pricePerMetre }) => pricePerMetre ?? 0,
      cell: ({ pricePerMetre }) => (pricePerMetre === null ? '–' : numbers.decimals(pricePerMetre, 2)),
    },
  ];
  return (
    <Page title={data.title} lead={`${data.invented ? 'Invented for demonstration. ' : ''}${data.note}`}>
      <DataTable label="Sections" columns={columns} rows={data.sections} rowKey={({ id }) => id} />
    </Page>
  );
}
