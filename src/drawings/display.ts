import type { Edition } from '#shared/basis/schema/index.ts';

/** How a coherent value is shown: multiplied by `factor` and labelled with `unit`. */
export interface DisplayUnit {
  factor: number;
  unit: string;
  /** Decimals for reading; the ledger keeps the exact value. */
  decimals: number;
}

/** Units in which the drawings speak. */
export interface Display {
  place: DisplayUnit;
  force: DisplayUnit;
  moment: DisplayUnit;
  deflection: DisplayUnit;
  /** Formats a number already in the shown unit, by the person's locale. */
  number: (value: number, decimals: number) => string;
}

type Units = Omit<Display, 'number'>;

const metric: Units = {
  place: { factor: 1e-3, unit: 'm', decimals: 2 },
  force: { factor: 1e-3, unit: 'kN', decimals: 2 },
  moment: { factor: 1e-6, unit: 'kN m', decimals: 2 },
  deflection: { factor: 1, unit: 'mm', decimals: 1 },
};

const inchPound: Units = {
  place: { factor: 1 / 12, unit: 'ft', decimals: 2 },
  force: { factor: 1, unit: 'lbf', decimals: 0 },
  moment: { factor: 1 / 12, unit: 'lbf ft', decimals: 0 },
  deflection: { factor: 1, unit: 'in', decimals: 3 },
};

/** Display units of an edition's unit system with a number format. */
export function displayOf(
  unitSystem: Edition['unitSystem'],
  number: (value: number, decimals: number) => string,
): Display {
  return { ...(unitSystem === 'metric' ? metric : inchPound), number };
}

/** "2.31 kN": a coherent value as shown, with its unit. */
export function shown(display: Display, of: keyof Units, coherent: number): string {
  const { factor, unit, decimals } = display[of];
  return `${display.number(coherent * factor, decimals)} ${unit}`;
}
