import { Link } from 'react-router-dom';
import type { EditionReference } from '#shared/contracts/common.ts';
import { EditionMark } from './StateMark.tsx';

/** An edition by name, with its state where it isn't simply released. */
export function EditionName({ edition }: { edition: EditionReference | null }) {
  if (!edition) return <span className="text-soft">none pinned</span>;
  return (
    <span className="inline-flex flex-wrap items-baseline gap-x-2">
      <Link to={`/editions/${edition.id}`} className="hover:underline">
        {edition.basisTitle}, edition {edition.number}
      </Link>
      {edition.state !== 'released' && <EditionMark state={edition.state} />}
    </span>
  );
}
