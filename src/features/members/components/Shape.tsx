import { memo } from 'react';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { Result, StockSection } from '#shared/engine/types.ts';
import type { Answers } from '../lib/answers.ts';
import { DepthPanel } from './DepthPanel.tsx';
import { StripPanel } from './StripPanel.tsx';

interface ShapeProps {
  /** The member that the answers are of. */
  member: Member;
  edition: Edition;
  result: Result;
  answers: Answers;
  stock: readonly StockSection[];
  /** The answers are of the member as it is now: a section can be taken by them. */
  fresh: boolean;
  readOnly: boolean;
  onFind: () => void;
  onTake: (section: StockSection) => void;
}

/** The member drawn, and the depth it needs: what the worker answers. */
export const Shape = memo(function Shape(props: ShapeProps) {
  const { member, edition, result, answers, stock, fresh, readOnly, onFind, onTake } = props;
  return (
    <div aria-busy={!fresh}>
      {answers.curves && (
        <StripPanel member={member} edition={edition} result={result} curves={answers.curves} />
      )}
      {answers.depth && (
        <DepthPanel
          depth={answers.depth}
          breadth={member.section.b}
          stock={stock}
          next={fresh ? answers.next : null}
          readOnly={readOnly}
          onFind={onFind}
          onTake={onTake}
        />
      )}
    </div>
  );
});
