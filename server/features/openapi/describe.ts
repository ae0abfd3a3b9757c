import type { TObject, TSchema } from '@sinclair/typebox';
import { rules, type Rule } from '#shared/access/index.ts';
import { Problem, problemCodes, type Contract } from '#shared/contracts/index.ts';
import { contracts } from '#shared/contracts/registry.ts';

type Json = Record<string, unknown>;

const problemType = 'application/problem+json';
const problemAnswer = (description: string): Json => ({
  description,
  content: { [problemType]: { schema: { $ref: '#/components/schemas/Problem' } } },
});

/** The description of the API in OpenAPI 3.1, generated from the contracts. */
export function describeApi(): { openapi: '3.1.0' } & Json {
  const paths: Record<string, Json> = {};
  for (const { resource, contract } of contracts) {
    const path = contract.path.replaceAll(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [contract.method.toLowerCase()]: operation(resource, contract) };
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Ledgerbeam',
      version: '1',
      description:
        'Design bases for timber beams as data, members checked against them, and the ledger behind each verdict. Results are a calculation aid: loads, assumptions and results are to be checked and adopted by a suitably qualified (where the law asks, licensed) engineer against the codes in force at the site.',
    },
    servers: [{ url: '/api' }],
    tags: [...new Set(contracts.map(({ resource }) => resource))].map((name) => ({ name })),
    paths,
    components: {
      schemas: { Problem },
      securitySchemes: {
        session: {
          type: 'apiKey',
          in: 'cookie',
          name: 'ledgerbeam',
          description:
            'Given by POST /session. Requests that change something also carry the session’s token in X-CSRF-Token.',
        },
      },
    },
  };
}

function operation(resource: string, contract: Contract): Json {
  const { name, summary, action, body, example, output, status, params, query, method } = contract;
  const { who }: Rule = rules[action];
  const open = who === 'anyone';
  return {
    operationId: name,
    tags: [resource],
    summary,
    description: `Needs the action \`${action}\`: ${whoMay(who)}.`,
    security: open ? [] : [{ session: [] }],
    parameters: [...parameters('path', params), ...parameters('query', query)],
    ...(body
      ? { requestBody: { required: true, content: { 'application/json': { schema: body, example } } } }
      : {}),
    responses: {
      [status]: output
        ? { description: 'Done', content: { 'application/json': { schema: output } } }
        : { description: 'Done; nothing to give.' },
      ...refusals(open, method, body !== null, Object.keys(params.properties).length > 0),
    },
  };
}

function refusals(open: boolean, method: string, hasBody: boolean, hasParams: boolean): Json {
  const codes = [
    ...(hasBody ? [400, 413, 415] : []),
    ...(open ? [] : [401]),
    ...(open && method === 'GET' ? [] : [403]),
    ...(hasParams || !open ? [404] : []),
    ...(hasBody || method === 'DELETE' ? [409] : []),
    422,
    429,
    500,
    503,
  ];
  return Object.fromEntries(codes.map((code) => [code, problemAnswer(titlesOf(code))]));
}

function titlesOf(status: number): string {
  return Object.values(problemCodes)
    .filter((problem) => problem.status === status)
    .map(({ title }) => title)
    .join('; ');
}

export function whoMay(who: Rule['who']): string {
  if (who === 'anyone') return 'anyone';
  return who === 'person' ? 'everyone in the firm' : who.join(', ');
}

function parameters(place: 'path' | 'query', { properties, required = [] }: TObject): Json[] {
  return Object.entries<TSchema>(properties).map(([name, schema]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema,
  }));
}
