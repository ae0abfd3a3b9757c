import type { Edition } from '#shared/basis/schema/index.ts';
import { inputUnit } from '../lib/units.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { Group, GroupAction } from './Group.tsx';
import { QuantityField } from './QuantityField.tsx';
import { useTools } from './SheetContext.ts';

/** How it is held and used: the edition's own choices and inputs, whatever they are. */
export function HeldGroup({ projectChoices }: { projectChoices: Readonly<Record<string, string>> }) {
  const { member, edition } = useTools();
  return (
    <Group title="How it is held and used">
      {edition.choices
        .filter(({ scope }) => scope !== 'grade')
        .map((choice) => (
          <ChoiceField
            key={choice.symbol}
            label={choice.title}
            pointer={`/choices/${choice.symbol}`}
            options={choice.options}
            otherwise={inherited(choice, projectChoices)}
            note={
              choice.scope === 'project' && member.choices[choice.symbol] !== undefined
                ? 'differs from the project'
                : undefined
            }
          />
        ))}
      {edition.inputs
        .filter(({ scope }) => scope === 'member')
        .map((input) => (
          <QuantityField
            key={input.symbol}
            label={input.title}
            pointer={`/inputs/${input.symbol}`}
            unit={inputUnit(input, member)}
            empty={input.default === undefined ? 'none' : String(input.default)}
            {...(input.minimum === undefined ? {} : { least: input.minimum })}
            {...(input.maximum === undefined ? {} : { most: input.maximum })}
          />
        ))}
    </Group>
  );
}

/** What is taken when the member chooses nothing: the project's option, else the edition's default. */
function inherited(
  choice: Edition['choices'][number],
  projectChoices: Readonly<Record<string, string>>,
): string | undefined {
  const ofProject = choice.scope === 'project' ? projectChoices[choice.symbol] : undefined;
  const option = choice.options.find(({ id }) => id === (ofProject ?? choice.default));
  if (!option) return undefined;
  return ofProject === undefined ? `${option.title} (usual)` : `${option.title} (project)`;
}

/** Departures: a clause's value set by hand for this member, with the reason. */
export function DeparturesGroup() {
  const { member, edition, readOnly, send } = useTools();
  const clauses = edition.clauses
    .filter(({ kind }) => kind !== 'class')
    .map(({ id, title, symbol }) => ({ id, title: `${title} (${symbol})` }));
  const add = () => {
    const free = clauses.find(({ id }) => !member.departures.some(({ clause }) => clause === id));
    if (free) {
      send({
        kind: 'set',
        pointer: `/departures/${member.departures.length}`,
        value: { clause: free.id, value: 1, reason: 'Reason to be given' },
      });
    }
  };
  return (
    <Group
      title="Departures"
      actions={!readOnly && <GroupAction label="Depart from a clause" onClick={add} />}
    >
      {member.departures.length === 0 && (
        <p className="py-1.5 text-sm text-soft">None: every value is the edition’s.</p>
      )}
      {member.departures.map((departure, index) => (
        <div key={index} className="mt-1">
          <ChoiceField label="Clause" pointer={`/departures/${index}/clause`} options={clauses} />
          <QuantityField label="Value instead" pointer={`/departures/${index}/value`} unit="1" />
          <div className="border-b border-rule py-1">
            {readOnly ? (
              <p className="text-sm">{departure.reason}</p>
            ) : (
              <textarea
                aria-label={`Reason for the departure from ${departure.clause}`}
                value={departure.reason}
                rows={2}
                maxLength={2000}
                onChange={(event) =>
                  event.target.value !== '' &&
                  send({ kind: 'set', pointer: `/departures/${index}/reason`, value: event.target.value })
                }
                className="w-full rounded border border-pencil bg-raised px-2 py-1 text-sm"
              />
            )}
            {!readOnly && (
              <GroupAction
                label="Take back"
                about={`Take back the departure from ${departure.clause}`}
                onClick={() => send({ kind: 'set', pointer: `/departures/${index}`, value: undefined })}
              />
            )}
          </div>
        </div>
      ))}
    </Group>
  );
}
