import type { Server } from 'node:http';
import { buildApp, type App, type AppOptions } from '#server/app.ts';

/** An application that listens. */
export interface Listening {
  port: number;
  close: () => Promise<void>;
}

/** A port that another program holds, or one that this user may not take. */
export class PortProblem extends Error {}

function listen(app: App, host: string, port: number): Promise<Server> {
  return new Promise((resolve, reject) => {
    const server = app.express.listen(port, host, (error?: Error) => {
      if (!error) resolve(server);
    });
    server.once('error', (error: NodeJS.ErrnoException) => {
      if (error.code === 'EADDRINUSE') {
        reject(
          new PortProblem(
            `Port ${port} is taken by another program. Stop it, or start with another: PORT=${port + 1} npm start`,
          ),
        );
      } else if (error.code === 'EACCES') {
        reject(
          new PortProblem(`Port ${port} is for the administrator. Start with another: PORT=5273 npm start`),
        );
      } else reject(error);
    });
  });
}

/** Builds the application and listens; `close` lets requests under way finish. */
export async function serve(options: AppOptions & { host: string; port: number }): Promise<Listening> {
  const app = buildApp(options);
  try {
    const server = await listen(app, options.host, options.port);
    const address = server.address();
    return {
      port: typeof address === 'object' && address ? address.port : options.port,
      close: async () => {
        await new Promise<void>((resolve) => {
          server.close(() => resolve());
          server.closeIdleConnections();
          setTimeout(() => server.closeAllConnections(), 3000).unref();
        });
        await app.close();
      },
    };
  } catch (error) {
    await app.close();
    throw error;
  }
}
