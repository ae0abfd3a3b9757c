/** The environment, read and validated once. */
export interface Env {
  databaseUrl: string;
  ownerUrl: string | undefined;
  host: string;
  port: number;
  production: boolean;
  /** Whether the application is reached over https, so that the cookie is for https only. */
  https: boolean;
  sessionSecret: string | undefined;
  logLevel: string;
  /** Cheaper password hashing, for tests only. */
  quickPasswords: boolean;
}

/** A setting that can't be used, said for the person who set it. */
export class BadSetting extends Error {}

/** Reads the settings; throws `BadSetting` with a plain sentence. */
export function readEnv(source: NodeJS.ProcessEnv): Env {
  const databaseUrl = source['DATABASE_URL'];
  if (!databaseUrl)
    throw new BadSetting(
      'DATABASE_URL is not set. Start with “npm start”, which brings a database of its own.',
    );
  if (!/^postgres(ql)?:\/\//.test(databaseUrl))
    throw new BadSetting('DATABASE_URL has to begin with postgres://.');
  const port = Number(source['PORT'] ?? '5273');
  if (!Number.isInteger(port) || port < 0 || port > 65_535) {
    throw new BadSetting(`PORT is “${source['PORT'] ?? ''}”; it has to be a whole number up to 65535.`);
  }
  return {
    databaseUrl,
    ownerUrl: source['DATABASE_OWNER_URL'],
    host: source['HOST'] ?? '127.0.0.1',
    port,
    production: source['NODE_ENV'] === 'production',
    https: source['LEDGERBEAM_HTTPS'] === 'yes',
    sessionSecret: source['SESSION_SECRET'],
    logLevel: source['LOG_LEVEL'] ?? 'warn',
    quickPasswords: source['LEDGERBEAM_QUICK_PASSWORDS'] === 'yes',
  };
}
