import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { roleTitles } from '#shared/access/index.ts';
import type { SignedIn } from '#shared/contracts/session.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField } from '#src/components/Field.tsx';
import { useSignOut } from '#src/lib/api/session.ts';
import { chooseLocale, localeChoice } from '#src/lib/format/locale.ts';
import { chooseTheme, themeChoice, type ThemeChoice } from '#src/lib/theme.ts';

const initials = (name: string) =>
  name
    .split(/\s+/)
    .map((part) => part[0] ?? '')
    .join('')
    .slice(0, 2)
    .toUpperCase();

const locales = [
  ['', 'As the browser says'],
  ['en-GB', '1 234.5 (English)'],
  ['de-DE', '1 234,5 (decimal comma)'],
] as const;

/** Who is signed in, how it looks to them, and the way out. */
export function AccountMenu({ signedIn }: { signedIn: SignedIn }) {
  const [open, setOpen] = useState(false);
  const [theme, setTheme] = useState<ThemeChoice>(themeChoice);
  const signOut = useSignOut();
  const navigate = useNavigate();
  const { person, firm, roles } = signedIn;
  return (
    <>
      <button
        type="button"
        onClick={() => setOpen(true)}
        className="grid size-9 shrink-0 place-items-center rounded-full border border-ink text-xs font-semibold"
        aria-label={`${initials(person.name)}, account of ${person.name}`}
      >
        {initials(person.name)}
      </button>
      <Dialog title={person.name} open={open} onClose={() => setOpen(false)}>
        <p className="mb-4 text-soft">
          {roles.map((role) => roleTitles[role]).join(', ')} at {firm.name}
          {firm.invented && ' (an invented firm for demonstration)'}. {person.email}
        </p>
        <SelectField
          label="Theme"
          value={theme}
          onChange={(event) => {
            const choice = event.target.value as ThemeChoice;
            setTheme(choice);
            chooseTheme(choice);
          }}
        >
          <option value="system">As the system says</option>
          <option value="light">Paper</option>
          <option value="dark">Night</option>
        </SelectField>
        <SelectField
          label="Numbers"
          hint="Takes effect after a reload."
          defaultValue={locales.some(([id]) => id === localeChoice()) ? localeChoice() : ''}
          onChange={(event) => chooseLocale(event.target.value === '' ? null : event.target.value)}
        >
          {locales.map(([id, label]) => (
            <option key={id} value={id}>
              {label}
            </option>
          ))}
        </SelectField>
        <Button
          onClick={() => {
            void signOut().then(() => navigate('/sign-in'));
          }}
        >
          Sign out
        </Button>
      </Dialog>
    </>
  );
}
