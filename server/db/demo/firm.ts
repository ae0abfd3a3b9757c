import type { Role } from '#shared/access/index.ts';

/** The demo firm: invented, as are its people, projects, stock and house values. */
export const demoFirm = { name: 'Wrenlock Structures (invented)', invented: true };

/** One password for all of the demo, printed by `npm start`. */
export const demoPassword = 'shake-wane-and-heartwood';

export const demoPeople: readonly { role: Role; name: string; email: string }[] = [
  { role: 'principal', name: 'Maud Ellerby', email: 'principal@wrenlock.example' },
  { role: 'keeper', name: 'Ivo Santander', email: 'keeper@wrenlock.example' },
  { role: 'engineer', name: 'Tamsin Oduya', email: 'engineer@wrenlock.example' },
  { role: 'checker', name: 'Bram Keuning', email: 'checker@wrenlock.example' },
  { role: 'reader', name: 'Posy Larkhill', email: 'reader@wrenlock.example' },
];
