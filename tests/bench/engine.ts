import { testMember } from '#tests/factories/edition.ts';
import { testPlan } from '#tests/factories/plan.ts';
import { check, requiredDepth, sectionSearch, type StockSection, verdict } from '#shared/engine/index.ts';
import { byHand } from './byHand.ts';
import { benchMembers } from './members.ts';
import { Sheet } from './sheet.ts';

/*
 * npm run bench: what the engine costs, as ratios within one run against the same checks written by hand
 * and as a spreadsheet. Medians of several rounds, taken in turn so that a busy machine hurts all alike.
 */

const plan = testPlan();
const ROUNDS = 15;

/** Microseconds of one call, for each of several ways; median of rounds. */
function timed(ways: readonly (() => unknown)[], calls: number): number[] {
  const found = ways.map((): number[] => []);
  for (let round = 0; round < ROUNDS + 3; round += 1) {
    ways.forEach((way, i) => {
      const start = performance.now();
      for (let call = 0; call < calls; call += 1) way();
      // The first rounds warm up.
      if (round >= 3) found[i]?.push(((performance.now() - start) * 1000) / calls);
    });
  }
  return found.map((times) => times.sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? NaN);
}

const say = (text: string) => process.stdout.write(`${text}\n`);
const us = (value: number) => `${value.toFixed(0)} µs`.padStart(9);
const ratio = (value: number) => value.toFixed(2).padStart(6);

say('member                             verdict   by hand  ratio     sheet  ratio    ledger  ratio');
for (const [name, member] of benchMembers) {
  const hand = byHand(member);
  const ids = {
    bending: 'bending',
    shear: 'shear',
    bearing: 'bearing',
    sag: 'sag',
    liveSag: 'live-sag',
    ratio: 'ratio',
  };
  const engine = new Map(verdict(plan, member).checks.map(({ id, utilisation }) => [id, utilisation ?? NaN]));
  for (const [key, id] of Object.entries(ids)) {
    const own = hand[key as keyof typeof hand];
    const other = engine.get(id) ?? 0;
    if (Math.abs(own - other) > 1e-9 * Math.max(own, other)) {
      throw new Error(`${name}: ${id} is ${String(other)}, by hand ${String(own)}`);
    }
  }
  // Each recalculation has a change to work on.
  let turn = 0;
  const moved = [member, { ...member, section: { ...member.section, h: member.section.h + 1 } }];
  const sheet = new Sheet(plan, moved);
  const governing = verdict(plan, member).utilisation ?? NaN;
  if (Math.abs(sheet.of(0) - governing) > 1e-9) {
    throw new Error(`${name}: ${String(governing)}, in the sheet ${String(sheet.of(0))}`);
  }
  const next = () => moved[(turn += 1) % 2] ?? member;
  const [quick = NaN, plain = NaN, cells = NaN, full = NaN] = timed(
    [() => verdict(plan, next()), () => byHand(next()), () => sheet.next(), () => check(plan, next())],
    member.spans.length > 1 ? 20 : 100,
  );
  say(
    `${name.padEnd(32)} ${us(quick)} ${us(plain)} ${ratio(quick / plain)} ${us(cells)} ${ratio(quick / cells)} ${us(full)} ${ratio(full / quick)}`,
  );
}

const stock = Array.from({ length: 80 }, (_, i): StockSection => {
  const b = [38, 47, 63, 75, 100][i % 5] ?? 47;
  const h = 97 + 25 * Math.floor(i / 5);
  return { id: `${String(b)}x${String(h)}`, nominal: { b: b + 3, h: h + 3 }, actual: { b, h } };
});
const grades = Array.from({ length: 8 }, (_, i) => plan.edition.grades.rows[i % 3]?.id ?? '');
for (const [name, member] of benchMembers.slice(0, 1).concat(benchMembers.slice(4, 5))) {
  let longest = 0;
  const run = () => {
    const search = sectionSearch(plan, member, { stock, grades, rank: 'volume' });
    let before = performance.now();
    for (let step = search.next(); !step.done; step = search.next()) {
      longest = Math.max(longest, performance.now() - before);
      before = performance.now();
    }
  };
  const [time = NaN] = timed([run], 1);
  say(
    `finder, 80 sections × 8 grades, ${name}: ${(time / 1000).toFixed(0)} ms, longest step ${longest.toFixed(1)} ms`,
  );
}
const [depth = NaN] = timed([() => requiredDepth(plan, testMember())], 1);
say(`least depth, ${benchMembers[0]?.[0] ?? ''}: ${(depth / 1000).toFixed(0)} ms`);

for (const count of [100, 1000, 10_000]) {
  const start = performance.now();
  for (let i = 0; i < count; i += 1) {
    verdict(plan, testMember({ section: { b: 47, h: 150 + (i % 100), pieces: 1 } }));
  }
  say(`${String(count).padStart(6)} members: ${us(((performance.now() - start) * 1000) / count)} each`);
}
