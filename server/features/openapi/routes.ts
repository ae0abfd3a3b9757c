import { Router } from 'express';
import { readOpenApi } from '#shared/contracts/openapi.ts';
import { openRoute, type Route } from '#server/http/route.ts';
import { describeApi } from './describe.ts';
import { docsPage, docsStyles } from './page.ts';

const description = describeApi();

export const openApiRoutes: readonly Route[] = [openRoute(readOpenApi, () => Promise.resolve(description))];

/** The description as a page for people; it holds nothing of any firm. */
export function docsPages(): Router {
  const page = docsPage();
  const router = Router();
  router.get('/docs', (_request, response) => {
    response.set('Cache-Control', 'no-cache').type('html').send(page);
  });
  router.get('/docs.css', (_request, response) => {
    response.set('Cache-Control', 'no-cache').type('css').send(docsStyles);
  });
  return router;
}
