/** Sessions (the form connect-pg-simple wants) and rate limits (the form rate-limiter-flexible wants). */
export const name = '006-sessions-and-limits';

export const up = `
CREATE TABLE sessions (
  sid varchar NOT NULL PRIMARY KEY,
  sess json NOT NULL,
  expire timestamp(6) NOT NULL
);
CREATE INDEX sessions_expire ON sessions (expire);

CREATE TABLE rate_limits (
  key varchar(255) PRIMARY KEY,
  points integer NOT NULL DEFAULT 0,
  expire bigint
);
`;
