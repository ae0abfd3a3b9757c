import type { LoadInput } from '#shared/basis/schema/index.ts';
import { unitsOf } from '../lib/units.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { Group, GroupAction } from './Group.tsx';
import { QuantityField } from './QuantityField.tsx';
import { useTools } from './SheetContext.ts';

const kinds: { id: LoadInput['kind']; title: string }[] = [
  { id: 'area', title: 'over an area' },
  { id: 'line', title: 'along the member' },
  { id: 'point', title: 'at a point' },
  { id: 'couple', title: 'couple' },
];
const directions = [
  { id: 'plan', title: 'vertical, per length on plan' },
  { id: 'slope', title: 'vertical, per length on the slope' },
  { id: 'normal', title: 'square to the member' },
];

/** The same load as another kind: what both have is kept. */
function asKind(load: LoadInput, kind: LoadInput['kind']): LoadInput {
  const { id, action, title, direction, origin } = load;
  const common = {
    id,
    action,
    ...(title === undefined ? {} : { title }),
    ...(direction === undefined ? {} : { direction }),
    ...(origin === undefined ? {} : { origin }),
  };
  const size =
    load.kind === 'area'
      ? load.intensity
      : load.kind === 'line'
        ? load.start
        : load.kind === 'point'
          ? load.force
          : load.moment;
  const place = load.kind === 'point' || load.kind === 'couple' ? load.x : 0;
  switch (kind) {
    case 'area':
      return { ...common, kind, intensity: size };
    case 'line':
      return { ...common, kind, start: size };
    case 'point':
      return { ...common, kind, force: size, x: place };
    case 'couple':
      return { ...common, kind, moment: size, x: place };
  }
}

/** What it carries: the width that area loads reach it over, and a few lines for each load. */
export function LoadsGroup() {
  const { member, edition, readOnly, send } = useTools();
  const units = unitsOf(member);
  const add = () => {
    const used = new Set(member.loads.map(({ id }) => id));
    let number = member.loads.length + 1;
    while (used.has(`load-${number}`)) number += 1;
    const action = edition.actions.find(({ nature }) => nature === 'variable') ?? edition.actions[0];
    const load: LoadInput = { id: `load-${number}`, action: action?.id ?? '', kind: 'line', start: 1 };
    send({ kind: 'set', pointer: `/loads/${member.loads.length}`, value: load });
  };
  const by = member.carries?.by ?? '';
  return (
    <Group title="What it carries" actions={!readOnly && <GroupAction label="Add a load" onClick={add} />}>
      <ChoiceField
        label="Area loads reach it"
        pointer="/carries/by"
        options={[
          { id: 'spacing', title: 'by spacing' },
          { id: 'tributary', title: 'by tributary width' },
        ]}
        otherwise="not"
        onChoose={(id) =>
          send({
            kind: 'set',
            pointer: '/carries',
            value:
              id === ''
                ? undefined
                : { by: id, width: member.carries?.width ?? (member.units === 'metric' ? 400 : 16) },
          })
        }
      />
      {by !== '' && (
        <QuantityField
          label={by === 'spacing' ? 'Spacing, centres' : 'Tributary width'}
          pointer="/carries/width"
          unit={units.length}
          above={0}
          most={50_000}
        />
      )}
      {member.loads.length === 0 && (
        <p className="border-b border-rule py-2 text-sm text-soft">
          No load yet but its own weight, where the edition adds it.
        </p>
      )}
      {member.loads.map((load, index) => (
        <LoadRows key={load.id} load={load} index={index} />
      ))}
    </Group>
  );
}

function LoadRows({ load, index }: { load: LoadInput; index: number }) {
  const { member, edition, readOnly, send } = useTools();
  const units = unitsOf(member);
  const base = `/loads/${index}`;
  const name = load.title ?? edition.actions.find(({ id }) => id === load.action)?.title ?? load.action;
  return (
    <fieldset className="mt-1.5">
      <legend className="flex w-full items-baseline justify-between pt-1 text-sm font-semibold">
        <span>{name}</span>
        {!readOnly && (
          <GroupAction
            label="Remove"
            about={`Remove the load ${name}`}
            onClick={() => send({ kind: 'set', pointer: base, value: undefined })}
          />
        )}
      </legend>
      <ChoiceField label="Action" pointer={`${base}/action`} options={edition.actions} />
      <ChoiceField
        label="Acts"
        pointer={`${base}/kind`}
        options={kinds}
        onChoose={(id) => send({ kind: 'set', pointer: base, value: asKind(load, id as LoadInput['kind']) })}
      />
      {load.kind === 'area' && (
        <QuantityField
          label="Load"
          pointer={`${base}/intensity`}
          unit={units.area}
          least={-1000}
          most={1000}
        />
      )}
      {load.kind === 'line' && (
        <>
          <QuantityField
            label="Load, at its start"
            pointer={`${base}/start`}
            unit={units.line}
            least={-10_000}
            most={10_000}
          />
          <QuantityField
            label="Load, at its end"
            pointer={`${base}/end`}
            unit={units.line}
            least={-10_000}
            most={10_000}
            empty="the same"
          />
        </>
      )}
      {load.kind === 'point' && (
        <QuantityField
          label="Force"
          pointer={`${base}/force`}
          unit={units.force}
          least={-100_000}
          most={100_000}
        />
      )}
      {load.kind === 'couple' && (
        <QuantityField
          label="Couple, clockwise"
          pointer={`${base}/moment`}
          unit={units.couple}
          least={-100_000}
          most={100_000}
        />
      )}
      {load.kind === 'point' || load.kind === 'couple' ? (
        <QuantityField
          label="From the left end"
          pointer={`${base}/x`}
          unit={units.length}
          least={0}
          most={5_000_000}
        />
      ) : (
        <>
          <QuantityField
            label="From"
            pointer={`${base}/from`}
            unit={units.length}
            least={0}
            most={5_000_000}
            empty="left end"
          />
          <QuantityField
            label="To"
            pointer={`${base}/to`}
            unit={units.length}
            above={0}
            most={5_000_000}
            empty="right end"
          />
        </>
      )}
      {(member.slope ?? 0) > 0 && load.kind !== 'couple' && (
        <ChoiceField
          label="Direction"
          pointer={`${base}/direction`}
          options={directions}
          otherwise="vertical, per length on plan"
        />
      )}
    </fieldset>
  );
}
