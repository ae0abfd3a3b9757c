import type { Section } from '#shared/contracts/stock.ts';
import { useNumbers } from '#src/lib/format/locale.ts';
import { unitsOf } from '../lib/units.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { Group } from './Group.tsx';
import { QuantityField } from './QuantityField.tsx';
import { useTools } from './SheetContext.ts';

/** What it is made of: grade, section from stock or by hand, pieces. */
export function MadeOfGroup({ stock }: { stock: readonly Section[] }) {
  const { member, edition, send } = useTools();
  const numbers = useNumbers();
  const units = unitsOf(member);
  const { section } = member;
  const size = ({ b, h }: { b: number; h: number }) => `${numbers.exact(b)} × ${numbers.exact(h)}`;
  const take = (id: string) => {
    const chosen = stock.find((each) => each.id === id);
    if (chosen) {
      const { actual, nominal } = chosen;
      send({
        kind: 'set',
        pointer: '/section',
        value: { ...actual, pieces: section.pieces, nominal, stock: id },
      });
    } else {
      send({
        kind: 'set',
        pointer: '/section',
        value: { b: section.b, h: section.h, pieces: section.pieces },
      });
    }
  };
  const known = section.stock !== undefined && stock.some(({ id }) => id === section.stock);
  return (
    <Group title="What it is made of">
      <ChoiceField label="Grade" pointer="/grade" options={edition.grades.rows} />
      <ChoiceField
        label="Section, finished"
        note={section.nominal ? `ordered ${size(section.nominal)}` : undefined}
        pointer="/section/stock"
        options={stock.map(({ id, actual, nominal }) => ({
          id,
          title: `${size(actual)} (ordered ${size(nominal)})`,
        }))}
        otherwise="by hand"
        onChoose={take}
      />
      {section.stock !== undefined && !known && stock.length > 0 && (
        <p className="border-b border-rule py-1.5 text-xs text-close">
          ▲ This section is not in the project’s stock list any more. It is checked with the sizes below.
        </p>
      )}
      <QuantityField
        label="Breadth of one piece"
        pointer="/section/b"
        unit={units.length}
        above={0}
        most={5000}
      />
      <QuantityField label="Depth" pointer="/section/h" unit={units.length} above={0} most={10_000} />
      <QuantityField
        label="Pieces side by side"
        pointer="/section/pieces"
        unit="1"
        least={1}
        most={20}
        whole
      />
    </Group>
  );
}
