import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import { check, compile, curves, requiredDepth, verdict } from '#shared/engine/index.ts';
import { withDepth } from '#shared/engine/answers/sizing.ts';
import { testEdition, testMember } from '#tests/factories/edition.ts';
import { members } from '#tests/factories/members.ts';
import { planOf, testPlan } from '#tests/factories/plan.ts';

const plan = testPlan();

/** International yard and pound agreement, 1959. */
const INCH = 25.4;
const POUND = 4.4482216152605;

/** The same member written in inches and pounds. */
function inInchPound(member: Member): Member {
  const length = (mm: number) => mm / INCH;
  const numbers = (values: Readonly<Record<string, number>> | undefined) =>
    values && Object.fromEntries(Object.entries(values).map(([k, v]) => [k, length(v)]));
  return {
    ...member,
    units: 'inch-pound',
    section: { ...member.section, b: length(member.section.b), h: length(member.section.h) },
    spans: member.spans.map((span) => ({ length: length(span.length) })),
    supports: member.supports.map(({ restraint, bearing }) => ({
      restraint,
      ...(bearing === undefined ? {} : { bearing: length(bearing) }),
    })),
    ...(member.carries ? { carries: { ...member.carries, width: length(member.carries.width) } } : {}),
    inputs: numbers(member.inputs) ?? {},
    loads: member.loads.map((load): Member['loads'][number] => {
      switch (load.kind) {
        case 'area':
          // kN/m2 = 1000 N / (1000 mm)2, psf = lbf / (12 in)2
          return { ...load, intensity: ((load.intensity * 1000) / 1e6) * ((INCH * 12) ** 2 / POUND) };
        case 'line':
          return {
            ...load,
            start: (load.start * INCH * 12) / POUND,
            ...(load.end === undefined ? {} : { end: (load.end * INCH * 12) / POUND }),
            ...(load.from === undefined ? {} : { from: length(load.from) }),
            ...(load.to === undefined ? {} : { to: length(load.to) }),
          };
        case 'point':
          return { ...load, force: (load.force * 1000) / POUND, x: length(load.x) };
        default:
          return { ...load, moment: (load.moment * 1e6) / (POUND * INCH * 12), x: length(load.x) };
      }
    }),
  };
}

const near = (a: number | null, b: number | null, tolerance: number) =>
  a === null || b === null
    ? a === b
    : Math.abs(a - b) <= tolerance * Math.max(1e-6, Math.abs(a), Math.abs(b));

describe('the engine', () => {
  it('gives the same utilisations for a member in inches and pounds', () => {
    fc.assert(
      fc.property(members(plan.edition), (member) => {
        const byId = new Map(check(plan, inInchPound(member)).checks.map((each) => [each.id, each]));
        for (const { id, utilisation } of check(plan, member).checks) {
          expect([id, near(byId.get(id)?.utilisation ?? null, utilisation, 1e-8)]).toEqual([id, true]);
        }
      }),
      { numRuns: 150 },
    );
  });

  it('never finds a deeper section less stiff', () => {
    fc.assert(
      fc.property(members(plan.edition), fc.integer({ min: 1, max: 100 }), (member, deeper) => {
        const sag = (m: Member) =>
          verdict(bendingOnly, m).checks.find(({ id }) => id === 'live-sag')?.utilisation ?? 0;
        expect(sag(withDepth(member, member.section.h + deeper))).toBeLessThanOrEqual(
          sag(member) * (1 + 1e-9),
        );
      }),
      { numRuns: 100 },
    );
  });

  it('finds a least depth that passes, and none just above it fails', () => {
    fc.assert(
      fc.property(members(plan.edition), (member) => {
        const { all, byCheck } = requiredDepth(plan, member);
        for (const { rounded, exact } of [all, ...byCheck]) {
          expect(rounded === null).toBe(exact === null);
          if (rounded !== null && exact !== null) {
            expect(rounded).toBeGreaterThanOrEqual(exact);
            expect(rounded - exact).toBeLessThan(1);
          }
        }
        const { rounded } = all;
        if (rounded === null) return;
        expect(['passes', 'close']).toContain(verdict(plan, withDepth(member, rounded)).word);
        if (rounded > 1) {
          expect(['passes', 'close']).not.toContain(verdict(plan, withDepth(member, rounded - 1)).word);
        }
      }),
      { numRuns: 8 },
    );
  });

  it('answers absurd members with findings and without throwing', () => {
    const absurd = fc.oneof(
      fc.constantFrom(NaN, Infinity, -Infinity, 0, -1, 1e300, -1e300, 1e-300, 5e-324),
      fc.double(),
    );
    const part = fc.constantFrom(
      ['section', 'b'],
      ['section', 'h'],
      ['section', 'pieces'],
      ['spans', '0', 'length'],
      ['supports', '0', 'bearing'],
      ['slope'],
      ['carries', 'width'],
      ['loads', '0', 'intensity'],
      ['inputs', 'camber'],
      ['departures', '0', 'value'],
    );
    fc.assert(
      fc.property(fc.array(fc.tuple(part, absurd), { minLength: 1, maxLength: 3 }), (changes) => {
        const member = structuredClone(
          testMember({
            inputs: { camber: 1 },
            departures: [{ clause: 'depth', value: 1, reason: 'A trial.' }],
          }),
        );
        for (const [path, value] of changes) put(member, path, value);
        expectSane(check(plan, member));
        expect(curves(plan, member) === null || typeof curves(plan, member) === 'object').toBe(true);
      }),
      { numRuns: 1500 },
    );
  });

  it('answers editions with absurd values without a verdict made of nothing', () => {
    const value = fc.constantFrom(0, -1, 1e300, 1e-300, -1e300);
    const where = fc.constantFrom('E_mean', 'f_m', 'f_v', 'f_p', 'rho');
    fc.assert(
      fc.property(fc.dictionary(where, value, { minKeys: 1 }), members(plan.edition), (values, member) => {
        const edition = testEdition();
        const rows = edition.grades.rows.map((row) => ({ ...row, values: { ...row.values, ...values } }));
        const outcome = compile({ ...edition, grades: { ...edition.grades, rows } });
        if (outcome.ok) expectSane(check(outcome.plan, member));
      }),
      { numRuns: 200 },
    );
  });
});

const bendingOnly = planOf(withBendingOnly(testEdition()));

/**
 * Without self-weight, which grows with depth, and without shear deformation: under a couple near a support
 * that acts against the bending, and a deeper member can then sag more.
 */
function withBendingOnly(edition: Edition): Edition {
  const analysis = { ...edition.analysis };
  delete analysis.selfWeight;
  delete analysis.shearStiffness;
  return { ...edition, analysis };
}

function put(target: unknown, path: readonly string[], value: number): void {
  let node = target as Record<string, unknown>;
  for (const key of path.slice(0, -1)) node = node[key] as Record<string, unknown>;
  node[path[path.length - 1] as string] = value;
}

/** Every number finite, and no verdict where there is none to give. */
function expectSane(result: ReturnType<typeof check>): void {
  expect(JSON.stringify(result)).toBe(JSON.stringify(JSON.parse(JSON.stringify(result))));
  const visit = (node: unknown): void => {
    if (typeof node === 'number') expect(Number.isFinite(node)).toBe(true);
    else if (typeof node === 'object' && node !== null) Object.values(node).forEach(visit);
  };
  // Departures are repeated as they were typed.
  visit({ ...result, marks: result.marks.unverified });
  if (result.verdict.word === 'passes') expect(result.verdict.utilisation).toBeLessThanOrEqual(1);
  if (result.verdict.word === 'none') expect(result.verdict.because).toBeTruthy();
}
