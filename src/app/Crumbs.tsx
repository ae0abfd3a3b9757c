import { Link } from 'react-router-dom';
import type { Crumb } from '#src/components/crumbs.ts';

/** Where the page stands; the last is the page itself. */
export function Crumbs({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Where you are" className="ml-2 min-w-0 overflow-hidden md:ml-10">
      <ol className="flex items-center gap-2 text-sm whitespace-nowrap">
        {crumbs.map(({ label, to }, index) => (
          <li
            key={label + index}
            className={`flex min-w-0 items-center gap-2 ${index < crumbs.length - 1 ? 'hidden sm:flex' : ''}`}
          >
            {index > 0 && (
              <span aria-hidden className="hidden text-pencil sm:inline">
                /
              </span>
            )}
            {to ? (
              <Link to={to} className="truncate text-soft hover:text-ink hover:underline">
                {label}
              </Link>
            ) : (
              <span aria-current="page" className="truncate font-semibold">
                {label}
              </span>
            )}
          </li>
        ))}
      </ol>
    </nav>
  );
}
