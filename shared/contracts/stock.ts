import { Type, type Static } from '@sinclair/typebox';
import { closed, oneOf } from '#shared/basis/schema/index.ts';
import { ById, Instant, nullable, Uuid } from './common.ts';
import { contract } from './contract.ts';

const Size = closed({ b: Type.Number(), h: Type.Number() });

/** A size the firm can buy: ordered and finished. */
export const Section = closed({
  /** Key that members name as their stock section. */
  id: Type.String(),
  nominal: Size,
  actual: Size,
  /** Lengths it is sold in; empty: to order. */
  lengths: Type.Array(Type.Number()),
  /** Grades it is held in; empty: not stated. */
  grades: Type.Array(Type.String()),
  pricePerMetre: nullable(Type.Number()),
});
export type Section = Static<typeof Section>;

export const StockList = closed({
  id: Uuid,
  title: Type.String(),
  note: Type.String(),
  /** The sizes and prices are made up for a demonstration. */
  invented: Type.Boolean(),
  units: oneOf('metric', 'inch-pound'),
  currency: nullable(Type.String()),
  sectionCount: Type.Integer(),
  changedAt: Instant,
});
export type StockList = Static<typeof StockList>;

export const listStock = contract({
  name: 'listStock',
  method: 'GET',
  path: '/stock',
  action: 'stock.read',
  summary: 'Stock lists of the firm',
  output: closed({ items: Type.Array(StockList) }),
});

export const readStock = contract({
  name: 'readStock',
  method: 'GET',
  path: '/stock/:id',
  action: 'stock.read',
  summary: 'One stock list with its sections',
  params: ById,
  output: closed({ ...StockList.properties, sections: Type.Array(Section) }),
});
