import { readNumber } from '#shared/units/quantity.ts';
import type { CellText } from '#src/components/grid/types.ts';
import type { Numbers } from '#src/lib/format/locale.ts';

/** Cells as a person types and reads them: numbers by their locale, choices by title or id. */
export function cellText(numbers: Numbers): CellText {
  return {
    format: (column, value) => {
      if (value === null) return '';
      if (column.kind === 'choice')
        return column.options?.find(({ id }) => id === value)?.title ?? String(value);
      return typeof value === 'number' ? numbers.exact(value) : value;
    },
    parse: (column, text) => {
      const trimmed = text.trim().replace(/^'(?=[=+\-@])/, '');
      if (trimmed === '') return { ok: true, value: null };
      if (column.kind === 'text') return { ok: true, value: trimmed };
      if (column.kind === 'choice') {
        const found = column.options?.find(
          ({ id, title }) => id === trimmed || title.toLowerCase() === trimmed.toLowerCase(),
        );
        return found
          ? { ok: true, value: found.id }
          : { ok: false, message: `“${trimmed}” is not an option of ${column.title}.` };
      }
      const value = readNumber(trimmed, numbers.format);
      if (value === undefined) return { ok: false, message: `“${trimmed}” is not a number.` };
      return value < 0 ? { ok: false, message: `${column.title} can’t be below 0.` } : { ok: true, value };
    },
  };
}
