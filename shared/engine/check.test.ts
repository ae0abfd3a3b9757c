import { describe, expect, it } from 'vitest';
import { testEdition, testMember } from '#tests/factories/edition.ts';
import { planOf, testPlan } from '#tests/factories/plan.ts';
import { check, drivers, findSections, nextInStock, requiredDepth, verify } from './index.ts';
import type { Member, Result } from './index.ts';

const plan = testPlan();
const of = (result: Result, id: string) => {
  const found = result.checks.find((each) => each.id === id);
  if (!found) throw new Error(`no check ${id}`);
  return found;
};
const entry = (result: Result, symbol: string) => {
  const found = result.ledger.find((each) => each.symbol === symbol);
  if (!found) throw new Error(`no entry ${symbol}`);
  return found;
};

/*
 * The joist of the factory worked by hand: 47 × 195 in T16 at 400 mm over 3.6 m, 0.35 kN/m2 permanent and
 * 1.5 kN/m2 imposed, self-weight 370 kg/m3.
 */
const g = 0.35 * 0.4 + (370 * 9.80665 * 47 * 195) / 1e9; // N/mm
const q = 1.5 * 0.4;
const L = 3600;

describe('check', () => {
  it('agrees with the joist worked by hand', () => {
    const result = check(plan, testMember());
    const W = (47 * 195 ** 2) / 6;
    const bending = of(result, 'bending');
    expect(bending.demand?.value).toBeCloseTo(((g + q) * L ** 2) / 8 / W, 9);
    const K_v = (3000 / 3600) ** 0.05 * (1 - q / (g + q) / 1000);
    expect(bending.limit?.value).toBeCloseTo(5.3 * 1.25 * (300 / 195) ** 0.11 * 1.1 * K_v, 9);
    const shear = of(result, 'shear');
    // A depth from the face of a 100 mm bearing.
    expect(shear.demand?.value).toBeCloseTo((1.5 * (g + q) * (L / 2 - 195 - 50)) / (47 * 195), 9);
    const bearing = of(result, 'bearing');
    expect(bearing.demand?.value).toBeCloseTo(((g + q) * L) / 2 / (47 * 100), 9);
    const EI = (8800 * 47 * 195 ** 3) / 12;
    const GA = ((8800 / 16) * 47 * 195 * 5) / 6;
    const line = 1.6 * g + 1.18 * q;
    const sag = (5 * line * L ** 4) / (384 * EI) + (line * L ** 2) / (8 * GA);
    expect(of(result, 'sag').demand?.value).toBeCloseTo(sag, 9);
    expect(of(result, 'sag').limit?.value).toBe(14.4);
    expect(result.verdict).toMatchObject({ word: 'passes', check: 'sag' });
    expect(result.verdict.utilisation).toBeCloseTo(sag / 14.4, 12);
  });

  it('writes out the combinations with durations and factors', () => {
    const { combinations } = check(plan, testMember());
    expect(combinations.map(({ id, title, duration }) => [id, title, duration])).toEqual([
      ['use/imposed', 'G + Q', 'medium'],
      ['use/dead', 'G', 'long'],
      ['sag/imposed', '1.6 G + 1.18 Q', 'medium'],
      ['live/imposed', 'Q', 'medium'],
    ]);
  });

  it('governs on utilisation, not on effect: permanent load alone in its own duration', () => {
    const heavy = testMember({
      loads: [
        { id: 'g', action: 'dead', kind: 'line', start: 1.2 },
        { id: 's', action: 'snow', kind: 'line', start: 0.4 },
      ],
    });
    const bending = of(check(plan, heavy), 'bending');
    expect(bending.governing.combination).toBe('use/dead');
    expect(bending.instances.map(({ combination }) => combination)).toEqual(['use/snow', 'use/dead']);
  });

  it('shows which case was taken and what it saw', () => {
    const K_h = entry(check(plan, testMember()), 'K_h');
    expect(K_h.choosing).toMatchObject({
      case: 'middle',
      tried: [
        {
          case: 'shallow',
          holds: false,
          evidence: { fact: 'h', operator: 'lessThanInclusive', value: 72, actual: 195, holds: false },
        },
        {
          case: 'middle',
          holds: true,
          evidence: { group: 'all', holds: true, of: [{ holds: true }, { holds: true }] },
        },
      ],
    });
    expect(K_h.substituted).toBe('(300 / 195)^0.11');
    expect(K_h.standing).toMatchObject({ source: 'made-up', standing: 'invented' });
  });

  it('fails where the edition refuses, with its reason', () => {
    const deep = testMember();
    deep.supports[0] = { restraint: 'pin', bearing: 100, inputs: { notch_depth: 120 } };
    const result = check(plan, deep);
    expect(result.verdict).toMatchObject({ word: 'fails', check: 'notch', utilisation: null });
    expect(of(result, 'notch')).toMatchObject({
      word: 'fails',
      refused: 'The notch takes more than half of the depth.',
    });
    expect(entry(result, 'K_n')).toMatchObject({
      value: null,
      refused: 'The notch takes more than half of the depth.',
    });
  });

  it('gives no verdict where something is missing, and says what', () => {
    const bare = testMember({ supports: [{ restraint: 'pin' }, { restraint: 'pin' }] });
    const result = check(plan, bare);
    expect(result.verdict.word).toBe('none');
    expect(result.verdict.because).toContain('no bearing length is given');
    expect(of(result, 'bending').word).toBe('passes');
    const unsaid = check(plan, testMember({ choices: {} }));
    expect(unsaid.verdict.because).toContain('Load sharing has not been chosen.');
  });

  it('gives no deflection where the grade has no stiffness, and everything else', () => {
    const edition = testEdition();
    const [first, ...others] = edition.grades.rows;
    if (!first) throw new Error('no grade');
    const values = { ...first.values };
    delete values['E_mean'];
    const rows = [{ ...first, values }, ...others];
    const result = check(planOf({ ...edition, grades: { ...edition.grades, rows } }), testMember());
    expect(of(result, 'sag')).toMatchObject({ word: 'none', utilisation: null });
    expect(result.verdict.because).toContain('Grade T16 has no mean modulus (E_mean)');
    expect(of(result, 'bending').word).toBe('passes');
  });

  it('asks for a load', () => {
    const edition = testEdition();
    const analysis = { ...edition.analysis };
    delete analysis.selfWeight;
    const { findings } = check(planOf({ ...edition, analysis }), testMember({ loads: [] }));
    expect(findings.map(({ code, pointer }) => [code, pointer])).toEqual([['no-load', '/loads']]);
  });

  it('lets a departure stand in for a clause, with both values and the reason', () => {
    const departed = testMember({
      departures: [{ clause: 'depth', value: 1, reason: 'Tested in our shop.', approvedBy: 'A. Checker' }],
    });
    const result = check(plan, departed);
    expect(entry(result, 'K_h')).toMatchObject({
      value: 1,
      departure: { reason: 'Tested in our shop.', approvedBy: 'A. Checker' },
      in: 'member',
      pointer: '/departures/0',
    });
    expect(entry(result, 'K_h').departure?.stored).toBeCloseTo((300 / 195) ** 0.11, 12);
    expect(entry(result, 'K_h').formula).toBeUndefined();
    expect(result.marks.departures).toEqual(departed.departures);
  });

  it('reports reactions and uplift by support and action', () => {
    const windy = testMember({
      loads: [...testMember().loads, { id: 'w', action: 'wind', kind: 'line', start: -1 }],
    });
    const { reactions } = check(plan, windy);
    expect(reactions[0]).toMatchObject({ support: 0, x: 0, uplift: true });
    expect(reactions[0]?.byAction['imposed']).toBeCloseTo((q * L) / 2, 9);
    expect(reactions[0]?.least.value).toBeCloseTo(((0.9 * g - 1.2) * L) / 2, 9);
    expect(of(check(plan, windy), 'uplift').demand?.value).toBeCloseTo(((1.2 - 0.9 * g) * L) / 2, 9);
  });

  it('places a patterned action span by span', () => {
    const pin = { restraint: 'pin', bearing: 100 } as const;
    const twoSpans = testMember({
      spans: [{ length: L }, { length: L }],
      supports: [pin, pin, pin],
      loads: [{ id: 'q', action: 'imposed', kind: 'line', start: 1 }],
    });
    const edition = testEdition();
    const { span, bendingStiffness, shear, closeFrom } = edition.analysis;
    const bare = planOf({ ...edition, analysis: { span, bendingStiffness, shear, closeFrom } });
    const result = check(bare, twoSpans);
    expect(of(result, 'bending').governing.place).toContain('hogging');
    // Two equal spans under an even load: wL²/8 over the support with both loaded; the end reaction is
    // 7/16 wL with one loaded, 3/8 wL with both (handbook values, common practice).
    expect(entry(result, 'M_Q').value).toBeCloseTo(-(L ** 2) / 8, 3);
    expect(result.reactions[0]?.most.value).toBeCloseTo((7 / 16) * L, 6);
    expect(result.reactions[0]?.byAction['imposed']).toBeCloseTo((3 / 8) * L, 6);
  });

  it.each<[string, Partial<Member>, string, string]>([
    ['an unknown grade', { grade: 'C99' }, 'unknown-grade', '/grade'],
    ['an unknown option', { choices: { sharing: 'maybe' } }, 'unknown-option', '/choices/sharing'],
    [
      'an unknown choice',
      { choices: { sharing: 'shared', colour: 'red' } },
      'unknown-choice',
      '/choices/colour',
    ],
    ['a zero depth', { section: { b: 47, h: 0, pieces: 1 } }, 'bad-length', '/section/h'],
    ['a span too many', { spans: [{ length: 1000 }, { length: 1000 }] }, 'supports-count', '/supports'],
    [
      'a free end between spans',
      {
        spans: [{ length: 1000 }, { length: 1000 }],
        supports: [{ restraint: 'fixed' }, { restraint: 'free' }, { restraint: 'pin' }],
      },
      'free-inside',
      '/supports/1/restraint',
    ],
    ['a mechanism', { supports: [{ restraint: 'pin' }, { restraint: 'free' }] }, 'mechanism', '/supports'],
    ['a load on a width that is not given', { carries: undefined }, 'width-missing', '/carries'],
    [
      'a load outside the member',
      { loads: [{ id: 'p', action: 'dead', kind: 'point', force: 1, x: 9000 }] },
      'load-outside',
      '/loads/0/x',
    ],
    [
      'an unknown action',
      { loads: [{ id: 'p', action: 'rain', kind: 'line', start: 1 }] },
      'unknown-action',
      '/loads/0/action',
    ],
    ['an input out of its bounds', { inputs: { camber: 80 } }, 'input-out-of-bounds', '/inputs/camber'],
    [
      'a departure from nothing',
      { departures: [{ clause: 'luck', value: 2, reason: 'Why not.' }] },
      'unknown-clause',
      '/departures/0/clause',
    ],
    [
      'clear spans without bearings',
      { spanMeasured: 'clear', supports: [{ restraint: 'pin' }, { restraint: 'pin' }] },
      'bearing-missing',
      '/supports/0/bearing',
    ],
  ])('finds %s', (_, change, code, pointer) => {
    const member = { ...testMember(), ...change } as Member;
    const { verdict, findings } = check(plan, member);
    expect(verdict.word).toBe('none');
    expect(findings).toContainEqual(
      expect.objectContaining({ code, pointer, in: 'member', severity: 'error' }),
    );
  });
});

describe('answers', () => {
  it('give the least depth by each check and by all', () => {
    const { byCheck, all, unit } = requiredDepth(plan, testMember());
    expect(unit).toBe('mm');
    const sag = byCheck.find(({ check: id }) => id === 'sag');
    expect(all.exact).toBe(sag?.exact);
    expect(all.rounded).toBe(Math.ceil(all.exact ?? 0));
    const ratio = byCheck.find(({ check: id }) => id === 'ratio');
    expect(ratio?.why).toContain('Deeper than 329 it fails again');
  });

  const stock = [47, 63].flatMap((b) =>
    [145, 170, 195, 220].map((h) => ({
      id: `${String(b)}x${String(h)}`,
      nominal: { b: b + 3, h: h + 5 },
      actual: { b, h },
      pricePerMetre: b * h * 0.001,
    })),
  );

  it('give the next section in stock', () => {
    const found = nextInStock(plan, testMember(), stock);
    expect(found?.actual).toEqual({ b: 47, h: 170 });
    expect(nextInStock(plan, testMember({ section: { b: 50, h: 100, pieces: 1 } }), stock)).toBeNull();
  });

  it('rank the sections and grades that pass', () => {
    const byVolume = findSections(plan, testMember(), { stock, rank: 'volume' });
    expect(byVolume.length).toBeGreaterThan(0);
    const areas = byVolume.map(({ area }) => area);
    expect(areas).toEqual([...areas].sort((a, b) => a - b));
    const byDepth = findSections(plan, testMember(), { stock, rank: 'depth', grades: ['H40'] });
    expect(byDepth.every(({ grade }) => grade === 'H40')).toBe(true);
  });

  it('rank what drives the governing utilisation', () => {
    const found = drivers(plan, testMember());
    const depth = found.find(({ symbol, kind }) => symbol === 'h' && kind === 'input');
    // Bending part of the sag goes with h⁻³, the shear part with h⁻¹, self-weight with h.
    expect(depth?.effect).toBeLessThan(-2.5);
    expect(depth?.effect).toBeGreaterThan(-3);
    const creep = found.find(({ symbol }) => symbol === 'k_creep');
    expect(creep?.kind).toBe('factor');
    expect(creep?.effect).toBeGreaterThan(0.611);
  });

  it('verify a stored result byte for byte', () => {
    const edition = testEdition();
    const stored = JSON.parse(JSON.stringify(check(planOf(edition), testMember()))) as Result;
    expect(verify(edition, testMember(), stored)).toEqual({ same: true, differences: [] });
    const forged = { ...stored, verdict: { ...stored.verdict, utilisation: 0.1 } };
    const { same, differences } = verify(edition, testMember(), forged);
    expect(same).toBe(false);
    expect(differences[0]).toContain('/verdict/utilisation: 0.1 is stored');
  });
});
