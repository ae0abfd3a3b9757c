import type { Edition, Finding } from '#shared/engine/types.ts';
import { placeInWords } from '../placeInWords.ts';

const looks = {
  error: ['■', 'text-fail', 'Error'],
  warning: ['▲', 'text-close', 'Warning'],
  note: ['◆', 'text-soft', 'Note'],
} as const;

interface FindingsViewProps {
  edition: Edition;
  /** null: not read through yet. */
  findings: readonly Finding[] | null;
}

/** What the compiler found, errors first, each with its place. */
export function FindingsView({ edition, findings }: FindingsViewProps) {
  const order = ['error', 'warning', 'note'];
  const sorted = [...(findings ?? [])].sort((a, b) => order.indexOf(a.severity) - order.indexOf(b.severity));
  return (
    <aside
      aria-label="Findings"
      className="border-pencil/60 px-4 pt-6 pb-8 xl:sticky xl:top-14 xl:max-h-[calc(100dvh-3.5rem)] xl:overflow-y-auto xl:border-l xl:px-6"
      tabIndex={0}
    >
      <h2 className="border-b border-ink pb-1 text-lg italic">Findings</h2>
      {sorted.length === 0 && (
        <p className="py-2 text-soft" role="status">
          {findings ? 'Nothing wrong and nothing doubtful.' : 'Reading the edition through …'}
        </p>
      )}
      <ul>
        {sorted.map((finding, index) => {
          const [sign, colour, word] = looks[finding.severity];
          const place = placeInWords(edition, finding.pointer);
          return (
            <li key={index} className="flex gap-2.5 border-b border-rule py-2 text-sm">
              <span aria-hidden className={colour}>
                {sign}
              </span>
              <span className="min-w-0">
                <span className="sr-only">{word}: </span>
                {finding.message}
                {place && (
                  <a
                    href={`#${place.anchor}`}
                    className="block text-xs text-soft hover:text-ink hover:underline"
                  >
                    {place.words}
                  </a>
                )}
              </span>
            </li>
          );
        })}
      </ul>
    </aside>
  );
}
