import { Type } from '@sinclair/typebox';
import { closed, oneOf } from '#shared/basis/schema/index.ts';
import { contract } from './contract.ts';

/** 200 when the database answers; else a `database-away` problem with 503. */
export const readHealth = contract({
  name: 'readHealth',
  method: 'GET',
  path: '/health',
  action: 'health.read',
  summary: 'Whether the server and its database answer',
  output: closed({ status: oneOf('well'), database: oneOf('answers'), engine: Type.String() }),
});
