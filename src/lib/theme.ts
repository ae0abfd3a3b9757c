/** What a person chose: follow the system, or one of the two. */
export type ThemeChoice = 'system' | 'light' | 'dark';

const key = 'ledgerbeam.theme';
const dark = window.matchMedia('(prefers-color-scheme: dark)');

function stored(): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return null;
  }
}

export function themeChoice(): ThemeChoice {
  const choice = stored();
  return choice === 'light' || choice === 'dark' ? choice : 'system';
}

/** Sets the theme on the document, now and whenever the system changes. */
export function applyTheme(): void {
  const choice = themeChoice();
  const effective = choice === 'system' ? (dark.matches ? 'dark' : 'light') : choice;
  document.documentElement.dataset['theme'] = effective;
}

export function chooseTheme(choice: ThemeChoice): void {
  try {
    localStorage.setItem(key, choice);
  } catch {
    // Without storage the choice holds until the page is left.
  }
  applyTheme();
  if (choice !== 'system') document.documentElement.dataset['theme'] = choice;
}

dark.addEventListener('change', applyTheme);
