import { describe, expect, it } from 'vitest';
import { BadSetting, readEnv } from './env.ts';

describe('settings', () => {
  it('has sensible ones when only the database is given', () => {
    const env = readEnv({ DATABASE_URL: 'postgres://a@127.0.0.1/b' });
    expect(env).toMatchObject({ host: '127.0.0.1', port: 5273, https: false });
  });

  it.each([
    [{}, /DATABASE_URL is not set/],
    [{ DATABASE_URL: 'mysql://x' }, /postgres:/],
    [{ DATABASE_URL: 'postgres://x', PORT: 'eighty' }, /PORT is “eighty”/],
    [{ DATABASE_URL: 'postgres://x', PORT: '70000' }, /65535/],
  ])('refuses %j', (source, reason) => {
    expect(() => readEnv(source)).toThrow(BadSetting);
    expect(() => readEnv(source)).toThrow(reason);
  });
});
