import { join } from 'node:path';
import express, { Router } from 'express';
import staticGzip from 'express-static-gzip';
import { notFound } from './problem.ts';

/** The built client: hashed files for good, the page itself asked for anew each time. */
export function serveClient(folder: string): Router {
  const router = Router();
  router.use(
    '/assets',
    // The build lays compressed copies beside the files.
    staticGzip(join(folder, 'assets'), {
      enableBrotli: true,
      orderPreference: ['br', 'gz'],
      index: false,
      serveStatic: { immutable: true, maxAge: '1y', redirect: false },
    }),
    () => {
      throw notFound();
    },
  );
  router.use(express.static(folder, { maxAge: 0, index: false, redirect: false }));
  // Every other address is a page of the client, which knows its own.
  router.get('/{*page}', (_request, response) => {
    response.set('Cache-Control', 'no-cache');
    response.sendFile('index.html', { root: folder });
  });
  return router;
}
