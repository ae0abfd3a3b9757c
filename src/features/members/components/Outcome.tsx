import { useState } from 'react';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { EditionReference } from '#shared/contracts/common.ts';
import type { MemberRecord } from '#shared/contracts/members.ts';
import type { Plan, Result, StockSection } from '#shared/engine/types.ts';
import { unitForReading } from '#shared/units/format.ts';
import { Notice } from '#src/components/Notice.tsx';
import { Section } from '#src/components/Section.tsx';
import { Cascade } from '#src/drawings/Cascade.tsx';
import { cascadeOf } from '#src/drawings/cascadeSteps.ts';
import { Drivers } from '#src/drawings/Drivers.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';
import { checkOf, entriesOf, isMain } from '../lib/ledgerView.ts';
import type { Answers } from '../lib/answers.ts';
import { DepthPanel } from './DepthPanel.tsx';
import { FindSection } from './FindSection.tsx';
import { EditionLine } from './EditionLine.tsx';
import { HistoryPanel } from './HistoryPanel.tsx';
import { LedgerTable } from './LedgerTable.tsx';
import { ReactionsTable } from './ReactionsTable.tsx';
import { useTools } from './SheetContext.ts';
import { StripPanel } from './StripPanel.tsx';
import { useWidth } from './useWidth.ts';
import { VerdictBlock } from './VerdictBlock.tsx';

interface OutcomeProps {
  record: MemberRecord;
  editionReference: EditionReference;
  edition: Edition;
  plan: Plan | null;
  whole: Member;
  result: Result | null;
  answers: Answers & { of: Member | null };
  stock: readonly StockSection[];
  unread: number;
  readOnly: boolean;
}

/** Verdict and evidence: from the word down to raw inputs, on one page. */
export function Outcome(props: OutcomeProps) {
  const { record, editionReference, edition, plan, whole, result, answers, stock, unread, readOnly } = props;
  const { member, send } = useTools();
  const numbers = useNumbers();
  const [chosen, setChosen] = useState<string | null>(null);
  const [entry, setEntry] = useState<number | null>(null);
  const [everything, setEverything] = useState(false);
  const [finding, setFinding] = useState(false);
  const [holder, width] = useWidth<HTMLDivElement>(760);
  const check = result?.checks.find(({ id }) => id === chosen) ?? result?.checks[0];
  const cascade = result && check ? cascadeOf(result, check) : null;
  const behind = result && check ? entriesOf(result.ledger, check.entry) : [];
  const open = (n: number | null) => {
    setEntry(n);
    if (n === null || !result) return;
    if (!behind.some((each) => each.n === n)) setChosen(checkOf(result, n));
    requestAnimationFrame(() => document.getElementById(`entry-${n}`)?.scrollIntoView({ block: 'nearest' }));
  };
  // While the worker is at it, its answers are of the member a moment ago: none of them gets into the verdict.
  const fresh = answers.of === whole;
  const doubts = result?.findings.filter((finding) => finding.severity !== 'note') ?? [];
  return (
    <div className="min-w-0 px-4 pt-5 lg:px-8">
      <EditionLine edition={editionReference} result={result} />
      <VerdictBlock
        result={result}
        unread={unread}
        depth={fresh ? answers.depth : null}
        next={answers.next}
        open={check?.id ?? null}
        onOpen={(id) => {
          setChosen(id);
          setEntry(null);
        }}
      />
      {doubts.length > 0 && (
        <Notice tone="warning">
          <ul>
            {doubts.map((finding) => (
              <li key={finding.code + finding.pointer}>{finding.message}</li>
            ))}
          </ul>
        </Notice>
      )}
      <div className={`pt-5 ${unread > 0 ? 'opacity-50' : ''}`} aria-hidden={unread > 0 ? true : undefined}>
        <div aria-busy={!fresh}>
          {result && answers.curves && (
            <StripPanel member={whole} edition={edition} result={result} curves={answers.curves} />
          )}
          {answers.depth && (
            <DepthPanel
              depth={answers.depth}
              breadth={whole.section.b}
              stock={stock}
              next={fresh ? answers.next : null}
              readOnly={readOnly}
              onFind={() => setFinding(true)}
              onTake={({ actual, nominal, id }) =>
                send({
                  kind: 'set',
                  pointer: '/section',
                  value: { ...actual, pieces: whole.section.pieces, nominal, stock: id },
                })
              }
            />
          )}
        </div>
        {cascade && check && (
          <Section
            title={`Cascade, ${check.title.toLowerCase()}`}
            note={`from ${cascade.base.title.toLowerCase()} to ${cascade.limit.title.toLowerCase()}, the demand across`}
          >
            <div ref={holder} className="overflow-x-auto">
              <Cascade
                data={cascade}
                width={Math.max(width, 90 * (cascade.steps.length + 2))}
                number={numbers.digits}
                unit={unitForReading(cascade.unit)}
                utilisation={check.utilisation === null ? '–' : numbers.decimals(check.utilisation, 2)}
                onOpen={open}
              />
            </div>
          </Section>
        )}
        {result && check && (
          <Section
            title={`Ledger, ${check.title.toLowerCase()}`}
            note={`${behind.length} entries, from the check down to raw inputs`}
            actions={
              <button
                type="button"
                onClick={() => setEverything(!everything)}
                aria-pressed={everything}
                className="min-h-6 text-accent-ink hover:underline"
              >
                {everything ? 'Only what decides' : 'Open the whole ledger'}
              </button>
            }
          >
            <LedgerTable
              entries={everything ? behind : behind.filter((each) => isMain(each) || each.n === entry)}
              result={result}
              edition={edition}
              drivers={check.id === result.verdict.check ? answers.drivers : []}
              open={entry}
              onOpen={open}
            />
          </Section>
        )}
        {typeof result?.verdict.utilisation === 'number' && answers.drivers.length > 0 && (
          <Section title="Drivers" note="what moves the governing utilisation most">
            <Drivers
              drivers={answers.drivers}
              utilisation={result.verdict.utilisation}
              number={numbers.digits}
              onOpen={open}
            />
          </Section>
        )}
        {result && result.reactions.length > 0 && <ReactionsTable result={result} edition={edition} />}
      </div>
      {finding && plan && (
        <FindSection
          plan={plan}
          edition={edition}
          member={whole}
          stock={stock}
          readOnly={readOnly}
          onClose={() => setFinding(false)}
          onTake={({ actual, nominal, id }, grade) => {
            const section = { ...actual, pieces: whole.section.pieces, nominal, stock: id };
            send({ kind: 'replace', document: { ...member, grade, section } });
            setFinding(false);
          }}
        />
      )}
      <HistoryPanel
        member={record.id}
        hasResult={record.result !== null}
        readOnly={readOnly}
        onRestore={(document) => send({ kind: 'replace', document })}
      />
      <p className="mt-8 border-t border-pencil/60 pt-3 text-xs text-soft">
        {result?.caution} A calculation aid. Loads, assumptions and results are to be checked and adopted by a
        suitably qualified, where the law asks licensed, engineer against the codes in force at the site.
      </p>
    </div>
  );
}
