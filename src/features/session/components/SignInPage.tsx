import { useState } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import { Button } from '#src/components/Button.tsx';
import { Emblem } from '#src/components/Emblem.tsx';
import { TextField } from '#src/components/Field.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { useSignIn } from '#src/lib/api/session.ts';

export function SignInPage() {
  const signIn = useSignIn();
  const navigate = useNavigate();
  const from = (useLocation().state as { from?: string } | null)?.from ?? '/';
  const [error, setError] = useState<unknown>(null);
  const [busy, setBusy] = useState(false);
  return (
    <main className="grid min-h-dvh place-items-center p-5">
      <title>Sign in · Ledgerbeam</title>
      <div className="w-full max-w-sm">
        <div className="mb-7 flex items-center gap-4">
          <Emblem className="size-14" />
          <div>
            <h1 className="text-3xl">Ledgerbeam</h1>
            <p className="text-soft">Every beam, and every factor behind it.</p>
          </div>
        </div>
        <ProblemNotice error={error} />
        <form
          onSubmit={(event) => {
            event.preventDefault();
            const data = new FormData(event.currentTarget);
            const [email, password] = [data.get('email'), data.get('password')];
            setBusy(true);
            setError(null);
            signIn(typeof email === 'string' ? email : '', typeof password === 'string' ? password : '')
              .then(() => navigate(from, { replace: true }))
              .catch((problem: unknown) => {
                setError(problem);
                setBusy(false);
              });
          }}
        >
          <TextField label="E-mail" name="email" type="email" autoComplete="username" required autoFocus />
          <TextField
            label="Password"
            name="password"
            type="password"
            autoComplete="current-password"
            required
          />
          <Button type="submit" kind="main" className="mt-1 w-full" disabled={busy}>
            {busy ? 'Signing in …' : 'Sign in'}
          </Button>
        </form>
        <p className="mt-8 border-t border-rule pt-3 text-xs text-soft">
          A calculation aid. Loads, assumptions and results are to be checked and adopted by a suitably
          qualified, where the law asks licensed, engineer against the codes in force at the site.
        </p>
      </div>
    </main>
  );
}
