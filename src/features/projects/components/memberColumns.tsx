import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { MemberRow } from '#shared/contracts/projects.ts';
import type { VerdictWord } from '#shared/engine/types.ts';
import { VerdictMark } from '#src/components/StateMark.tsx';
import { UtilisationBar } from '#src/components/UtilisationBar.tsx';
import type { Numbers } from '#src/lib/format/locale.ts';
import { moment } from '#src/lib/format/time.ts';

export interface MemberColumn {
  key: string;
  title: string;
  width: string;
  right?: boolean;
  /** What it is sorted by; left out: it can't be. */
  by?: (row: MemberRow) => string | number;
  cell: (row: MemberRow, numbers: Numbers) => ReactNode;
  /** Shown on a phone too. */
  narrow?: boolean;
}

/** Worst first, as an engineer looks for them. */
const severity: Readonly<Record<VerdictWord, number>> = { fails: 0, close: 1, none: 2, passes: 3 };

const longest = ({ spans }: MemberRow) => Math.max(...spans);

const departuresInWords = (count: number) => (count === 1 ? '1 departure' : `${count} departures`);

/** Columns of the members table after the mark, which links to the sheet. */
export const memberColumns: readonly MemberColumn[] = [
  {
    key: 'use',
    title: 'Use',
    width: 'minmax(6.5rem,1fr)',
    by: ({ use }) => use ?? '',
    cell: ({ use }) => use ?? '',
  },
  {
    key: 'span',
    title: 'Span',
    width: '8rem',
    right: true,
    by: longest,
    cell: (row, numbers) => (
      <>
        {row.spans.length > 1 && <span className="font-sans text-soft">{row.spans.length} spans, </span>}
        {numbers.decimals(longest(row), row.units === 'metric' ? 0 : 1)}{' '}
        <span className="text-xs text-soft">{row.units === 'metric' ? 'mm' : 'in'}</span>
      </>
    ),
  },
  {
    key: 'section',
    title: 'Section',
    width: '7rem',
    right: true,
    by: ({ section }) => section.h * 10_000 + section.b,
    cell: ({ section }, numbers) =>
      `${section.pieces > 1 ? `${section.pieces} of ` : ''}${numbers.exact(section.b)} × ${numbers.exact(section.h)}`,
  },
  { key: 'grade', title: 'Grade', width: '4rem', by: ({ grade }) => grade, cell: ({ grade }) => grade },
  {
    key: 'check',
    title: 'Governing check',
    width: 'minmax(7.5rem,1fr)',
    by: ({ result }) => result?.checkTitle ?? '',
    cell: ({ result }) => result?.checkTitle ?? result?.because ?? 'not checked',
  },
  {
    key: 'bar',
    title: 'Utilisation',
    width: '5.5rem',
    cell: ({ result }) => (
      <UtilisationBar value={result?.utilisation ?? null} word={result?.word ?? 'none'} />
    ),
  },
  {
    key: 'value',
    title: 'value',
    width: '3rem',
    right: true,
    narrow: true,
    by: ({ result }) => result?.utilisation ?? (result?.word === 'fails' ? 99 : -1),
    cell: ({ result }, numbers) =>
      typeof result?.utilisation === 'number' ? numbers.decimals(result.utilisation, 2) : '–',
  },
  {
    key: 'word',
    title: 'Verdict',
    width: '5.75rem',
    narrow: true,
    by: ({ result }) => severity[result?.word ?? 'none'],
    cell: ({ result }) => (
      <>
        <VerdictMark word={result?.word ?? 'none'} />
        {result && result.departures > 0 && (
          <span className="ml-1 text-close" title={departuresInWords(result.departures)}>
            <span aria-hidden>◇</span>
            <span className="sr-only">{departuresInWords(result.departures)}</span>
          </span>
        )}
      </>
    ),
  },
  {
    key: 'edition',
    title: 'Edition',
    width: '3.5rem',
    right: true,
    by: ({ result }) => result?.edition.number ?? 0,
    cell: ({ result }) =>
      result ? (
        <Link
          to={`/editions/${result.edition.id}`}
          className="hover:underline"
          title={`${result.edition.basisTitle}, edition ${result.edition.number}`}
        >
          <span className="sr-only">{result.edition.basisTitle}, edition </span>
          {result.edition.number}
        </Link>
      ) : (
        '–'
      ),
  },
  {
    key: 'unverified',
    title: 'Unverified',
    width: '4.5rem',
    right: true,
    by: ({ result }) => result?.unverified ?? 0,
    cell: ({ result }) =>
      result && result.unverified > 0 ? (
        <span className="text-close">
          <span aria-hidden>◆</span> {result.unverified}
          <span className="sr-only"> values behind this unverified</span>
        </span>
      ) : (
        '–'
      ),
  },
  {
    key: 'saved',
    title: 'Saved',
    width: '6.5rem',
    by: ({ savedAt }) => savedAt,
    cell: ({ savedAt }) => <span className="text-xs text-soft">{moment(savedAt)}</span>,
  },
];
