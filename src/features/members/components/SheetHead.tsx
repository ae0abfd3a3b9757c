import type { MemberRecord } from '#shared/contracts/members.ts';
import { Button } from '#src/components/Button.tsx';
import { Notice, ProblemNotice } from '#src/components/Notice.tsx';
import { moment } from '#src/lib/format/time.ts';
import type { useSheet } from '../api/useSheet.ts';
import { useTools } from './SheetContext.ts';

interface SheetHeadProps {
  record: MemberRecord;
  work: ReturnType<typeof useSheet>;
  savable: boolean;
  readOnly: boolean;
}

/** Mark and title of the member, its version, and what can be done with the sheet. */
export function SheetHead({ record, work, savable, readOnly }: SheetHeadProps) {
  const { member, send } = useTools();
  const { sheet, changed, saving, save, kept } = work;
  const field =
    'rounded border border-transparent bg-transparent hover:border-pencil focus:border-accent focus:bg-raised';
  return (
    <div className="mb-5">
      {readOnly ? (
        <h1 className="text-3xl">
          {member.mark} <span className="font-sans text-base text-soft">{member.title}</span>
        </h1>
      ) : (
        <>
          <h1 className="sr-only">{`Member ${member.mark}`}</h1>
          <div className="flex items-baseline gap-2">
            <input
              aria-label="Mark"
              value={member.mark}
              maxLength={24}
              onChange={(event) => send({ kind: 'set', pointer: '/mark', value: event.target.value })}
              className={`w-24 font-serif text-3xl font-medium ${field}`}
            />
            <input
              aria-label="Title"
              value={member.title ?? ''}
              maxLength={200}
              placeholder="Say what it is"
              onChange={(event) =>
                send({
                  kind: 'set',
                  pointer: '/title',
                  value: event.target.value === '' ? undefined : event.target.value,
                })
              }
              className={`min-w-0 flex-1 text-base text-soft ${field}`}
            />
          </div>
        </>
      )}
      <p className="mt-1 text-sm text-soft" aria-live="polite">
        {saving.kind === 'saving'
          ? 'Saving …'
          : changed
            ? `Changed since version ${sheet.saved.version}`
            : `Version ${sheet.saved.version}, saved ${moment(record.savedAt)} by ${record.savedBy.name}`}
        {readOnly && '. You can read this sheet; nothing can be changed.'}
      </p>
      {!readOnly && (
        <div className="no-print mt-2 flex gap-2">
          <Button kind="main" disabled={!savable} onClick={() => void save()}>
            Save
          </Button>
          <Button disabled={sheet.past.length === 0} onClick={() => send({ kind: 'undo' })}>
            Undo
          </Button>
          <Button disabled={sheet.future.length === 0} onClick={() => send({ kind: 'redo' })}>
            Redo
          </Button>
        </div>
      )}
      {!kept && (
        <Notice tone="warning">This browser can’t keep what you type. Save before you leave the page.</Notice>
      )}
      {saving.kind === 'problem' && <ProblemNotice error={saving.error} />}
    </div>
  );
}
