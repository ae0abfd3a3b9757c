import { listStock, readStock, type Section, type StockList } from '#shared/contracts/index.ts';
import { instant } from '#server/db/summaries.ts';
import { route, type Route } from '#server/http/route.ts';

const lists = `
  SELECT s.id, s.title, s.note, s.invented, s.units, s.currency, ${instant('s.changed_at')} AS "changedAt",
    (SELECT count(*)::int FROM sections WHERE stock_list_id = s.id) AS "sectionCount"
  FROM stock_lists s WHERE s.firm_id = :firmId`;

export const stockRoutes: readonly Route[] = [
  route(listStock, async ({ door }) => ({
    items: await door.select<StockList>(`${lists} ORDER BY s.title, s.id`),
  })),

  route(readStock, {
    load: async ({ door, params }) => {
      const [list] = await door.select<StockList>(`${lists} AND s.id = :id`, { id: params.id });
      return list ? { access: {}, list } : null;
    },
    act: async ({ door, record: { list } }) => ({
      ...list,
      sections: await door.select<Section>(
        `SELECT key AS id, jsonb_build_object('b', nominal_b, 'h', nominal_h) AS nominal,
           jsonb_build_object('b', actual_b, 'h', actual_h) AS actual, lengths, grades,
           price_per_metre AS "pricePerMetre"
         FROM sections WHERE stock_list_id = :id ORDER BY actual_b, actual_h, key`,
        { id: list.id },
      ),
    }),
  }),
];
