import type { Finding } from '#shared/engine/types.ts';

type More = Partial<Pick<Finding, 'clause' | 'case'>>;

/** Collects findings about an edition. */
export class Findings {
  readonly list: Finding[] = [];

  error(code: string, pointer: string, message: string, more: More = {}): void {
    this.list.push({ severity: 'error', code, message, pointer, in: 'edition', ...more });
  }

  warning(code: string, pointer: string, message: string, more: More = {}): void {
    this.list.push({ severity: 'warning', code, message, pointer, in: 'edition', ...more });
  }

  note(code: string, pointer: string, message: string, more: More = {}): void {
    this.list.push({ severity: 'note', code, message, pointer, in: 'edition', ...more });
  }

  get failed(): boolean {
    return this.list.some(({ severity }) => severity === 'error');
  }
}
