import type { Edition, Table, TableKey } from '../schema/index.ts';
import { unitOf } from '#shared/units/units.ts';
import { sizeOf } from '../table/lookUp.ts';
import type { Findings } from './findings.ts';

/** Checks that each table has the shape its keys ask for; only those that have are prepared for use. */
export function checkTables(edition: Edition, findings: Findings): Table[] {
  return edition.tables.filter((table, index) => {
    const before = findings.list.length;
    const pointer = `/tables/${index}`;
    if (table.unit !== 'word' && !unitOf(table.unit))
      findings.error(
        'unknown-unit',
        `${pointer}/unit`,
        `“${table.unit}” of “${table.title}” is not a known unit.`,
      );
    table.keys.forEach((key, i) => checkKey(key, `${pointer}/keys/${i}`, table, findings));
    const wanted = table.keys.map(sizeOf).reduce((product, size) => product * size, 1);
    if (table.values.length !== wanted) {
      const message = `“${table.title}” has ${table.values.length} values, and its keys ask for ${wanted}.`;
      findings.error('table-shape', `${pointer}/values`, message);
    }
    const gaps = table.values.filter((value) => value === null).length;
    if (gaps) {
      const message = `“${table.title}” has ${gaps} empty cell${gaps === 1 ? '' : 's'}; a member that falls there is refused.`;
      findings.warning('table-gap', `${pointer}/values`, message);
    }
    const words = table.values.some((value) => typeof value === 'string');
    if (words && table.values.some((value) => typeof value === 'number')) {
      findings.error('table-mixed', `${pointer}/values`, `“${table.title}” mixes numbers and words.`);
    }
    if (words && table.keys.some(({ match }) => match === 'linear' || match === 'log')) {
      findings.error(
        'table-mixed',
        `${pointer}/values`,
        `“${table.title}” holds words, which can’t be interpolated.`,
      );
    }
    return !findings.list.slice(before).some(({ severity }) => severity === 'error');
  });
}

function checkKey(key: TableKey, pointer: string, { title }: Table, findings: Findings): void {
  const { match, points } = key;
  const say = (code: string, message: string) => {
    findings.error(code, `${pointer}/points`, `“${title}”, key “${key.title}”: ${message}`);
  };
  if (key.unit !== 'word' && !unitOf(key.unit)) {
    const message = `“${key.unit}” of “${title}”, key “${key.title}”, is not a known unit.`;
    findings.error('unknown-unit', `${pointer}/unit`, message);
  }
  if (match === 'exact') {
    if (points.includes(null)) say('table-key', 'a point is empty.');
    if (new Set(points).size !== points.length) say('table-duplicate-key', 'a point stands there twice.');
    if (new Set(points.map((point) => typeof point)).size > 1)
      say('table-key', 'words and numbers are mixed.');
    return;
  }
  const inner = match === 'band' ? points.slice(1, -1) : points;
  if (inner.includes(null)) say('table-key', 'only the outermost edges of bands can be open.');
  const numbers = points.filter((point) => point !== null);
  if (numbers.some((point) => typeof point !== 'number')) {
    say('table-key', 'numbers are needed.');
    return;
  }
  if (numbers.some((point, i) => i > 0 && (point as number) <= (numbers[i - 1] as number))) {
    say('table-order', 'the points have to rise, none twice.');
  }
  if (match === 'band') {
    if (points.length < 2) say('table-key', 'bands need two edges at least.');
    if (key.edge === undefined) {
      const message = `“${title}”, key “${key.title}”: say which band owns an edge, the one below or the one above.`;
      findings.error('table-edge', pointer, message);
    }
  }
  if (match === 'log' && numbers.some((point) => (point as number) <= 0)) {
    say('table-key', 'points have to be above 0 for a logarithm.');
  }
  if ((match === 'linear' || match === 'log') && points.length < 2)
    say('table-key', 'two points are needed to interpolate.');
}
