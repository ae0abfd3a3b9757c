import type { Member } from '#shared/basis/schema/index.ts';
import { withValue } from './pointer.ts';

/** Text that could not be read as a value: kept as typed, with what is wrong, by the field's pointer. */
export type Unread = Readonly<Record<string, { text: string; message: string }>>;

/** A member being worked on: the document, its history, and fields whose text can't be read. */
export interface Sheet {
  document: Member;
  /** Version and document as last known from the server. */
  saved: { document: Member; version: number };
  past: readonly Member[];
  future: readonly Member[];
  unread: Unread;
  /** Field of the last change: typing on in one field is one step of undo. */
  field: string | null;
}

export type SheetEvent =
  | { kind: 'set'; pointer: string; value: unknown }
  | { kind: 'replace'; document: Member }
  | { kind: 'unreadable'; pointer: string; text: string; message: string }
  | { kind: 'undo' }
  | { kind: 'redo' }
  | { kind: 'saved'; document: Member; version: number }
  | { kind: 'rebase'; document: Member; saved: Sheet['saved'] };

/** Steps of undo that are kept. */
const depth = 200;

export function openSheet(document: Member, version: number): Sheet {
  return { document, saved: { document, version }, past: [], future: [], unread: {}, field: null };
}

/** Whether there is anything that the server doesn't have. */
export function isChanged(sheet: Sheet): boolean {
  return sheet.document !== sheet.saved.document || Object.keys(sheet.unread).length > 0;
}

function stepped(sheet: Sheet, document: Member, unread: Unread, field: string | null): Sheet {
  if (document === sheet.document) return { ...sheet, unread };
  const past =
    field !== null && field === sheet.field ? sheet.past : [...sheet.past, sheet.document].slice(-depth);
  return { ...sheet, document, unread, past, future: [], field };
}

function without(unread: Unread, pointer: string): Unread {
  return Object.fromEntries(Object.entries(unread).filter(([key]) => key !== pointer));
}

/** The sheet after an event; pure, so that a reload or a replay ends in the same sheet. */
export function sheetAfter(sheet: Sheet, event: SheetEvent): Sheet {
  switch (event.kind) {
    case 'set':
      return stepped(
        sheet,
        withValue(sheet.document, event.pointer, event.value),
        without(sheet.unread, event.pointer),
        event.pointer,
      );
    case 'replace':
      return stepped(sheet, event.document, {}, null);
    case 'unreadable':
      return {
        ...sheet,
        unread: { ...sheet.unread, [event.pointer]: { text: event.text, message: event.message } },
      };
    case 'undo': {
      const document = sheet.past.at(-1);
      if (!document) return sheet;
      return {
        ...sheet,
        document,
        unread: {},
        field: null,
        past: sheet.past.slice(0, -1),
        future: [sheet.document, ...sheet.future],
      };
    }
    case 'redo': {
      const [document, ...future] = sheet.future;
      if (!document) return sheet;
      return { ...sheet, document, unread: {}, field: null, past: [...sheet.past, sheet.document], future };
    }
    case 'saved':
      return {
        ...sheet,
        // Typing may have gone on while the save was under way: only what was sent is saved.
        saved: { document: event.document, version: event.version },
      };
    case 'rebase':
      return { ...stepped(sheet, event.document, sheet.unread, null), saved: event.saved };
  }
}
