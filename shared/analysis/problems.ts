import type { AnalysisProblem, Beam, BeamLoad } from './types.ts';

/** More spans than any straight timber has; a bound on the work one member can ask for. */
export const MOST_SPANS = 50;

/** Everything wrong with the member itself. */
export function beamProblems({ spans, restraints, EI, GA }: Beam): AnalysisProblem[] {
  const problems: AnalysisProblem[] = [];
  if (spans.length === 0) problems.push({ code: 'no-span', message: 'A member needs at least one span.' });
  if (spans.length > MOST_SPANS) {
    problems.push({ code: 'too-many-spans', message: `A member has at most ${MOST_SPANS} spans.` });
  }
  spans.forEach((length, index) => {
    if (!(length > 0 && Number.isFinite(length))) {
      problems.push({ code: 'bad-length', message: `Span ${index + 1} needs a length above 0.`, index });
    }
  });
  if (!(EI > 0 && Number.isFinite(EI)) || (GA !== undefined && !(GA > 0 && Number.isFinite(GA)))) {
    problems.push({ code: 'bad-stiffness', message: 'The stiffness of the member has to be above 0.' });
  }
  if (restraints.length !== spans.length + 1) {
    problems.push({ code: 'bad-restraints', message: 'A member needs one support more than it has spans.' });
  }
  restraints.forEach((restraint, index) => {
    if (restraint === 'free' && index > 0 && index < restraints.length - 1) {
      const message = `Support ${index + 1} lies between spans and can't be free: join the two spans.`;
      problems.push({ code: 'bad-restraints', message, index });
    }
  });
  const held = restraints.filter((restraint) => restraint !== 'free').length;
  if (problems.length === 0 && held < 2 && !restraints.includes('fixed')) {
    problems.push({
      code: 'mechanism',
      message: 'The member would fall: it needs two supports, or one fixed end.',
    });
  }
  return problems;
}

/** Everything wrong with the loads. */
export function loadProblems(loads: readonly BeamLoad[], length: number): AnalysisProblem[] {
  const problems: AnalysisProblem[] = [];
  const trace = length * 1e-9;
  loads.forEach((load, index) => {
    const numbers =
      load.kind === 'line'
        ? [load.from, load.to, load.startIntensity, load.endIntensity]
        : [load.x, load.kind === 'point' ? load.force : load.moment];
    if (!numbers.every(Number.isFinite)) {
      problems.push({
        code: 'bad-load',
        message: `Load ${index + 1} has a value that is not a number.`,
        index,
      });
      return;
    }
    const [from, to] = load.kind === 'line' ? [load.from, load.to] : [load.x, load.x];
    if (load.kind === 'line' && !(to > from)) {
      problems.push({ code: 'bad-load', message: `Load ${index + 1} has to end after it starts.`, index });
    }
    if (from < -trace || to > length + trace) {
      problems.push({ code: 'load-outside', message: `Load ${index + 1} lies outside the member.`, index });
    }
  });
  return problems;
}
