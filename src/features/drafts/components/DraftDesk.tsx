import { useDeferredValue, useMemo, useState } from 'react';
import { Link } from 'react-router-dom';
import { compile } from '#shared/engine/index.ts';
import type { Draft } from '#shared/contracts/drafts.ts';
import { Button } from '#src/components/Button.tsx';
import { Notice, ProblemNotice } from '#src/components/Notice.tsx';
import { Page } from '#src/components/Page.tsx';
import { EditionMark } from '#src/components/StateMark.tsx';
import { moment } from '#src/lib/format/time.ts';
import { useDraft } from '../api/useDraft.ts';
import { ClashDialog } from './ClashDialog.tsx';
import { ClausesEditor } from './ClausesEditor.tsx';
import { DifferencesView } from './DifferencesView.tsx';
import { GradesEditor } from './GradesEditor.tsx';
import { ReleasePanel } from './ReleasePanel.tsx';
import { TablesEditor } from './TablesEditor.tsx';

const tabs = ['Grades', 'Clauses', 'Tables', 'Differences'] as const;
type Tab = (typeof tabs)[number];

const said = {
  saved: 'Saved',
  waiting: 'To be saved',
  saving: 'Saving …',
  problem: 'Not saved yet; what you typed is kept on this machine',
  clash: 'Someone changed the same place',
} as const;

/** The desk of a draft: its parts to edit at the left, findings and the way to release at the right. */
export function DraftDesk({ draft, readOnly }: { draft: Draft; readOnly: boolean }) {
  const work = useDraft(draft, readOnly);
  const { edition, saving } = work;
  const [tab, setTab] = useState<Tab>('Grades');
  const rested = useDeferredValue(edition);
  const findings = useMemo(() => compile(rested).findings, [rested]);
  const { summary, changedBy, changedAt } = draft;
  return (
    <div className="xl:grid xl:grid-cols-[minmax(0,1fr)_20rem]">
      <Page
        wide
        title={`${summary.basisTitle}, edition ${summary.number}`}
        mark={<EditionMark state={summary.state} />}
        lead={
          <p>
            {summary.reason}{' '}
            <span className="text-sm">
              Last changed {moment(changedAt)} by {changedBy.name}.{' '}
              {readOnly ? (
                'You can read it; nothing can be changed here.'
              ) : (
                <span aria-live="polite">{said[saving.kind]}.</span>
              )}
            </span>
          </p>
        }
        actions={
          <>
            {!readOnly && (
              <>
                <Button disabled={!work.canUndo} onClick={work.undo}>
                  Undo
                </Button>
                <Button disabled={!work.canRedo} onClick={work.redo}>
                  Redo
                </Button>
              </>
            )}
            <Link
              to={`/editions/${summary.id}`}
              className="self-center text-sm text-accent-ink underline underline-offset-2"
            >
              Read it whole
            </Link>
          </>
        }
      >
        {saving.kind === 'problem' && (
          <div>
            <ProblemNotice error={saving.error} />
            <Button onClick={() => void work.flush()}>Save again</Button>
          </div>
        )}
        {draft.remarks.length > 0 && summary.state === 'draft' && (
          <Notice tone="warning">
            <p className="font-medium">Remarks of the check</p>
            <ul>
              {draft.remarks.map((remark, index) => (
                <li key={index}>
                  {remark.text}{' '}
                  <span className="text-soft">
                    ({remark.by.name}, {remark.pointer || 'the whole'})
                  </span>
                </li>
              ))}
            </ul>
          </Notice>
        )}
        <div
          role="tablist"
          aria-label="Parts of the draft"
          className="mb-4 flex gap-x-5 overflow-x-auto border-b border-ink"
        >
          {tabs.map((name) => (
            <button
              key={name}
              type="button"
              role="tab"
              id={`tab-${name}`}
              aria-selected={tab === name}
              aria-controls="tab-panel"
              tabIndex={tab === name ? 0 : -1}
              onClick={() => setTab(name)}
              onKeyDown={(event) => {
                const step = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
                if (step === undefined) return;
                const next = tabs[(tabs.indexOf(name) + step + tabs.length) % tabs.length] ?? 'Grades';
                setTab(next);
                document.getElementById(`tab-${next}`)?.focus();
              }}
              className={`min-h-9 border-b-2 px-1 ${tab === name ? 'border-accent font-semibold' : 'border-transparent text-soft hover:text-ink'}`}
            >
              {name}
            </button>
          ))}
        </div>
        <div role="tabpanel" id="tab-panel" aria-labelledby={`tab-${tab}`}>
          {tab === 'Grades' && (
            <GradesEditor
              edition={edition}
              findings={findings}
              readOnly={readOnly}
              onChange={work.change}
              onUndo={work.undo}
              onRedo={work.redo}
            />
          )}
          {tab === 'Clauses' && (
            <ClausesEditor edition={edition} findings={findings} readOnly={readOnly} onChange={work.change} />
          )}
          {tab === 'Tables' && (
            <TablesEditor
              edition={edition}
              readOnly={readOnly}
              onChange={work.change}
              onUndo={work.undo}
              onRedo={work.redo}
            />
          )}
          {tab === 'Differences' && <DifferencesView summary={summary} edition={edition} />}
        </div>
      </Page>
      <ReleasePanel draft={draft} findings={findings} version={work.version} flush={work.flush} />
      {saving.kind === 'clash' && (
        <ClashDialog
          mine={edition}
          stored={saving.stored}
          onSettle={(document) => work.settle(document, saving.stored)}
        />
      )}
    </div>
  );
}
