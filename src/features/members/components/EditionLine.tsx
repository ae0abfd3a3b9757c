import { Link } from 'react-router-dom';
import type { EditionReference } from '#shared/contracts/common.ts';
import type { Result } from '#shared/engine/types.ts';
import { EditionMark, UnverifiedMark } from '#src/components/StateMark.tsx';

interface EditionLineProps {
  edition: EditionReference;
  result: Result | null;
}

/** Which edition stands behind the verdict, and what in it nobody verified. Never left out. */
export function EditionLine({ edition, result }: EditionLineProps) {
  const departures = result?.marks.departures.length ?? 0;
  return (
    <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-b border-pencil/60 pb-2.5 text-sm">
      <p className="min-w-0">
        <Link to={`/editions/${edition.id}`} className="font-semibold hover:underline">
          {edition.basisTitle}, edition {edition.number}
        </Link>{' '}
        <EditionMark state={edition.state} />
      </p>
      <p className="ml-auto flex flex-wrap gap-x-4">
        <UnverifiedMark
          count={result?.marks.unverified ?? edition.unverified}
          what="values behind this result are"
        />
        {departures > 0 && (
          <span className="text-close whitespace-nowrap">
            <span aria-hidden>◇</span> {departures === 1 ? '1 departure' : `${departures} departures`}
          </span>
        )}
      </p>
      {edition.state === 'withdrawn' && (
        <p className="w-full text-fail">
          ⊘ This edition was withdrawn. Results on it are not to be relied on; pin another edition to the
          project.
        </p>
      )}
      {edition.state === 'superseded' && (
        <p className="w-full text-close">
          ○ A newer edition of this basis was released. This project stays on the one it pinned.
        </p>
      )}
    </div>
  );
}
