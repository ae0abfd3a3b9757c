import { createContext, useContext } from 'react';
import { decimalSignOf, withDecimals, withDigits } from '#shared/units/format.ts';
import type { NumberFormat } from '#shared/units/quantity.ts';

/** How numbers are written for this person. */
export interface Numbers {
  locale: string;
  format: NumberFormat;
  decimals: (value: number, decimals: number) => string;
  digits: (value: number, digits: number) => string;
  /** As typed: exact, with the person's decimal sign. */
  exact: (value: number) => string;
}

const key = 'ledgerbeam.locale';

export function numbersFor(locale: string): Numbers {
  const decimal = decimalSignOf(locale);
  return {
    locale,
    format: { decimal },
    decimals: (value, decimals) => withDecimals(value, decimals, locale),
    digits: (value, digits) => withDigits(value, digits, locale),
    exact: (value) => String(value).replace('.', decimal),
  };
}

/** The locale chosen on this machine, else the browser's. */
export function localeChoice(): string {
  try {
    return localStorage.getItem(key) ?? navigator.language;
  } catch {
    return navigator.language;
  }
}

export function chooseLocale(locale: string | null): void {
  try {
    if (locale === null) localStorage.removeItem(key);
    else localStorage.setItem(key, locale);
  } catch {
    // Without storage the browser's locale stays.
  }
}

export const NumbersContext = createContext<Numbers>(numbersFor('en-GB'));

export function useNumbers(): Numbers {
  return useContext(NumbersContext);
}
