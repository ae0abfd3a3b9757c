import { hash, verify, type Options } from '@node-rs/argon2';

/** argon2id, as OWASP's password storage cheat sheet recommends: 19 MiB, two passes, one lane. */
const usual: Options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };
/** For tests only, where hundreds of people sign in. */
const cheap: Options = { memoryCost: 64, timeCost: 1, parallelism: 1 };

export interface Passwords {
  hash(password: string): Promise<string>;
  /** Takes as long for an account that does not exist (null) as for one that does. */
  matches(stored: string | null, password: string): Promise<boolean>;
}

/** Password hashing with argon2id, which is the package's default algorithm. */
export function createPasswords({ fast = false } = {}): Passwords {
  const options = fast ? cheap : usual;
  const nobody = hash('nobody has this password', options);
  return {
    hash: (password) => hash(password, options),
    async matches(stored, password) {
      const right = await verify(stored ?? (await nobody), password);
      return stored !== null && right;
    },
  };
}
