/** What a person chose: follow the system, or one of the two. */
export type ThemeChoice = 'system' | 'light' | 'dark';

const key = 'ledgerbeam.theme';

export function themeChoice(): ThemeChoice {
  try {
    const choice = localStorage.getItem(key);
    return choice === 'light' || choice === 'dark' ? choice : 'system';
  } catch {
    return 'system';
  }
}

/** Sets a choice on the document; without one the style sheet follows the system by itself. */
export function applyTheme(choice: ThemeChoice = themeChoice()): void {
  const { dataset } = document.documentElement;
  if (choice === 'system') delete dataset['theme'];
  else dataset['theme'] = choice;
}

export function chooseTheme(choice: ThemeChoice): void {
  try {
    localStorage.setItem(key, choice);
  } catch {
    // Without storage the choice holds until the page is left.
  }
  applyTheme(choice);
}
