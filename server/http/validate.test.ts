import { Type } from '@sinclair/typebox';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contract } from '#shared/contracts/index.ts';
import { closed } from '#shared/basis/schema/index.ts';
import { contracts } from '#shared/contracts/registry.ts';
import { Refusal } from './problem.ts';
import { validatorFor } from './validate.ts';

const Shape = Type.Union([
  closed({ kind: Type.Literal('round'), radius: Type.Number({ exclusiveMinimum: 0 }) }),
  closed({ kind: Type.Literal('square'), side: Type.Number({ maximum: 10 }) }),
]);
const draw = contract({
  name: 'draw',
  method: 'POST',
  path: '/drawings/:id',
  action: 'projects.create',
  summary: 'For this test only',
  params: closed({ id: Type.String({ format: 'uuid' }) }),
  query: closed({
    copies: Type.Optional(Type.Integer({ minimum: 1, default: 1 })),
    colour: Type.Optional(Type.String({ maxLength: 5 })),
  }),
  body: closed({
    shapes: Type.Array(Shape),
    note: Type.Union([Type.String({ minLength: 1 }), Type.Null()]),
    'a/b~c': Type.Optional(Type.Boolean()),
  }),
  example: { shapes: [], note: null },
  output: null,
});
const validator = validatorFor(draw);
const params = { id: '00000000-0000-4000-8000-000000000000' };

function problems(body: unknown, query: unknown = {}): [string, string][] {
  try {
    validator.input({ params, query, body });
    return [];
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    return (error.extra.errors ?? []).map(({ pointer, message }) => [pointer, message]);
  }
}

describe('problems of an input', () => {
  it('concern the alternative that was meant', () => {
    expect(problems({ shapes: [{ kind: 'round', radius: 0 }], note: null })).toEqual([
      ['/shapes/0/radius', 'Has to be more than 0.'],
    ]);
    expect(problems({ shapes: [{ kind: 'square', side: 11, radius: 1 }], note: null })).toEqual([
      ['/shapes/0/radius', 'Is not known here. Check the spelling, or leave it out.'],
      ['/shapes/0/side', 'Has to be at most 10.'],
    ]);
  });

  it('list the words where none was right', () => {
    expect(problems({ shapes: [{ kind: 'oval' }], note: null })).toEqual([
      ['/shapes/0/kind', 'Has to be one of: round, square.'],
    ]);
  });

  it('tell a text that is too short from something else', () => {
    expect(problems({ shapes: [], note: '' })).toEqual([['/note', 'Can’t be empty.']]);
    expect(problems({ shapes: [], note: 7 })).toEqual([
      ['/note', 'Does not have a form that is allowed here.'],
    ]);
  });

  it('escape pointers', () => {
    expect(problems({ shapes: [], note: null, 'a/b~c': 1 })).toEqual([
      ['/a~1b~0c', 'Has to be true or false.'],
    ]);
  });

  it('of query and body come together', () => {
    expect(problems({ shapes: 1, note: null }, { copies: '0', colour: 'purple' })).toEqual([
      ['?copies', 'Has to be at least 1.'],
      ['?colour', 'Can have at most 5 characters.'],
      ['/shapes', 'Has to be a list.'],
    ]);
  });
});

describe('the query', () => {
  it('is text that becomes numbers, with defaults; the body is taken as it is', () => {
    const body = { shapes: [], note: null };
    expect(validator.input({ params, query: { copies: '3' }, body }).query).toEqual({ copies: 3 });
    expect(validator.input({ params, query: {}, body }).query).toEqual({ copies: 1 });
    expect(problems({ shapes: [{ kind: 'round', radius: '3' }], note: null })).toEqual([
      ['/shapes/0/radius', 'Has to be a number.'],
    ]);
  });
});

describe('an address', () => {
  it('that can name nothing names nothing', () => {
    const ask = () => validator.input({ params: { id: 'x' }, query: {}, body: { shapes: [], note: null } });
    expect(ask).toThrow(expect.objectContaining({ code: 'not-found' }));
  });
});

describe('whatever is sent to whichever endpoint', () => {
  it('is taken or refused, and never throws anything else', () => {
    const validators = contracts.map(({ contract: each }) => validatorFor(each));
    const json = fc.jsonValue({ maxDepth: 6 });
    fc.assert(
      fc.property(fc.nat(), json, fc.dictionary(fc.string(), fc.string()), (n, body, query) => {
        try {
          validators[n % validators.length]?.input({ params, query, body });
        } catch (error) {
          expect(error).toBeInstanceOf(Refusal);
        }
      }),
      { numRuns: 2000 },
    );
  });
});
