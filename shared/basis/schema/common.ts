import { Type, type Static, type TSchema, type TString } from '@sinclair/typebox';

/** Closed object: unknown keys are an error, never a warning. */
export const closed = <T extends Record<string, TSchema>>(properties: T, description?: string) =>
  Type.Object(properties, { additionalProperties: false, ...(description ? { description } : {}) });

/** Values by name; a name of another form is an error. */
export const named = <K extends TString, T extends TSchema>(name: K, value: T) =>
  Type.Record(name, value, { additionalProperties: false });

/** One of a few words. */
export const oneOf = <T extends string>(...words: readonly T[]) =>
  Type.Unsafe<T>({ type: 'string', enum: [...words] });

/** Identifier of a thing inside one edition (kebab, dotted or camel; never a prototype name). */
export const Id = Type.String({
  pattern:
    '^(?!__proto__$|constructor$|prototype$|toString$|valueOf$|hasOwnProperty$)[A-Za-z][A-Za-z0-9_.-]{0,63}$',
  description: 'Identifier: a letter, then letters, digits, dot, dash or underscore; at most 64.',
});

/** A symbol that formulas and conditions can name, such as `K_7`, `f_m`, `sigma_m_d`. */
export const Symbol = Type.String({
  pattern:
    '^(?!__proto__$|constructor$|prototype$|toString$|valueOf$|hasOwnProperty$)[A-Za-z][A-Za-z0-9_]{0,39}$',
  description: 'Symbol: a letter, then letters, digits or underscore; at most 40.',
});

export const Title = Type.String({ minLength: 1, maxLength: 200 });
export const Text = Type.String({ maxLength: 4000 });
/** A unit as written, such as "N/mm2", "mm", "kg/m3", "psi"; "1" for a pure number. */
export const Unit = Type.String({ minLength: 1, maxLength: 24, description: 'Unit, "1" for a pure number.' });
/** A formula in the edition's coherent units. */
export const Formula = Type.String({
  minLength: 1,
  maxLength: 500,
  description:
    'Formula: numbers, symbols, + - * / ^, comparison, a ? b : c, min max sqrt abs round ceil floor exp log.',
});

/**
 * Where a value comes from, and how far it can be trusted. `seen`: read in the named source;
 * `memory`: written from memory and to be verified; `decision`: decided by the firm;
 * `invented`: made up for a demonstration.
 */
export const Provenance = closed({
  source: Id,
  standing: oneOf('seen', 'memory', 'decision', 'invented'),
  place: Type.Optional(Type.String({ maxLength: 200, description: 'Table, clause or page of the source.' })),
  note: Type.Optional(Text),
  /** The second person who compared the value with its source. Absent: unverified. */
  verified: Type.Optional(closed({ by: Title, on: Type.String({ pattern: '^\\d{4}-\\d{2}-\\d{2}$' }) })),
});
export type Provenance = Static<typeof Provenance>;

/** A publication, supplier declaration, firm decision or "from memory". */
export const Source = closed({
  id: Id,
  title: Title,
  kind: oneOf('publication', 'declaration', 'decision', 'memory', 'invented'),
  author: Type.Optional(Title),
  year: Type.Optional(Type.Integer({ minimum: 1800, maximum: 2200 })),
  address: Type.Optional(Type.String({ maxLength: 500 })),
  note: Type.Optional(Text),
});
export type Source = Static<typeof Source>;
