import { randomUUID } from 'node:crypto';
import { pino, type DestinationStream, type Logger, type LoggerOptions } from 'pino';
import { pinoHttp } from 'pino-http';

/** The server's log: JSON lines, without cookies, tokens, passwords or bodies. */
export function createLog(level: string, destination?: DestinationStream): Logger {
  const options: LoggerOptions = {
    level,
    redact: {
      paths: [
        'req.headers.cookie',
        'req.headers.authorization',
        'req.headers["x-csrf-token"]',
        'res.headers["set-cookie"]',
        '*.password',
        'err.sql',
        'err.parameters',
        'err.parent',
        'err.original',
      ],
      remove: true,
    },
  };
  return destination ? pino(options, destination) : pino(options);
}

/** One line for each request; the id is the reference that a person is given when something fails. */
export function logRequests(logger: Logger) {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID().slice(0, 8),
    // What failed is logged once, with its cause, where errors are answered.
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'warn' : 'debug'),
  });
}
