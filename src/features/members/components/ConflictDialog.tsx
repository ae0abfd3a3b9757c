import { useState } from 'react';
import type { Member } from '#shared/basis/schema/index.ts';
import type { StoredMember } from '#shared/contracts/members.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { moment } from '#src/lib/format/time.ts';
import { differences, merge } from '../lib/conflict.ts';

interface ConflictDialogProps {
  base: Member;
  mine: Member;
  stored: StoredMember;
  onSettle: (merged: Member) => void;
  onClose: () => void;
}

const inText = (value: unknown): string =>
  value === undefined ? 'nothing' : typeof value === 'object' ? JSON.stringify(value) : String(value);

/** A colleague saved first: both values of every place that differs, and a choice for each. */
export default function ConflictDialog({ base, mine, stored, onSettle, onClose }: ConflictDialogProps) {
  const found = differences(base, mine, stored.document);
  const [choices, setChoices] = useState<Record<string, 'mine' | 'theirs'>>({});
  const choiceOf = (pointer: string, clash: boolean, changedByMe: boolean) =>
    choices[pointer] ?? (clash || changedByMe ? 'mine' : 'theirs');
  return (
    <Dialog title={`${stored.savedBy.name} saved first`} open onClose={onClose} wide>
      <p className="mb-3 text-soft">
        Version {stored.version} was saved at {moment(stored.savedAt)} while you worked. Choose for each
        place; nothing is saved yet, and what you typed is kept.
      </p>
      <div className="overflow-x-auto" tabIndex={0} role="group" aria-label="Differences, table">
        <table className="w-full text-sm">
          <thead>
            <tr className="border-b border-ink text-left text-xs text-soft">
              <th scope="col" className="py-1 font-normal">
                Place
              </th>
              <th scope="col" className="py-1 font-normal">
                Yours
              </th>
              <th scope="col" className="py-1 font-normal">
                {stored.savedBy.name}’s
              </th>
            </tr>
          </thead>
          <tbody>
            {found.map(({ pointer, mine: own, theirs, clash }) => {
              const changedByMe =
                inText(own) !== inText(theirs) &&
                !clash &&
                differences(base, mine, base).some((d) => d.pointer === pointer);
              const choice = choiceOf(pointer, clash, changedByMe);
              const option = (side: 'mine' | 'theirs', value: unknown) => (
                <label className="flex items-start gap-2">
                  <input
                    type="radio"
                    name={pointer}
                    checked={choice === side}
                    onChange={() => setChoices({ ...choices, [pointer]: side })}
                  />
                  <span className="font-mono text-xs break-all">{inText(value)}</span>
                </label>
              );
              return (
                <tr key={pointer} className="border-b border-rule align-top">
                  <th scope="row" className="py-1.5 pr-3 text-left font-normal">
                    {pointer.slice(1).replaceAll('/', ', ')}
                    {clash && <span className="ml-2 text-xs text-close">▲ both changed it</span>}
                  </th>
                  <td className="py-1.5 pr-3">{option('mine', own)}</td>
                  <td className="py-1.5">{option('theirs', theirs)}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
      <div className="mt-4 flex gap-2">
        <Button kind="main" onClick={() => onSettle(merge(base, mine, stored.document, choices))}>
          Take these onto the sheet
        </Button>
        <Button onClick={() => onSettle(stored.document)}>Take all of {stored.savedBy.name}’s</Button>
      </div>
    </Dialog>
  );
}
