import { useState } from 'react';
import { millimetresPerInch } from '#shared/units/units.ts';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { Curves, Result } from '#shared/engine/types.ts';
import { Section } from '#src/components/Section.tsx';
import { displayOf, shown } from '#src/drawings/display.ts';
import { MemberStrip } from '#src/drawings/MemberStrip.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { stripLoads } from '../lib/stripLoads.ts';
import { useWidth } from './useWidth.ts';

interface StripPanelProps {
  member: Member;
  edition: Edition;
  result: Result;
  curves: Curves;
}

/** The member strip with the choice of combination; the envelope of all is the default. */
export function StripPanel({ member, edition, result, curves }: StripPanelProps) {
  const numbers = useNumbers();
  const [combination, setCombination] = useState<string | null>(null);
  const [holder, width] = useWidth<HTMLDivElement>(760);
  const display = displayOf(edition.unitSystem, numbers.decimals);
  const length = curves.x[curves.x.length - 1] ?? 1;
  // The member's lengths in the edition's unit.
  const scale =
    member.units === edition.unitSystem
      ? 1
      : member.units === 'metric'
        ? 1 / millimetresPerInch
        : millimetresPerInch;
  const loads = stripLoads(member, edition, length / scale, (value) => numbers.digits(value, 3)).map(
    (load) =>
      load.kind === 'line'
        ? { ...load, from: load.from * scale, to: load.to * scale }
        : { ...load, x: load.x * scale },
  );
  const supports = result.reactions.map((reaction) => ({
    x: reaction.x,
    restraint: member.supports[reaction.support]?.restraint ?? ('pin' as const),
    reaction: shown(display, 'force', reaction.most.value),
  }));
  const limit = result.checks.find(({ at, limit: own }) => at === 'deflection' && own)?.limit;
  const known = combination !== null && curves.byCombination[combination] ? combination : null;
  return (
    <Section
      title="Member strip"
      note={
        known ? 'one combination, all spans loaded' : `envelope of ${result.combinations.length} combinations`
      }
      actions={
        <label className="flex items-center gap-2 text-soft">
          Show
          <select
            value={known ?? ''}
            onChange={(event) => setCombination(event.target.value === '' ? null : event.target.value)}
            className="rounded border border-pencil bg-raised px-2 py-0.5 text-sm text-ink"
          >
            <option value="">the envelope</option>
            {result.combinations.map(({ id, title, state }) => (
              <option key={id} value={id}>
                {title} ({state})
              </option>
            ))}
          </select>
        </label>
      }
    >
      <div ref={holder}>
        <MemberStrip
          width={width}
          length={length}
          supports={supports}
          loads={loads}
          curves={curves}
          combination={known}
          display={display}
          {...(limit ? { deflectionNote: `of ${shown(display, 'deflection', limit.value)} allowed` } : {})}
        />
      </div>
    </Section>
  );
}
