import { useEffect, useRef, useState } from 'react';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { TextField } from '#src/components/Field.tsx';
import { ProblemNotice } from '#src/components/Notice.tsx';
import { onSessionEnd } from '#src/lib/api/call.ts';
import { useSignIn } from '#src/lib/api/session.ts';

/** Asks for the password over the page when a session has ended, so that nothing typed is lost. */
export function SignInAgain({ email }: { email: string }) {
  const [open, setOpen] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const waiting = useRef<((renewed: boolean) => void)[]>([]);
  const signIn = useSignIn();
  useEffect(() => {
    onSessionEnd(
      () =>
        new Promise((resolve) => {
          waiting.current.push(resolve);
          setOpen(true);
        }),
    );
    return () => onSessionEnd(null);
  }, []);
  const answer = (renewed: boolean) => {
    waiting.current.splice(0).forEach((resolve) => resolve(renewed));
    setOpen(false);
    setError(null);
  };
  return (
    <Dialog title="Your session has ended" open={open} onClose={() => answer(false)}>
      <p className="mb-3 text-soft">Sign in again to go on where you were. Nothing you typed is lost.</p>
      <ProblemNotice error={error} />
      <form
        onSubmit={(event) => {
          event.preventDefault();
          const password = new FormData(event.currentTarget).get('password');
          signIn(email, typeof password === 'string' ? password : '')
            .then(() => answer(true))
            .catch(setError);
        }}
      >
        <TextField label="E-mail" value={email} readOnly autoComplete="username" />
        <TextField
          label="Password"
          name="password"
          type="password"
          autoComplete="current-password"
          required
          autoFocus
        />
        <Button type="submit" kind="main">
          Sign in and go on
        </Button>
      </form>
    </Dialog>
  );
}
