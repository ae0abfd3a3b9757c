import { caseOf } from '../assess/situation.ts';
import type { Standing } from '../assess/stand.ts';
import { verticalReaction } from '../run/builtIns.ts';
import type { SupportReaction } from '../types.ts';

/** State of the combinations that reactions are reported for. */
const STRENGTH = 'strength';

/** Largest and smallest reaction of each support, with what each action gives unfactored. */
export function reactionsOf({ context, combinations }: Standing): SupportReaction[] {
  const { situation, visitor, geometry, edition } = context;
  if (!situation || !visitor || !geometry) return [];
  const reactions = new Map<number, SupportReaction>();
  combinations.forEach((combination) => {
    if (combination.state !== STRENGTH || combination.problem) return;
    visitor.visit('support', combination, ({ node, x, value }) => {
      const vertical = verticalReaction(value, context);
      const found = { value: vertical, combination: combination.id };
      const known = reactions.get(node);
      if (!known) {
        reactions.set(node, {
          support: node,
          x,
          most: found,
          least: found,
          byAction: byAction(node),
          uplift: vertical < 0,
        });
        return;
      }
      if (vertical > known.most.value) known.most = found;
      if (vertical < known.least.value) known.least = found;
      known.uplift ||= vertical < 0;
    });
  });
  return [...reactions.values()].sort((a, b) => a.support - b.support);

  function byAction(node: number): Record<string, number> {
    return Object.fromEntries(
      (situation?.actions ?? []).map((effects) => [
        edition.actions[effects.action]?.id ?? '',
        verticalReaction(caseOf(effects, 0).reactions[node] as number, context),
      ]),
    );
  }
}
