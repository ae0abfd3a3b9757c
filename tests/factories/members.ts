import fc from 'fast-check';
import type { Edition, Member } from '#shared/basis/schema/index.ts';

type Load = Member['loads'][number];

const whole = (min: number, max: number) => fc.integer({ min, max });
const tenth = (min: number, max: number) => whole(min * 10, max * 10).map((n) => n / 10);

/** Random members with sensible numbers on an edition: one to four spans, overhangs, all kinds of load. */
export function members(edition: Edition): fc.Arbitrary<Member> {
  const actions = edition.actions.map(({ id }) => id);
  const choices = edition.choices.filter(({ scope }) => scope !== 'grade');
  const grades = edition.grades.rows.map(({ id }) => id);
  const metric = edition.unitSystem === 'metric';
  const size = metric ? 1 : 1 / 25;
  return fc
    .record({
      spans: fc.array(whole(8, 60), { minLength: 1, maxLength: 4 }),
      ends: fc.constantFrom('pins', 'fixed', 'overhang', 'cantilever'),
      bearing: whole(4, 20),
      grade: fc.constantFrom(...grades),
      b: whole(38, 150),
      h: whole(80, 400),
      pieces: whole(1, 3),
      slope: fc.constantFrom(0, 0, 0, 20, 35),
      by: fc.constantFrom('spacing' as const, 'tributary' as const),
      clear: fc.boolean(),
      picks: fc.array(whole(0, 99), { minLength: choices.length, maxLength: choices.length }),
      loads: fc.array(
        fc.record({
          action: fc.constantFrom(...actions),
          kind: fc.constantFrom('area', 'line', 'part', 'point', 'couple'),
          size: tenth(-1, 3),
          at: fc.double({ min: 0.05, max: 0.95, noNaN: true }),
          direction: fc.constantFrom('plan' as const, 'slope' as const, 'normal' as const),
        }),
        { maxLength: 5 },
      ),
    })
    .map((raw): Member => {
      const spans = raw.spans.map((n) => ({ length: n * 100 * size }));
      const total = spans.reduce((sum, { length }) => sum + length, 0);
      const supports = restraints(raw.ends, spans.length).map((restraint) => ({
        restraint,
        ...(restraint === 'free' ? {} : { bearing: raw.bearing * 10 * size }),
      }));
      return {
        schema: 'member/1',
        mark: 'R1',
        units: edition.unitSystem,
        choices: Object.fromEntries(
          choices.map(({ symbol, options }, i) => [
            symbol,
            options[(raw.picks[i] ?? 0) % options.length]?.id ?? '',
          ]),
        ),
        grade: raw.grade,
        section: { b: raw.b * size, h: raw.h * size, pieces: raw.pieces },
        spanMeasured: raw.clear ? 'clear' : 'centres',
        spans,
        supports,
        ...(raw.slope ? { slope: raw.slope } : {}),
        carries: { by: raw.by, width: 450 * size },
        loads: raw.loads.map((load, i) => loadOf(load, i, total, metric)),
        inputs: {},
        departures: [],
      };
    });
}

function restraints(ends: string, spans: number): ('pin' | 'fixed' | 'free')[] {
  const nodes = Array.from({ length: spans + 1 }, () => 'pin' as 'pin' | 'fixed' | 'free');
  if (ends === 'fixed') nodes[0] = 'fixed';
  if (ends === 'overhang' && spans > 1) nodes[spans] = 'free';
  if (ends === 'cantilever') {
    nodes[0] = 'fixed';
    nodes[spans] = 'free';
  }
  return nodes;
}

function loadOf(
  load: {
    action: string;
    kind: string;
    size: number;
    at: number;
    direction: 'plan' | 'slope' | 'normal';
  },
  index: number,
  total: number,
  metric: boolean,
): Load {
  const { action, direction, at } = load;
  const head = { id: `l${String(index)}`, action, direction };
  const scale = metric ? 1 : 20;
  const amount = load.size * scale;
  switch (load.kind) {
    case 'area':
      return { ...head, kind: 'area', intensity: amount };
    case 'line':
      return { ...head, kind: 'line', start: amount };
    case 'part':
      return {
        ...head,
        kind: 'line',
        start: amount,
        end: amount / 2,
        from: total * at * 0.5,
        to: total * at,
      };
    case 'point':
      return { ...head, kind: 'point', force: amount, x: total * at };
    default:
      return { ...head, kind: 'couple', moment: amount / 4, x: total * at };
  }
}
