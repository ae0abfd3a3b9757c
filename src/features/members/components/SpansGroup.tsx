import type { Edition } from '#shared/basis/schema/index.ts';
import { valueAt } from '../lib/pointer.ts';
import { inputUnit, unitsOf } from '../lib/units.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { Group, GroupAction } from './Group.tsx';
import { QuantityField } from './QuantityField.tsx';
import { useTools } from './SheetContext.ts';

const restraints = [
  { id: 'pin', title: 'supported' },
  { id: 'fixed', title: 'fixed' },
];
const ends = [...restraints, { id: 'free', title: 'free end' }];

/** How it spans: spans and supports from left to right, and slope. */
export function SpansGroup() {
  const { member, edition, readOnly, send } = useTools();
  const units = unitsOf(member);
  const { spans, supports } = member;
  const most = member.units === 'metric' ? 100_000 : 4000;
  const add = () => {
    const last = supports[supports.length - 1] ?? { restraint: 'pin' as const };
    const inner = last.restraint === 'free' ? { ...last, restraint: 'pin' as const } : last;
    send({
      kind: 'replace',
      document: {
        ...member,
        spans: [...spans, { length: spans[spans.length - 1]?.length ?? 1 }],
        supports: [...supports.slice(0, -1), inner, last],
      },
    });
  };
  const remove = (index: number) => {
    // The support between this span and its neighbour goes with it; the ends of the member stay.
    const gone = index === spans.length - 1 ? index : index + 1;
    send({
      kind: 'replace',
      document: {
        ...member,
        spans: spans.filter((_, i) => i !== index),
        supports: supports.filter((_, i) => i !== gone),
      },
    });
  };
  const measured = member.spanMeasured === 'centres' ? 'centre to centre of bearings' : 'clear';
  return (
    <Group title="How it spans" actions={!readOnly && <GroupAction label="Add a span" onClick={add} />}>
      <ChoiceField
        label="Spans are given"
        pointer="/spanMeasured"
        options={[
          { id: 'centres', title: 'centre to centre' },
          { id: 'clear', title: 'clear' },
        ]}
      />
      {spans.map((_, index) => (
        <div key={index}>
          <QuantityField
            label={spans.length === 1 ? `Span, ${measured}` : `Span ${index + 1}`}
            pointer={`/spans/${index}/length`}
            unit={units.length}
            above={0}
            most={most}
          />
          <Inputs scope="span" edition={edition} base={`/spans/${index}`} />
          {!readOnly && spans.length > 1 && (
            <div className="text-right">
              <GroupAction label="Remove" about={`Remove span ${index + 1}`} onClick={() => remove(index)} />
            </div>
          )}
        </div>
      ))}
      {supports.map((support, index) => {
        const name = spans.length === 1 ? (index === 0 ? 'Left end' : 'Right end') : `Support ${index + 1}`;
        const isEnd = index === 0 || index === supports.length - 1;
        return (
          <div key={index}>
            <ChoiceField
              label={name}
              pointer={`/supports/${index}/restraint`}
              options={isEnd ? ends : restraints}
            />
            {support.restraint !== 'free' && (
              <>
                <QuantityField
                  label={`${name}, bearing`}
                  pointer={`/supports/${index}/bearing`}
                  unit={units.length}
                  above={0}
                  most={5000}
                  empty="none"
                />
                <Inputs scope="support" edition={edition} base={`/supports/${index}`} name={name} />
              </>
            )}
          </div>
        );
      })}
      <QuantityField label="Slope" pointer="/slope" unit="deg" least={0} most={75} empty="level" />
    </Group>
  );
}

/** The edition's own inputs of a span or support: folded away until one of them is given. */
function Inputs(props: { scope: 'span' | 'support'; edition: Edition; base: string; name?: string }) {
  const { member } = useTools();
  const given = valueAt(member, `${props.base}/inputs`);
  const some = typeof given === 'object' && given !== null && Object.keys(given).length > 0;
  if (!props.edition.inputs.some(({ scope }) => scope === props.scope)) return null;
  return (
    <details open={some} className="border-b border-rule">
      <summary className="py-1 text-xs text-soft">
        {props.name ? `More at ${props.name.toLowerCase()}` : 'More of this span'}
      </summary>
      <InputFields {...props} />
    </details>
  );
}

function InputFields({
  scope,
  edition,
  base,
  name,
}: {
  scope: 'span' | 'support';
  edition: Edition;
  base: string;
  name?: string;
}) {
  const { member } = useTools();
  return edition.inputs
    .filter((input) => input.scope === scope)
    .map((input) => (
      <QuantityField
        key={input.symbol}
        label={input.title}
        about={name ? `${name}: ${input.title}` : undefined}
        pointer={`${base}/inputs/${input.symbol}`}
        unit={inputUnit(input, member)}
        empty={input.default === undefined ? 'none' : String(input.default)}
        {...(input.minimum === undefined ? {} : { least: input.minimum })}
        {...(input.maximum === undefined ? {} : { most: input.maximum })}
      />
    ));
}
