import { Type } from '@sinclair/typebox';
import { contract } from './contract.ts';

export const readOpenApi = contract({
  name: 'readOpenApi',
  method: 'GET',
  path: '/openapi.json',
  action: 'openapi.read',
  summary: 'This description: OpenAPI 3.1, generated from the contracts',
  output: Type.Object({ openapi: Type.Literal('3.1.0') }),
});
