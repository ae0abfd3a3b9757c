import { useState } from 'react';
import { patched } from '#shared/basis/draft/patch.ts';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { StoredDraft } from '#shared/contracts/drafts.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';

const inText = (value: unknown) => {
  const text = typeof value === 'string' ? value : JSON.stringify(value);
  return text.length > 300 ? `${text.slice(0, 300)}…` : text;
};

/** Two keepers changed one place: both values, and a choice. Neither is lost until it is made. */
export function ClashDialog({
  mine,
  stored,
  onSettle,
}: {
  mine: Edition;
  stored: StoredDraft;
  onSettle: (document: Edition) => void;
}) {
  const [choices, setChoices] = useState<Record<string, 'mine' | 'theirs'>>({});
  const settled = () => {
    const operations = stored.clashes
      .filter(({ pointer }) => choices[pointer] === 'theirs')
      .map(({ pointer, theirs }) => ({ op: 'replace' as const, path: pointer, value: theirs }));
    const outcome = patched(mine, operations);
    onSettle(outcome.ok ? outcome.document : mine);
  };
  return (
    <Dialog title={`${stored.changedBy.name} changed the same place`} open onClose={() => undefined} wide>
      <p className="mb-3 text-soft">Choose for each place. Nothing is lost until you do.</p>
      {stored.clashes.map(({ pointer, mine: own, theirs }) => (
        <fieldset key={pointer} className="border-b border-rule py-2">
          <legend className="font-mono text-xs text-soft">{pointer}</legend>
          {(['mine', 'theirs'] as const).map((side) => (
            <label key={side} className="flex gap-2 py-1">
              <input
                type="radio"
                name={pointer}
                checked={(choices[pointer] ?? 'mine') === side}
                onChange={() => setChoices({ ...choices, [pointer]: side })}
              />
              <span>
                {side === 'mine' ? 'Yours' : `${stored.changedBy.name}’s`}:{' '}
                <span className="font-mono text-sm break-all">{inText(side === 'mine' ? own : theirs)}</span>
              </span>
            </label>
          ))}
        </fieldset>
      ))}
      <Button kind="main" className="mt-4" onClick={settled}>
        Go on with these
      </Button>
    </Dialog>
  );
}
