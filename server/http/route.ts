import type { Request } from 'express';
import {
  can,
  couldEver,
  isAction,
  readActionOf,
  type AccessRecord,
  type Action,
} from '#shared/access/index.ts';
import type { Body, Contract, Output, Params, Query } from '#shared/contracts/index.ts';
import { withFirm, type Door } from '#server/db/door.ts';
import { personOf, type Person } from './person.ts';
import { notFound, Refusal } from './problem.ts';
import type { Services } from './services.ts';
import { accountOf, hadSession } from './session.ts';
import type { Input } from './validate.ts';

interface Call<C extends Contract> {
  params: Params<C>;
  query: Query<C>;
  body: Body<C>;
  services: Services;
}
/** What an endpoint of a firm works with: everything through the door. */
export interface FirmCall<C extends Contract> extends Call<C> {
  door: Door;
  person: Person;
}
/** What an endpoint works with that has no firm: health, description, sign-in. */
export interface OpenCall<C extends Contract> extends Call<C> {
  request: Request;
}

/** A record with what the access rules look at. */
export interface Loaded {
  access: AccessRecord;
}

/** An endpoint ready to be registered; the handler's types are checked where it is made. */
export interface Route {
  contract: Contract;
  run(request: Request, input: Input, services: Services): Promise<unknown>;
}

interface FirmSteps<C extends Contract, R extends Loaded> {
  /** The record within the firm, or null where there is none. */
  load: (call: FirmCall<C>) => Promise<R | null>;
  act: (call: FirmCall<C> & { record: R }) => Promise<Output<C>>;
}

/**
 * An endpoint on a firm's data: in one transaction, through the door, load the record, authorise with the
 * contract's action, act. Input has been validated; the trail is written by the command that acts.
 */
export function route<C extends Contract, R extends Loaded>(contract: C, steps: FirmSteps<C, R>): Route;
/** An endpoint on the firm as a whole, without a record to load. */
export function route<C extends Contract>(contract: C, act: (call: FirmCall<C>) => Promise<Output<C>>): Route;
export function route<C extends Contract, R extends Loaded>(
  contract: C,
  work: FirmSteps<C, R> | ((call: FirmCall<C>) => Promise<Output<C>>),
): Route {
  named(contract);
  return {
    contract,
    run(request, input, services) {
      const account = accountOf(request);
      if (!account) throw signedOut(request);
      return withFirm(
        services.database,
        account,
        async (door) => {
          const person = await personOf(door);
          if (!person) throw signedOut(request);
          const call: FirmCall<C> = { ...typed<C>(input), services, door, person };
          if (typeof work === 'function') {
            authorise(person, contract.action);
            return work(call);
          }
          const record = await work.load(call);
          if (!record) throw notFound();
          authorise(person, contract.action, record.access);
          return work.act({ ...call, record });
        },
        { readOnly: contract.method === 'GET' },
      );
    },
  };
}

/** An endpoint that a signed-out visitor may use; its action has to say so. */
export function openRoute<C extends Contract>(
  contract: C,
  act: (call: OpenCall<C>) => Promise<Output<C>>,
): Route {
  named(contract);
  if (!can(null, contract.action)) throw new Error(`${contract.name} is not for everyone.`);
  return {
    contract,
    run: (request, input, services) => act({ ...typed<C>(input), services, request }),
  };
}

/** An endpoint without an action of the access table can't be registered. */
function named({ name, action }: Contract): void {
  if (!isAction(action)) throw new Error(`The endpoint ${name} has no action.`);
}

/** The input was validated against the contract's schemas, which is what these types are made of. */
function typed<C extends Contract>(input: Input): Pick<Call<C>, 'params' | 'query' | 'body'> {
  return input as Pick<Call<C>, 'params' | 'query' | 'body'>;
}

function authorise(person: Person, action: Action, record?: AccessRecord): void {
  if (can(person, action, record)) return;
  // What one may not see does not exist for them.
  if (!can(person, readActionOf(action), record)) throw notFound();
  if (couldEver(person, action)) {
    throw new Refusal('not-in-this-state', 'This is closed or was taken out, and can’t be changed any more.');
  }
  throw new Refusal(
    'not-allowed',
    'Your role in the firm does not allow this. Ask the principal of the firm.',
  );
}

export function signedOut(request: Request): Refusal {
  return hadSession(request)
    ? new Refusal(
        'session-expired',
        'Your session has ended. Sign in again; what you typed is kept on the page.',
      )
    : new Refusal('signed-out', 'Sign in to go on.');
}
