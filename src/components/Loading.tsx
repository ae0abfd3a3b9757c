/** Shown while something is on its way; announced once. */
export function Loading({ what }: { what: string }) {
  return (
    <p role="status" className="py-10 text-center text-soft">
      Fetching {what} …
    </p>
  );
}
