import type { RequiredDepth, Result, StockSection } from '#shared/engine/types.ts';
import { unitForReading } from '#shared/units/format.ts';
import { verdictLook } from '#src/components/StateMark.tsx';
import { UtilisationBar } from '#src/components/UtilisationBar.tsx';
import { useNumbers } from '#src/lib/format/locale.ts';

interface VerdictBlockProps {
  result: Result | null;
  /** Fields whose text can't be read; while there are any, there is no verdict. */
  unread: number;
  depth: RequiredDepth | null;
  next: StockSection | null;
  /** Opens a check in the cascade and the ledger. */
  onOpen: (check: string) => void;
  open: string | null;
}

/** The verdict in a word, what governs, and every check with its utilisation, governing first. */
export function VerdictBlock({ result, unread, depth, next, onOpen, open }: VerdictBlockProps) {
  const numbers = useNumbers();
  const word = unread > 0 || !result ? 'none' : result.verdict.word;
  const look = verdictLook[word];
  const governing = result?.checks.find(({ id }) => id === result.verdict.check);
  return (
    <div className="grid gap-6 border-b border-pencil/60 py-5 lg:grid-cols-[minmax(16rem,2fr)_3fr]">
      <div aria-live="polite">
        <p className={`flex items-center gap-3 font-serif text-4xl font-medium ${look.text}`}>
          <span
            aria-hidden
            className="grid size-10 place-items-center rounded-full border-3 border-current text-2xl"
          >
            {look.sign}
          </span>
          {look.word}
        </p>
        <div className="mt-2 max-w-sm text-base text-soft">
          {unread > 0 ? (
            <p>
              {unread === 1
                ? 'One field can’t be read; it is marked.'
                : `${unread} fields can’t be read; they are marked.`}
            </p>
          ) : word === 'none' ? (
            <p>{result?.verdict.because ?? 'The edition can’t be used.'}</p>
          ) : (
            governing && (
              <p>
                Governed by <strong className="text-ink">{governing.title.toLowerCase()}</strong>
                {governing.utilisation === null ? (
                  <>: {governing.refused}</>
                ) : (
                  <>
                    {' '}
                    at{' '}
                    <strong className="font-mono text-ink">
                      {numbers.decimals(governing.utilisation, 2)}
                    </strong>
                    .
                  </>
                )}{' '}
                {depth && <LeastDepth depth={depth} next={next} />}
              </p>
            )
          )}
        </div>
      </div>
      {result && unread === 0 && (
        <table className="w-full self-start text-sm">
          <caption className="sr-only">Checks with their utilisation, the governing one first</caption>
          <thead className="sr-only">
            <tr>
              <th scope="col">Check</th>
              <th scope="col">Bar</th>
              <th scope="col">Utilisation</th>
              <th scope="col">Word</th>
            </tr>
          </thead>
          <tbody>
            {result.checks.map((check, index) => (
              <tr key={check.id}>
                <th
                  scope="row"
                  className={`py-0.5 pr-4 text-left ${index === 0 ? 'font-semibold' : 'font-normal'}`}
                >
                  <button
                    type="button"
                    aria-pressed={open === check.id}
                    onClick={() => onOpen(check.id)}
                    className={`min-h-6 text-left hover:underline ${open === check.id ? 'underline decoration-accent decoration-2 underline-offset-4' : ''}`}
                  >
                    {check.title}
                  </button>
                </th>
                <td className="w-2/5 py-0.5">
                  <UtilisationBar value={check.utilisation} word={check.word} strong={index === 0} />
                </td>
                <td className="py-0.5 pl-3 text-right font-mono font-medium tabular-nums">
                  {check.utilisation === null ? '–' : numbers.decimals(check.utilisation, 2)}
                </td>
                <td className={`py-0.5 pl-2 ${verdictLook[check.word].text}`}>
                  <span aria-hidden>{verdictLook[check.word].sign}</span>
                  <span className="sr-only">{verdictLook[check.word].word}</span>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </div>
  );
}

function LeastDepth({ depth, next }: { depth: RequiredDepth; next: StockSection | null }) {
  const numbers = useNumbers();
  const { exact, rounded, why } = depth.all;
  if (exact === null || rounded === null) return <>No depth is enough{why ? `: ${why}` : ''}.</>;
  const unit = unitForReading(depth.unit);
  return (
    <>
      Least depth <span className="font-mono">{numbers.digits(exact, 5)}</span>, so{' '}
      <strong className="text-ink">
        {numbers.exact(rounded)} {unit}
      </strong>
      {next ? (
        <>
          ; next in stock <strong className="text-ink">{numbers.exact(next.actual.h)}</strong> (ordered{' '}
          {numbers.exact(next.nominal.h)}).
        </>
      ) : (
        <>; nothing this broad in stock is deep enough.</>
      )}
    </>
  );
}
