import type { AnalysisProblem, Beam, BeamLoad } from './types.ts';

/** More spans than any straight timber has; a bound on the work one member can ask for. */
export const MOST_SPANS = 50;

/** Shorter than this share of the whole member, a span is a slip of the keyboard. */
const LEAST_SHARE = 1e-6;

/**
 * Sizes that can be analysed, in any units: far beyond any timber, yet such that fourth powers of lengths,
 * times loads, by stiffness, are still numbers to a machine.
 */
const SMALLEST = 1e-30;
const LARGEST = 1e30;

/** How far beyond an end a load may lie before it counts as outside, as a share of the member: rounding. */
const ROUNDING_SHARE = 1e-12;

/** Everything wrong with the member itself. */
export function beamProblems(beam: Beam): AnalysisProblem[] {
  const { spans, restraints, EI, GA } = beam;
  if (spans.length === 0) {
    return [{ code: 'no-span', message: 'The member has no span. Enter at least one.' }];
  }
  if (spans.length > MOST_SPANS) {
    const message = `The member has ${spans.length} spans; at most ${MOST_SPANS} can be analysed. Split it.`;
    return [{ code: 'too-many-spans', message }];
  }
  const problems = lengthProblems(spans);
  if (!isMeasure(EI)) {
    const message =
      'The bending stiffness EI of the member has to be a number above 0, of a size that can be built.';
    problems.push({ code: 'bad-stiffness', message });
  }
  if (GA !== undefined && !isMeasure(GA)) {
    const message =
      'The shear stiffness GA of the member has to be a number above 0, of a size that can be built.';
    problems.push({ code: 'bad-stiffness', message });
  }
  problems.push(...restraintProblems(beam));
  const held = restraints.filter((restraint) => restraint !== 'free').length;
  if (problems.length === 0 && held < 2 && !restraints.includes('fixed')) {
    const message = 'The member would fall or turn: give it two supports, or fix one end.';
    problems.push({ code: 'mechanism', message });
  }
  return problems;
}

function lengthProblems(spans: readonly number[]): AnalysisProblem[] {
  const problems: AnalysisProblem[] = [];
  let total = 0;
  for (const length of spans) total += isMeasure(length) ? length : 0;
  spans.forEach((length, index) => {
    if (!isMeasure(length)) {
      const message = `Span ${index + 1} has to have a length above 0, of a size that can be built.`;
      problems.push({ code: 'bad-length', message, index });
    } else if (length < total * LEAST_SHARE) {
      const message = `Span ${index + 1} is less than a millionth of the member. Check its length.`;
      problems.push({ code: 'bad-length', message, index });
    }
  });
  return problems;
}

function restraintProblems({ spans, restraints }: Beam): AnalysisProblem[] {
  if (restraints.length !== spans.length + 1) {
    const message = `A member of ${spans.length} spans has ${spans.length + 1} ends and supports; ${restraints.length} are given.`;
    return [{ code: 'bad-restraints', message }];
  }
  const problems: AnalysisProblem[] = [];
  restraints.forEach((restraint, index) => {
    if (restraint === 'free' && index > 0 && index < restraints.length - 1) {
      const message = `Support ${index + 1} lies between two spans and can't be free. Join the two spans, or support it.`;
      problems.push({ code: 'bad-restraints', message, index });
    }
  });
  return problems;
}

/** Everything wrong with the loads of a member of this length. */
export function loadProblems(loads: readonly BeamLoad[], length: number): AnalysisProblem[] {
  const problems: AnalysisProblem[] = [];
  const beyond = length * ROUNDING_SHARE;
  for (let index = 0; index < loads.length; index += 1) {
    const load = loads[index] as BeamLoad;
    if (!isSized(load)) {
      const message = `Load ${index + 1} has a place or a value that is not a number, or beyond all measure.`;
      problems.push({ code: 'bad-load', message, index });
      continue;
    }
    const from = load.kind === 'line' ? load.from : load.x;
    const to = load.kind === 'line' ? load.to : load.x;
    if (Math.min(from, to) < -beyond || Math.max(from, to) > length + beyond) {
      const message = `Load ${index + 1} reaches beyond the member, which is ${length} long.`;
      problems.push({ code: 'load-outside', message, index });
    } else if (load.kind === 'line' && !(to > from)) {
      const message = `Load ${index + 1} has to end after it starts. For a load at one place use a point load.`;
      problems.push({ code: 'bad-load', message, index });
    }
  }
  return problems;
}

function isSized(load: BeamLoad): boolean {
  if (load.kind === 'line') {
    return (
      Number.isFinite(load.from) &&
      Number.isFinite(load.to) &&
      isLoadValue(load.startIntensity) &&
      isLoadValue(load.endIntensity)
    );
  }
  return Number.isFinite(load.x) && isLoadValue(load.kind === 'point' ? load.force : load.moment);
}

function isMeasure(value: number): boolean {
  return value >= SMALLEST && value <= LARGEST;
}

function isLoadValue(value: number): boolean {
  return Math.abs(value) <= LARGEST;
}
