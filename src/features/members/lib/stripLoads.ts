import type { Edition, LoadInput, Member } from '#shared/basis/schema/index.ts';
import type { StripLoad } from '#src/drawings/LoadRow.tsx';
import { unitForReading } from '#shared/units/format.ts';
import { unitsOf } from './units.ts';

type Say = (value: number) => string;

/**
 * Loads as they are drawn: places in the member's own length unit, labels with value, unit and action.
 * Area loads are drawn as the line loads that they become.
 */
export function stripLoads(member: Member, edition: Edition, length: number, say: Say): StripLoad[] {
  const units = unitsOf(member);
  // Area loads are per square metre or foot, line loads per metre or foot; widths in mm or inches.
  const perWidth = member.units === 'metric' ? 1e-3 : 1 / 12;
  const width = member.carries?.width ?? 0;
  const name = (load: LoadInput) =>
    edition.actions.find(({ id }) => id === load.action)?.title.toLowerCase() ?? load.action;
  return member.loads.map((load): StripLoad => {
    const label = (value: number, unit: string) => `${name(load)} ${say(value)} ${unitForReading(unit)}`;
    if (load.kind === 'point')
      return { kind: 'point', x: load.x, force: load.force, label: label(load.force, units.force) };
    if (load.kind === 'couple')
      return { kind: 'couple', x: load.x, moment: load.moment, label: label(load.moment, units.couple) };
    const from = load.from ?? 0;
    const to = Math.min(load.to ?? length, length);
    if (load.kind === 'area') {
      const line = load.intensity * width * perWidth;
      return { kind: 'line', from, to, start: line, end: line, label: label(line, units.line) };
    }
    const end = load.end ?? load.start;
    const text =
      end === load.start
        ? label(end, units.line)
        : `${name(load)} ${say(load.start)} to ${say(end)} ${unitForReading(units.line)}`;
    return { kind: 'line', from, to, start: load.start, end, label: text };
  });
}
