import { Type } from '@sinclair/typebox';
import { closed } from '#shared/basis/schema/index.ts';
import { nullable, Role, Uuid } from './common.ts';
import { contract } from './contract.ts';
import { SignedIn } from './session.ts';

export const readFirm = contract({
  name: 'readFirm',
  method: 'GET',
  path: '/firm',
  action: 'firm.read',
  summary: 'The firm and its people with their roles',
  output: closed({
    ...SignedIn.properties.firm.properties,
    people: Type.Array(
      closed({
        id: Uuid,
        name: Type.String(),
        /** Shown to everyone but Readers. */
        email: nullable(Type.String()),
        roles: Type.Array(Role),
      }),
    ),
  }),
});
