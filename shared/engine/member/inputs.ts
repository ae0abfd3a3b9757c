import type { Input } from '#shared/basis/schema/index.ts';
import type { Place } from '../assess/places.ts';
import type { Runtime } from '../run/runtime.ts';
import type { Finding } from '../types.ts';
import type { Given } from './given.ts';
import { systemFactor } from './units.ts';

/** Inputs outside the bounds that the edition sets for them, each at its place. */
export function inputProblems(runtime: Runtime, given: Given): Finding[] {
  const findings: Finding[] = [];
  runtime.edition.inputs.forEach((input, index) => {
    const look = (values: Readonly<Record<string, number>> | undefined, pointer: string) => {
      if (!values || !Object.hasOwn(values, input.symbol)) return;
      const value = (values[input.symbol] as number) * memberFactor(runtime, given, index);
      const own = value / (runtime.inputFactors[index] as number);
      const bound = brokenBound(input, own);
      if (bound === null) return;
      findings.push({
        severity: 'error',
        code: 'input-out-of-bounds',
        message: `${input.title} is ${bound}.`,
        pointer: `${pointer}/${input.symbol}`,
        in: 'member',
      });
    };
    if (input.scope === 'member') look(given.member.inputs, '/inputs');
    else if (input.scope === 'span') {
      given.member.spans.forEach(({ inputs }, i) => {
        look(inputs, `/spans/${i}/inputs`);
      });
    } else {
      given.member.supports.forEach(({ inputs }, i) => {
        look(inputs, `/supports/${i}/inputs`);
      });
    }
  });
  return findings;
}

/** Rounding of a change of units is no breach of a bound. */
const SLACK = 1e-9;

function brokenBound({ minimum, maximum, unit }: Input, value: number): string | null {
  const suffix = unit === '1' ? '' : ` ${unit}`;
  const slack = SLACK * Math.max(1, Math.abs(value));
  if (minimum !== undefined && value < minimum - slack) return `at least ${String(minimum)}${suffix}`;
  if (maximum !== undefined && value > maximum + slack) return `at most ${String(maximum)}${suffix}`;
  return null;
}

/** From the coherent units of the member document to those of the edition. */
function memberFactor(runtime: Runtime, given: Given, input: number): number {
  const slot = runtime.slotOf.get(runtime.edition.inputs[input]?.symbol ?? '');
  if (slot === undefined) return 1;
  return systemFactor(given.member.units, runtime.edition.unitSystem, runtime.powersOf(slot));
}

/** Value of an input where the evaluation stands, in the edition's units; null where it is missing. */
export function inputAt(runtime: Runtime, given: Given, index: number, place: Place | null): number | null {
  const input = runtime.edition.inputs[index];
  if (!input) return null;
  const values =
    input.scope === 'member'
      ? given.member.inputs
      : input.scope === 'span'
        ? given.member.spans[place?.span ?? -1]?.inputs
        : given.member.supports[place?.node ?? -1]?.inputs;
  if (values && Object.hasOwn(values, input.symbol)) {
    return (values[input.symbol] as number) * memberFactor(runtime, given, index);
  }
  // A span or support input has no default where there is no span or support.
  if (input.scope === 'span' && !place) return null;
  if (input.scope === 'support' && (place?.node ?? -1) < 0) return null;
  return input.default === undefined ? null : input.default * (runtime.inputFactors[index] as number);
}
