import { Link, useRouteError } from 'react-router-dom';
import { ProblemNotice } from '#src/components/Notice.tsx';

/** What a page shows when it could not be made. */
export function PageError() {
  const error = useRouteError();
  return (
    <main className="mx-auto max-w-xl p-8">
      <h1 className="text-2xl">This page could not be shown</h1>
      <ProblemNotice error={error} />
      <p>
        <Link to="/" className="text-accent-ink underline">
          Go to the desk
        </Link>{' '}
        or reload the page. What you typed is kept on this machine.
      </p>
    </main>
  );
}
