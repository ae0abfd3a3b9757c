import type { ErrorObject } from 'ajv';
import type { InputProblem } from '#shared/contracts/problem.ts';

const kinds: Readonly<Record<string, string>> = {
  string: 'a text',
  number: 'a number',
  integer: 'a whole number',
  boolean: 'true or false',
  object: 'an object',
  array: 'a list',
  null: 'null',
};
const formats: Readonly<Record<string, string>> = {
  uuid: 'Is not an identifier.',
  'date-time': 'Is not a date with a time.',
};

const escape = (key: string) => key.replaceAll('~', '~0').replaceAll('/', '~1');

/** What an error of the validator means, for people, at the place it concerns. */
export function sentenceOf(error: ErrorObject): InputProblem {
  const { keyword, instancePath } = error;
  const params: Readonly<Record<string, unknown>> = error.params;
  if (keyword === 'required') {
    return {
      pointer: `${instancePath}/${escape(String(params['missingProperty']))}`,
      message: 'Is missing.',
    };
  }
  if (keyword === 'additionalProperties') {
    return {
      pointer: `${instancePath}/${escape(String(params['additionalProperty']))}`,
      message: 'Is not known here. Check the spelling, or leave it out.',
    };
  }
  return { pointer: instancePath, message: message(keyword, params, error) };
}

function message(keyword: string, params: Readonly<Record<string, unknown>>, error: ErrorObject): string {
  const limit = String(params['limit']);
  switch (keyword) {
    case 'type':
      return `Has to be ${[params['type']]
        .flat()
        .map((type) => kinds[String(type)] ?? String(type))
        .join(' or ')}.`;
    case 'exclusiveMinimum':
      return `Has to be more than ${limit}.`;
    case 'minimum':
      return `Has to be at least ${limit}.`;
    case 'exclusiveMaximum':
      return `Has to be less than ${limit}.`;
    case 'maximum':
      return `Has to be at most ${limit}.`;
    case 'minLength':
      return limit === '1' ? 'Can’t be empty.' : `Has to have at least ${limit} characters.`;
    case 'maxLength':
      return `Can have at most ${limit} characters.`;
    case 'minItems':
      return `Needs at least ${limit}.`;
    case 'maxItems':
    case 'maxProperties':
      return `Can hold at most ${limit}.`;
    case 'enum':
      return `Has to be one of: ${[params['allowedValues']].flat().join(', ')}.`;
    case 'const':
      return `Has to be ${JSON.stringify(params['allowedValue'])}.`;
    case 'format':
      return formats[String(params['format'])] ?? 'Is not of the right form.';
    case 'pattern':
      return params['pattern'] === '\\S' ? 'Can’t be blank.' : described('Is not of the right form.', error);
    default:
      return described('Does not have a form that is allowed here.', error);
  }
}

function described(text: string, { parentSchema }: ErrorObject): string {
  const description: unknown = parentSchema?.['description'];
  return typeof description === 'string' ? `${text} ${description}` : text;
}
