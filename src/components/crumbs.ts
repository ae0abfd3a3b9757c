import { createContext, useContext, useEffect } from 'react';

export interface Crumb {
  label: string;
  to?: string;
}

/** Lets a page say where it stands; the frame shows it. */
export const CrumbsContext = createContext<(crumbs: readonly Crumb[]) => void>(() => undefined);

/** Says where the page stands, from the widest to itself, and names the window after it. */
export function useCrumbs(crumbs: readonly Crumb[]): void {
  const say = useContext(CrumbsContext);
  const text = JSON.stringify(crumbs);
  useEffect(() => {
    const said = JSON.parse(text) as Crumb[];
    say(said);
    const last = said.at(-1)?.label;
    document.title = last ? `${last} · Ledgerbeam` : 'Ledgerbeam';
  }, [say, text]);
}
