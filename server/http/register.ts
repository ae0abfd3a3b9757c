import express, { Router, type Request, type RequestHandler } from 'express';
import type { Contract } from '#shared/contracts/index.ts';
import { contracts } from '#shared/contracts/registry.ts';
import { refuseForeign } from './csrf.ts';
import { notFound, Refusal } from './problem.ts';
import { signedOut, type Route } from './route.ts';
import type { Services } from './services.ts';
import { accountOf } from './session.ts';
import { validatorFor } from './validate.ts';
import { can } from '#shared/access/index.ts';

const BODY_LIMIT = '1mb';

export interface RegisterOptions {
  /** Hold every answer to its contract; for the tests. */
  checkAnswers: boolean;
}

/**
 * Registers the endpoints: authenticate, limit, validate, then the route's own transaction. Every contract
 * needs a route and every route a contract of the registry, or the application does not start.
 */
export function register(routes: readonly Route[], services: Services, options: RegisterOptions): Router {
  complete(routes);
  const router = Router();
  const readBody = express.json({ limit: BODY_LIMIT, type: 'application/json', strict: false });
  const methods = new Map<string, string[]>();
  for (const route of routes) {
    const { method, path } = route.contract;
    methods.set(path, [...(methods.get(path) ?? []), method]);
    const handlers = [enter(route.contract, services), readBody, handle(route, services, options)];
    router[method.toLowerCase() as Lowercase<typeof method>](path, ...handlers);
  }
  for (const [path, allowed] of methods) {
    router.all(path, (_request, response) => {
      response.set('Allow', allowed.join(', '));
      throw new Refusal('wrong-method', `This address takes ${allowed.join(', ')}.`);
    });
  }
  router.use(() => {
    throw notFound();
  });
  return router;
}

function complete(routes: readonly Route[]): void {
  const named = routes.map(({ contract }) => contract);
  const double = named.find((contract, i) => named.indexOf(contract) !== i);
  const missing = contracts.find(({ contract }) => !named.includes(contract));
  const unknown = named.find((each) => !contracts.some(({ contract }) => contract === each));
  const wrong = double ?? missing?.contract ?? unknown;
  if (wrong) throw new Error(`The endpoint ${wrong.name} needs exactly one contract and one route.`);
}

/** Authenticate and limit, before a byte of the body is read. */
function enter(contract: Contract, { limits }: Services): RequestHandler {
  return async (request, _response, next) => {
    const account = accountOf(request);
    await limits.request(account?.personId ?? request.ip ?? '');
    if (!account && !can(null, contract.action)) throw signedOut(request);
    refuseForeign(request);
    if (contract.body) refuseOtherMedia(request);
    next();
  };
}

function refuseOtherMedia(request: Request): void {
  const sent =
    Number(request.get('Content-Length') ?? 0) > 0 || request.get('Transfer-Encoding') !== undefined;
  if (sent && !request.is('application/json')) {
    throw new Refusal('wrong-media-type', 'Send the body as application/json.');
  }
}

function handle(route: Route, services: Services, { checkAnswers }: RegisterOptions): RequestHandler {
  const { contract } = route;
  const validator = validatorFor(contract);
  return async (request, response) => {
    const input = validator.input({ params: request.params, query: request.query, body: request.body });
    const answer = await route.run(request, input, services);
    if (checkAnswers) {
      const [problem] = validator.output(answer);
      if (problem)
        throw new Error(`${contract.name} answers otherwise than its contract: ${JSON.stringify(problem)}`);
    }
    response.set('Cache-Control', 'no-store').status(contract.status);
    if (contract.output === null) response.end();
    else response.json(answer);
  };
}
