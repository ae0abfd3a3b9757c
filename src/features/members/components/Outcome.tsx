import { lazy, Suspense, useCallback, useDeferredValue, useState } from 'react';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { EditionReference } from '#shared/contracts/common.ts';
import type { MemberRecord } from '#shared/contracts/members.ts';
import type { Plan, Result, StockSection } from '#shared/engine/types.ts';
import { Notice } from '#src/components/Notice.tsx';
import type { Answers } from '../lib/answers.ts';
import { EditionLine } from './EditionLine.tsx';
import { Evidence } from './Evidence.tsx';
import { HistoryPanel } from './HistoryPanel.tsx';
import { Shape } from './Shape.tsx';
import { useTools } from './SheetContext.ts';
import { VerdictBlock } from './VerdictBlock.tsx';

// Opened on request, and fetched then.
const FindSection = lazy(() => import('./FindSection.tsx'));

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

/** Verdict and evidence: from the word down to raw inputs, on one page. The verdict comes first, also in time. */
export function Outcome(props: OutcomeProps) {
  const { record, editionReference, edition, plan, whole, result, answers, stock, unread, readOnly } = props;
  const { member, send } = useTools();
  const [chosen, setChosen] = useState<string | null>(null);
  const [finding, setFinding] = useState(false);
  const shown = useDeferredValue(result);
  const check = result?.checks.find(({ id }) => id === chosen) ?? result?.checks[0];
  // While the worker is at it, its answers are of the member a moment ago: none of them gets into the verdict.
  const fresh = answers.of === whole;
  const doubts = result?.findings.filter((found) => found.severity !== 'note') ?? [];
  const find = useCallback(() => setFinding(true), []);
  const pieces = member.section.pieces;
  const take = useCallback(
    ({ actual, nominal, id }: StockSection) =>
      send({ kind: 'set', pointer: '/section', value: { ...actual, pieces, nominal, stock: id } }),
    [pieces, send],
  );
  return (
    <div className="min-w-0 px-4 pt-5 lg:px-8">
      <EditionLine edition={editionReference} result={result} />
      <VerdictBlock
        result={result}
        unread={unread}
        depth={fresh ? answers.depth : null}
        next={answers.next}
        open={check?.id ?? null}
        onOpen={setChosen}
      />
      {doubts.length > 0 && (
        <Notice tone="warning">
          <ul>
            {doubts.map((found) => (
              <li key={found.code + found.pointer}>{found.message}</li>
            ))}
          </ul>
        </Notice>
      )}
      <div
        className={`pt-5 ${unread > 0 ? 'opacity-50' : ''}`}
        aria-hidden={unread > 0 ? true : undefined}
        inert={unread > 0}
      >
        {shown && answers.of && (
          <Shape
            member={answers.of}
            edition={edition}
            result={shown}
            answers={answers}
            stock={stock}
            fresh={fresh}
            readOnly={readOnly}
            onFind={find}
            onTake={take}
          />
        )}
        {shown && (
          <Evidence
            result={shown}
            edition={edition}
            drivers={answers.drivers}
            chosen={chosen}
            onChoose={setChosen}
          />
        )}
      </div>
      {finding && plan && (
        <Suspense>
          <FindSection
            plan={plan}
            edition={edition}
            member={whole}
            stock={stock}
            readOnly={readOnly}
            onClose={() => setFinding(false)}
            onTake={({ actual, nominal, id }, grade) => {
              const section = { ...actual, pieces, nominal, stock: id };
              send({ kind: 'replace', document: { ...member, grade, section } });
              setFinding(false);
            }}
          />
        </Suspense>
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
