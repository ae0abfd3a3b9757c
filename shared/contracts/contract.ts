import { Type, type Static, type TObject, type TSchema } from '@sinclair/typebox';
import type { Action } from '#shared/access/index.ts';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** One endpoint: what it takes, what it gives, and the action that a person needs. */
export interface Contract<
  P extends TObject = TObject,
  Q extends TObject = TObject,
  B extends TSchema | null = TSchema | null,
  O extends TSchema | null = TSchema | null,
> {
  readonly name: string;
  readonly method: Method;
  /** Below `/api`, with `:name` for parameters. */
  readonly path: string;
  readonly action: Action;
  readonly summary: string;
  readonly params: P;
  readonly query: Q;
  /** null: takes no body. */
  readonly body: B;
  /** null: gives nothing (204). */
  readonly output: O;
  readonly status: number;
  /** A body that is taken, for the description and the generated tests. */
  readonly example: unknown;
}

interface Definition<
  P extends TObject,
  Q extends TObject,
  B extends TSchema | null,
  O extends TSchema | null,
> {
  name: string;
  method: Method;
  path: string;
  action: Action;
  summary: string;
  params?: P;
  query?: Q;
  body?: B;
  example?: B extends TSchema ? Static<B> : never;
  output: O;
  status?: number;
}

const none = Type.Object({}, { additionalProperties: false });
type None = typeof none;

/** Declares an endpoint; handler and client take all their types from it. */
export function contract<
  O extends TSchema | null,
  P extends TObject = None,
  Q extends TObject = None,
  B extends TSchema | null = null,
>(definition: Definition<P, Q, B, O>): Contract<P, Q, B, O> {
  const { name, method, path, action, summary, params, query, body, example, output, status } = definition;
  // What is left out is the empty object or null, which is what the type parameters then stand at.
  return {
    name,
    method,
    path,
    action,
    summary,
    params: (params ?? none) as P,
    query: (query ?? none) as Q,
    body: (body ?? null) as B,
    output,
    status: status ?? (output === null ? 204 : 200),
    example: example ?? null,
  };
}

type Read<S> = S extends TSchema ? Static<S> : undefined;
export type Params<C extends Contract> = Static<C['params']>;
export type Query<C extends Contract> = Static<C['query']>;
export type Body<C extends Contract> = Read<C['body']>;
export type Output<C extends Contract> = Read<C['output']>;
