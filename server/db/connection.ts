import pg from 'pg';
import { Sequelize } from 'sequelize';

/**
 * The application's connections: one pool for the data, a small one for sessions and rate limits, whose
 * packages want node-postgres itself. Without the door there is nothing of any firm behind them: row-level security
 * shows no row to a connection that has not said for which firm it asks.
 */
export interface Database {
  readonly sequelize: Sequelize;
  readonly pool: pg.Pool;
  close(): Promise<void>;
}

export interface ConnectionOptions {
  /** Most connections for data; half as many again, at least 2, for sessions. */
  most?: number;
  onPoolError?: (error: Error) => void;
}

/** Prepares the pools; connects on first use. */
export function connect(url: string, { most = 10, onPoolError }: ConnectionOptions = {}): Database {
  const sequelize = new Sequelize(url, {
    dialect: 'postgres',
    logging: false,
    pool: { max: most, acquire: 10_000, idle: 10_000 },
    dialectOptions: { connectionTimeoutMillis: 5000, statement_timeout: 30_000 },
  });
  const pool = new pg.Pool({
    connectionString: url,
    max: Math.max(2, Math.ceil(most / 2)),
    connectionTimeoutMillis: 5000,
  });
  // An idle connection that breaks must not end the process; the next request reports it.
  pool.on('error', (error) => onPoolError?.(error));
  return {
    sequelize,
    pool,
    close: async () => {
      await Promise.all([sequelize.close(), pool.end()]);
    },
  };
}
