import { lazy, Suspense } from 'react';

const Set = lazy(() => import('./MathematicsSet.tsx'));

/** A formula set as mathematics; its plain text until the setting has arrived, and for those who can't see it. */
export function Mathematics({ formula }: { formula: string }) {
  return (
    <Suspense fallback={<code className="font-mono">{formula}</code>}>
      <Set formula={formula} />
    </Suspense>
  );
}
