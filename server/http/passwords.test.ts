import { describe, expect, it } from 'vitest';
import { createPasswords } from './passwords.ts';

describe('passwords', () => {
  it('are kept as argon2id with 19 MiB and two passes', async () => {
    expect(await createPasswords().hash('a long sentence')).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  it('match themselves only, and an account that does not exist matches nothing', async () => {
    const passwords = createPasswords({ fast: true });
    const stored = await passwords.hash('right');
    expect(await passwords.matches(stored, 'right')).toBe(true);
    expect(await passwords.matches(stored, 'Right')).toBe(false);
    expect(await passwords.matches(null, 'nobody has this password')).toBe(false);
  });

  it('take the same work for an account that does not exist', async () => {
    const passwords = createPasswords();
    const stored = await passwords.hash('right');
    const time = async (of: string | null) => {
      const from = performance.now();
      for (let i = 0; i < 5; i += 1) await passwords.matches(of, 'wrong');
      return performance.now() - from;
    };
    await time(null);
    const [known, unknown] = [await time(stored), await time(null)];
    // A missing hash that was not looked at would take thousands of times less.
    expect(unknown).toBeGreaterThan(known / 5);
  });
});
