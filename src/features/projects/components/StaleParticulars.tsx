import { Notice } from '#src/components/Notice.tsx';
import { clashing, differing, fieldTitles, type Field, type Particulars } from '../particulars.ts';

interface StaleParticularsProps {
  base: Particulars;
  mine: Particulars;
  stored: Particulars;
  stockTitle: (id: string | null) => string;
}

/** What a colleague saved meanwhile, and what saving now would do to it. */
export function StaleParticulars({ base, mine, stored, stockTitle }: StaleParticularsProps) {
  const words = (of: Particulars, field: Field): string => {
    if (field === 'stockListId') return stockTitle(of.stockListId);
    if (field !== 'choices') return of[field] || 'empty';
    const chosen = Object.entries(of.choices).map(([symbol, option]) => `${symbol}: ${option}`);
    return chosen.join(', ') || 'none';
  };
  const theirs = differing(base, stored);
  const clashes = clashing(base, mine, stored);
  return (
    <Notice tone="warning">
      <p className="font-medium">A colleague changed this project while you typed. Nothing was lost.</p>
      {theirs.length > 0 && (
        <ul className="mt-1 list-disc pl-5">
          {theirs.map((field) => (
            <li key={field}>
              {fieldTitles[field]} is now “{words(stored, field)}”
              {clashes.includes(field)
                ? `; yours, “${words(mine, field)}”, would replace it`
                : ', and stays so'}
              .
            </li>
          ))}
        </ul>
      )}
      {theirs.length === 0 && <p>None of these particulars is different: its edition or stock was.</p>}
      <p className="mt-1">Save again to store only the fields you changed, or close to leave it as it is.</p>
    </Notice>
  );
}
