import { describe, expect, it } from 'vitest';
import type { Member } from '#shared/basis/schema/index.ts';
import { isChanged, openSheet, sheetAfter } from './sheet.ts';

const member: Member = {
  schema: 'member/1',
  mark: 'J1',
  units: 'metric',
  choices: {},
  grade: 'A',
  section: { b: 47, h: 195, pieces: 1 },
  spanMeasured: 'centres',
  spans: [{ length: 3600 }],
  supports: [{ restraint: 'pin' }, { restraint: 'pin' }],
  loads: [],
  inputs: {},
  departures: [],
};

describe('the sheet of a member', () => {
  it('undoes and redoes, and a new change drops what could be redone', () => {
    let sheet = openSheet(member, 1);
    sheet = sheetAfter(sheet, { kind: 'set', pointer: '/spans/0/length', value: 4000 });
    sheet = sheetAfter(sheet, { kind: 'set', pointer: '/section/h', value: 220 });
    sheet = sheetAfter(sheet, { kind: 'undo' });
    expect(sheet.document.section.h).toBe(195);
    expect(sheet.document.spans[0]?.length).toBe(4000);
    sheet = sheetAfter(sheet, { kind: 'redo' });
    expect(sheet.document.section.h).toBe(220);
    sheet = sheetAfter(sheetAfter(sheet, { kind: 'undo' }), { kind: 'set', pointer: '/grade', value: 'B' });
    expect(sheetAfter(sheet, { kind: 'redo' }).document.grade).toBe('B');
    expect(sheet.future).toEqual([]);
  });

  it('takes typing on in one field for one step', () => {
    let sheet = openSheet(member, 1);
    for (const value of [4, 42, 420, 4200]) {
      sheet = sheetAfter(sheet, { kind: 'set', pointer: '/spans/0/length', value });
    }
    expect(sheetAfter(sheet, { kind: 'undo' }).document.spans[0]?.length).toBe(3600);
  });

  it('keeps unreadable text with its message until the field is read again', () => {
    let sheet = openSheet(member, 1);
    sheet = sheetAfter(sheet, {
      kind: 'unreadable',
      pointer: '/section/h',
      text: 'tall',
      message: 'not a number',
    });
    expect(sheet.unread['/section/h']?.text).toBe('tall');
    expect(isChanged(sheet)).toBe(true);
    sheet = sheetAfter(sheet, { kind: 'set', pointer: '/section/h', value: 195 });
    expect(sheet.unread).toEqual({});
  });

  it('stays changed when typing went on during a save', () => {
    let sheet = openSheet(member, 1);
    sheet = sheetAfter(sheet, { kind: 'set', pointer: '/section/h', value: 220 });
    const sent = sheet.document;
    sheet = sheetAfter(sheet, { kind: 'set', pointer: '/section/h', value: 245 });
    sheet = sheetAfter(sheet, { kind: 'saved', document: sent, version: 2 });
    expect(isChanged(sheet)).toBe(true);
    expect(sheet.saved.version).toBe(2);
    expect(isChanged(sheetAfter(sheet, { kind: 'saved', document: sheet.document, version: 3 }))).toBe(false);
  });

  it('can undo past a merge with a colleague', () => {
    let sheet = openSheet(member, 1);
    sheet = sheetAfter(sheet, { kind: 'set', pointer: '/grade', value: 'B' });
    const theirs = { ...member, title: 'Landing' };
    const merged = { ...sheet.document, title: 'Landing' };
    sheet = sheetAfter(sheet, { kind: 'rebase', document: merged, saved: { document: theirs, version: 2 } });
    expect(sheet.document).toBe(merged);
    expect(sheetAfter(sheet, { kind: 'undo' }).document.grade).toBe('B');
  });
});
