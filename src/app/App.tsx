import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useMemo } from 'react';
import { RouterProvider } from 'react-router-dom';
import { ApiProblem } from '#src/lib/api/call.ts';
import { localeChoice, NumbersContext, numbersFor } from '#src/lib/format/locale.ts';
import { router } from './router.tsx';

const client = new QueryClient({
  defaultOptions: {
    queries: {
      // What was turned down stays turned down; only a lost connection is worth another try.
      retry: (count, error) => count < 2 && error instanceof ApiProblem && error.code === 'offline',
      refetchOnWindowFocus: false,
      staleTime: 10_000,
    },
  },
});

export function App() {
  const numbers = useMemo(() => numbersFor(localeChoice()), []);
  return (
    <QueryClientProvider client={client}>
      <NumbersContext value={numbers}>
        <RouterProvider router={router} />
      </NumbersContext>
    </QueryClientProvider>
  );
}
