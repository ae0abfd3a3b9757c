import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { Shell } from './Shell.tsx';
import { PageError } from './PageError.tsx';

/** A page that is fetched when it is first visited. */
const page = (path: string, load: () => Promise<{ default: React.ComponentType }>): RouteObject => ({
  path,
  lazy: async () => ({ Component: (await load()).default }),
  errorElement: <PageError />,
  HydrateFallback: () => null,
});

export const router = createBrowserRouter([
  page('/sign-in', () => import('#src/routes/sign-in.tsx')),
  {
    element: <Shell />,
    errorElement: <PageError />,
    children: [
      page('/', () => import('#src/routes/desk.tsx')),
      page('/projects', () => import('#src/routes/projects.tsx')),
      page('/projects/:projectId', () => import('#src/routes/project.tsx')),
      page('/projects/:projectId/members/:memberId', () => import('#src/routes/member.tsx')),
      page('/bases', () => import('#src/routes/bases.tsx')),
      page('/bases/:basisId', () => import('#src/routes/basis.tsx')),
      page('/editions/:editionId', () => import('#src/routes/edition.tsx')),
      page('/editions/:editionId/draft', () => import('#src/routes/draft.tsx')),
      page('/stock', () => import('#src/routes/stock.tsx')),
      page('/stock/:stockId', () => import('#src/routes/stock-list.tsx')),
      page('/trail', () => import('#src/routes/trail.tsx')),
      page('/firm', () => import('#src/routes/firm.tsx')),
      page('*', () => import('#src/routes/not-found.tsx')),
    ],
  },
]);
