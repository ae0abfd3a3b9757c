import { createContext, useContext } from 'react';
import type { Edition, Member } from '#shared/basis/schema/index.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { SheetEvent, Unread } from '../lib/sheet.ts';

/** What the fields of a sheet share. */
export interface SheetTools {
  member: Member;
  edition: Edition;
  readOnly: boolean;
  unread: Unread;
  /** Findings of the engine on the member, by pointer. */
  findings: readonly Finding[];
  send: (event: SheetEvent) => void;
}

export const SheetContext = createContext<SheetTools | null>(null);

export function useTools(): SheetTools {
  const tools = useContext(SheetContext);
  if (!tools) throw new Error('A field stands outside its sheet.');
  return tools;
}
