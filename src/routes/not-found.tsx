import { Link } from 'react-router-dom';

export default function NotFound() {
  return (
    <div className="mx-auto max-w-xl p-8">
      <h1 className="text-2xl">There is nothing at this address</h1>
      <p className="mt-2">
        It may have been removed, or belong to another firm.{' '}
        <Link to="/" className="text-accent-ink underline">
          Go to the desk
        </Link>
        .
      </p>
    </div>
  );
}
