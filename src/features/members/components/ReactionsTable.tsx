import type { Edition } from '#shared/basis/schema/index.ts';
import type { Result } from '#shared/engine/types.ts';
import { Section } from '#src/components/Section.tsx';
import { displayOf, shown } from '#src/drawings/display.ts';
import { useNumbers } from '#src/lib/format/locale.ts';

/** Reactions by support: by action unfactored, and the extremes of the strength combinations. */
export function ReactionsTable({ result, edition }: { result: Result; edition: Edition }) {
  const numbers = useNumbers();
  const display = displayOf(edition.unitSystem, numbers.decimals);
  const unit = display.force.unit;
  const value = (force: number) => numbers.decimals(force * display.force.factor, display.force.decimals);
  const actions = edition.actions.filter(({ id }) =>
    result.reactions.some(({ byAction }) => (byAction[id] ?? 0) !== 0),
  );
  const title = (id: string) => result.combinations.find((each) => each.id === id)?.title ?? id;
  return (
    <Section title="Reactions" note={`${unit}, upwards on the member; by action without factors`}>
      <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Reactions, table">
        <table className="w-full min-w-md text-sm">
          <thead>
            <tr className="border-b border-ink text-left text-xs text-soft">
              <th scope="col" className="py-1 font-normal">
                Support
              </th>
              <th scope="col" className="py-1 font-normal">
                At
              </th>
              {actions.map(({ id, title: name }) => (
                <th key={id} scope="col" className="py-1 pl-3 text-right font-normal">
                  {name}
                </th>
              ))}
              <th scope="col" className="py-1 pl-3 text-right font-normal">
                Largest
              </th>
              <th scope="col" className="py-1 pl-3 text-right font-normal">
                Smallest
              </th>
            </tr>
          </thead>
          <tbody>
            {result.reactions.map((reaction) => (
              <tr key={reaction.support} className="border-b border-rule">
                <th scope="row" className="py-1 text-left font-normal">
                  {reaction.support + 1}
                </th>
                <td className="py-1 font-mono tabular-nums">{shown(display, 'place', reaction.x)}</td>
                {actions.map(({ id }) => (
                  <td key={id} className="py-1 pl-3 text-right font-mono tabular-nums">
                    {value(reaction.byAction[id] ?? 0)}
                  </td>
                ))}
                <td
                  className="py-1 pl-3 text-right font-mono font-medium tabular-nums"
                  title={title(reaction.most.combination)}
                >
                  {value(reaction.most.value)}
                </td>
                <td
                  className="py-1 pl-3 text-right font-mono tabular-nums"
                  title={title(reaction.least.combination)}
                >
                  {value(reaction.least.value)}
                  {reaction.uplift && (
                    <span className="ml-2 font-sans font-semibold text-fail">▲ uplift, hold it down</span>
                  )}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Section>
  );
}
