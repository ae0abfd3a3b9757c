import type { Finding } from '#shared/engine/types.ts';

const looks = {
  error: ['■', 'text-fail', 'Error'],
  warning: ['▲', 'text-close', 'Warning'],
  note: ['◆', 'text-soft', 'Note'],
} as const;

/** What the compiler found, errors first, each with its place. */
export function FindingsView({ findings }: { findings: readonly Finding[] }) {
  const order = ['error', 'warning', 'note'];
  const sorted = [...findings].sort((a, b) => order.indexOf(a.severity) - order.indexOf(b.severity));
  return (
    <aside
      aria-label="Findings"
      className="border-pencil/60 px-4 pt-6 pb-8 xl:sticky xl:top-14 xl:max-h-[calc(100dvh-3.5rem)] xl:overflow-y-auto xl:border-l xl:px-6"
      tabIndex={0}
    >
      <h2 className="border-b border-ink pb-1 text-lg italic">Findings</h2>
      {sorted.length === 0 && <p className="py-2 text-soft">Nothing wrong and nothing doubtful.</p>}
      <ul>
        {sorted.map((finding, index) => {
          const [sign, colour, word] = looks[finding.severity];
          return (
            <li key={index} className="flex gap-2.5 border-b border-rule py-2 text-sm">
              <span aria-hidden className={colour}>
                {sign}
              </span>
              <span className="min-w-0">
                <span className="sr-only">{word}: </span>
                {finding.message}
                {finding.pointer && (
                  <span className="block font-mono text-xs break-all text-soft">{finding.pointer}</span>
                )}
              </span>
            </li>
          );
        })}
      </ul>
    </aside>
  );
}
