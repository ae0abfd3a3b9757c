import { lazy, Suspense, useEffect, useState } from 'react';
import { Navigate, NavLink, Outlet, ScrollRestoration, useLocation } from 'react-router-dom';
import { Archive, ClipboardList, FolderClosed, House, Layers, Monitor, Search } from 'lucide-react';
import { Emblem } from '#src/components/Emblem.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { CrumbsContext, type Crumb } from '#src/components/crumbs.ts';
import { useSession } from '#src/lib/api/session.ts';
import { AccountMenu } from './AccountMenu.tsx';
import { Crumbs } from './Crumbs.tsx';
import { SignInAgain } from './SignInAgain.tsx';

// Opened on request, and fetched then.
const Finder = lazy(() => import('./Finder.tsx'));

const places = [
  { to: '/', label: 'Desk', Icon: Monitor },
  { to: '/projects', label: 'Projects', Icon: FolderClosed },
  { to: '/bases', label: 'Bases', Icon: Layers },
  { to: '/stock', label: 'Stock', Icon: Archive },
  { to: '/trail', label: 'Trail', Icon: ClipboardList },
  { to: '/firm', label: 'Firm', Icon: House },
];

/** The frame around every page: where one is, where one can go, and who one is. */
export function Shell() {
  const { data, isPending, error } = useSession();
  const { pathname } = useLocation();
  const [crumbs, setCrumbs] = useState<readonly Crumb[]>([]);
  const [finding, setFinding] = useState(false);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if ((event.ctrlKey || event.metaKey) && event.key.toLowerCase() === 'k') {
        event.preventDefault();
        setFinding(true);
      }
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, []);

  if (isPending) return <Loading what="your session" />;
  if (error) {
    return (
      <main className="mx-auto max-w-xl p-8">
        <ProblemNotice error={error} />
      </main>
    );
  }
  if (!data.signedIn) return <Navigate to="/sign-in" replace state={{ from: pathname }} />;

  return (
    <CrumbsContext value={setCrumbs}>
      <a
        href="#page"
        className="sr-only focus:not-sr-only focus:absolute focus:z-50 focus:bg-paper focus:p-3"
      >
        Skip to the page
      </a>
      <header className="no-print sticky top-0 z-30 flex h-14 items-center gap-3 border-b border-pencil/60 bg-paper px-3 md:px-4">
        <NavLink to="/" className="flex items-center gap-2.5" aria-label="Ledgerbeam, desk">
          <Emblem />
          <span className="hidden font-serif text-xl font-medium sm:inline">Ledgerbeam</span>
        </NavLink>
        <Crumbs crumbs={crumbs} />
        <button
          type="button"
          onClick={() => setFinding(true)}
          className="ml-auto flex min-h-9 items-center gap-3 rounded border border-pencil/70 bg-raised px-3 text-sm text-soft md:w-72"
        >
          <Search className="size-4 md:hidden" aria-hidden />
          <span className="sr-only md:not-sr-only">Find a project, member, clause</span>
          <kbd className="ml-auto hidden rounded border border-rule px-1.5 font-mono text-xs md:inline">
            Ctrl K
          </kbd>
        </button>
        <AccountMenu signedIn={data.signedIn} />
      </header>
      <div className="md:flex">
        <nav
          aria-label="Main"
          className="no-print fixed inset-x-0 bottom-0 z-30 flex border-t border-pencil/60 bg-paper md:sticky md:top-14 md:h-[calc(100dvh-3.5rem)] md:w-19 md:shrink-0 md:flex-col md:border-t-0 md:border-r md:pt-3"
        >
          {places.map(({ to, label, Icon }) => (
            <NavLink
              key={to}
              to={to}
              end={to === '/'}
              className={({ isActive }) =>
                `flex flex-1 flex-col items-center gap-1 border-t-2 py-2 text-xs md:flex-none md:border-t-0 md:border-l-3 md:py-2.5 ${
                  isActive
                    ? 'border-accent font-semibold text-ink'
                    : 'border-transparent text-soft hover:text-ink'
                }`
              }
            >
              <Icon className="size-4.5" strokeWidth={1.6} aria-hidden />
              {label}
            </NavLink>
          ))}
        </nav>
        <main id="page" tabIndex={-1} className="min-w-0 flex-1 pb-20 outline-none md:pb-10">
          <Suspense fallback={<Loading what="the page" />}>
            <Outlet />
          </Suspense>
        </main>
      </div>
      {finding && (
        <Suspense>
          <Finder onClose={() => setFinding(false)} />
        </Suspense>
      )}
      <SignInAgain email={data.signedIn.person.email} />
      <ScrollRestoration />
    </CrumbsContext>
  );
}
