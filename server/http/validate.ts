import type { ValidateFunction } from 'ajv';
import type { Contract, InputProblem } from '#shared/contracts/index.ts';
import { plainJsonProblems } from '#shared/validation/plainJson.ts';
import { problemsOf, validator } from '#shared/validation/validator.ts';
import { invalid, notFound } from './problem.ts';

/** Most problems told at once. */
const MOST = 100;

/** Bodies and answers are taken as they are; only the query, which is text, is turned into numbers. */
const exact = validator(false);
const coercing = validator(true);

export interface Input {
  params: unknown;
  query: unknown;
  body: unknown;
}

/** The checks of a contract, compiled once. */
export interface Validator {
  /** Gives the input back, or throws a refusal with every problem at its JSON pointer. */
  input(input: Input): Input;
  /** What is wrong with an answer; empty: nothing. For the tests. */
  output(answer: unknown): InputProblem[];
}

export function validatorFor(contract: Contract): Validator {
  const params = exact.compile(contract.params);
  const query = coercing.compile(contract.query);
  const body = contract.body && exact.compile(contract.body);
  const output = contract.output && exact.compile(contract.output);
  return {
    input(input) {
      // An address that can't name anything names nothing.
      if (!params(input.params)) throw notFound();
      const sent = Object.assign({}, input.query);
      const problems = [
        ...problemsOf(query, sent).map(({ pointer, message }) => ({
          pointer: `?${pointer.slice(1)}`,
          message,
        })),
        ...plainJsonProblems(sent),
        ...(body ? bodyProblems(body, input.body) : []),
      ];
      if (problems.length > 0) throw invalid(problems.slice(0, MOST));
      return { params: input.params, query: sent, body: body ? input.body : undefined };
    },
    output: (answer) => (output ? problemsOf(output, answer) : []),
  };
}

function bodyProblems(validate: ValidateFunction, body: unknown): InputProblem[] {
  if (body === undefined) return [{ pointer: '', message: 'A JSON body is needed here.' }];
  const unstorable = plainJsonProblems(body);
  return unstorable.length > 0 ? unstorable : problemsOf(validate, body);
}
