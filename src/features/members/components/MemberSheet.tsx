import { lazy, Suspense, useEffect, useMemo, useState } from 'react';
import type { Edition } from '#shared/basis/schema/index.ts';
import type { EditionReference } from '#shared/contracts/common.ts';
import type { MemberRecord } from '#shared/contracts/members.ts';
import type { Section as StockRow } from '#shared/contracts/stock.ts';
import type { StockSection } from '#shared/engine/types.ts';
import { Notice } from '#src/components/Notice.tsx';
import { isChanged } from '../lib/sheet.ts';
import { useAnswers, usePlan, useVerdict } from '../lib/useVerdict.ts';
import { useSheet } from '../api/useSheet.ts';
import { DeparturesGroup, HeldGroup } from './HeldGroup.tsx';
import { LoadsGroup } from './LoadsGroup.tsx';
import { MadeOfGroup } from './MadeOfGroup.tsx';
import { Outcome } from './Outcome.tsx';
import { SheetContext } from './SheetContext.ts';
import { SheetHead } from './SheetHead.tsx';
import { SpansGroup } from './SpansGroup.tsx';

// Seldom needed, and fetched then.
const ConflictDialog = lazy(() => import('./ConflictDialog.tsx'));

interface MemberSheetProps {
  record: MemberRecord;
  editionReference: EditionReference;
  edition: Edition;
  stock: readonly StockRow[];
  person: string;
  readOnly: boolean;
}

/** The sheet of one member: inputs at the left, verdict and evidence at the right, answering as one types. */
export function MemberSheet({
  record,
  editionReference,
  edition,
  stock,
  person,
  readOnly,
}: MemberSheetProps) {
  const work = useSheet(record, person, readOnly);
  const { sheet, send } = work;
  const plan = usePlan(edition);
  const { whole, result } = useVerdict(plan, sheet.document, record.project.choices);
  const sections = useMemo(() => stock.map(forEngine), [stock]);
  const answers = useAnswers(plan, whole, sections);
  const [restoredSeen, setRestoredSeen] = useState(false);
  const unread = Object.keys(sheet.unread).length;
  const savable = work.changed && unread === 0 && work.saving.kind !== 'saving';

  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || readOnly) return;
      const key = event.key.toLowerCase();
      if (key === 's') {
        event.preventDefault();
        if (savable) void work.save();
      } else if (key === 'z') {
        event.preventDefault();
        send({ kind: event.shiftKey ? 'redo' : 'undo' });
      } else if (key === 'y') {
        event.preventDefault();
        send({ kind: 'redo' });
      }
    };
    const onLeave = (event: BeforeUnloadEvent) => {
      if (!work.kept && isChanged(sheet)) event.preventDefault();
    };
    window.addEventListener('keydown', onKey);
    window.addEventListener('beforeunload', onLeave);
    return () => {
      window.removeEventListener('keydown', onKey);
      window.removeEventListener('beforeunload', onLeave);
    };
  });

  const tools = useMemo(
    () => ({
      member: sheet.document,
      edition,
      readOnly,
      unread: sheet.unread,
      findings: result?.findings.filter((finding) => finding.in === 'member') ?? [],
      send,
    }),
    [edition, readOnly, result, send, sheet.document, sheet.unread],
  );
  return (
    <SheetContext value={tools}>
      <div className="lg:grid lg:grid-cols-[22rem_minmax(0,1fr)]">
        <div className="border-pencil/60 px-4 pt-5 pb-6 lg:sticky lg:top-14 lg:max-h-[calc(100dvh-3.5rem)] lg:overflow-y-auto lg:border-r lg:px-6">
          <SheetHead record={record} work={work} savable={savable} readOnly={readOnly} />
          {work.restored && !restoredSeen && (
            <Notice>
              What you typed here before was kept on this machine and is shown.{' '}
              <button
                type="button"
                className="text-accent-ink underline"
                onClick={() => {
                  send({ kind: 'replace', document: record.document });
                  setRestoredSeen(true);
                }}
              >
                Go back to what is saved
              </button>
            </Notice>
          )}
          <SpansGroup />
          <LoadsGroup />
          <MadeOfGroup stock={stock} />
          <HeldGroup projectChoices={record.project.choices} />
          <DeparturesGroup />
        </div>
        <Outcome
          record={record}
          editionReference={editionReference}
          edition={edition}
          plan={plan}
          whole={whole}
          result={result}
          answers={answers}
          stock={sections}
          unread={unread}
          readOnly={readOnly}
        />
      </div>
      {work.saving.kind === 'conflict' && (
        <Suspense>
          <ConflictDialog
            base={sheet.saved.document}
            mine={sheet.document}
            stored={work.saving.stored}
            onSettle={(merged) => work.saving.kind === 'conflict' && work.settle(merged, work.saving.stored)}
            onClose={work.dismiss}
          />
        </Suspense>
      )}
    </SheetContext>
  );
}

/** A stock section as the engine takes it; an empty list of grades means that none was stated. */
function forEngine({ id, nominal, actual, grades, pricePerMetre }: StockRow): StockSection {
  return {
    id,
    nominal,
    actual,
    ...(grades.length ? { grades } : {}),
    ...(pricePerMetre === null ? {} : { pricePerMetre }),
  };
}
