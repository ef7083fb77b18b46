import { createBrowserRouter, createMemoryRouter, type RouteObject } from 'react-router-dom';
import { meQuery } from '../lib/session-query';
import { queryClient } from '../lib/query-client';
import { onSessionEnd } from '../lib/session';
import { Layout } from './layout/Layout';
import { Opening } from './layout/Opening';
import { RouteFailed } from './layout/RouteFailed';
import { requireMe, signInAddress } from './require-me';

/** Every screen of product.md §3 that exists; each loads when it is first opened. */
export const routes: RouteObject[] = [
  {
    path: '/sign-in',
    lazy: () => import('./routes/sign-in'),
    ErrorBoundary: RouteFailed,
    HydrateFallback: Opening,
  },
  {
    loader: requireMe,
    Component: Layout,
    ErrorBoundary: RouteFailed,
    HydrateFallback: Opening,
    children: [
      {
        ErrorBoundary: RouteFailed,
        children: [
          { index: true, lazy: () => import('./routes/ranking') },
          { path: 'valves', lazy: () => import('./routes/valves') },
          { path: 'valves/:tag', lazy: () => import('./routes/valve') },
          { path: 'trends', lazy: () => import('./routes/trends') },
          { path: 'trends/new', lazy: () => import('./routes/new-trend') },
          { path: 'trends/:id', lazy: () => import('./routes/trend') },
          { path: 'runs', lazy: () => import('./routes/runs') },
          { path: 'runs/:id', lazy: () => import('./routes/run') },
          { path: 'me', lazy: () => import('./routes/me') },
          { path: 'design', lazy: () => import('./routes/design') },
          { path: '*', lazy: () => import('./routes/not-found') },
        ],
      },
    ],
  },
];

type Router = ReturnType<typeof createBrowserRouter>;

/** A session that ends while a page is open leads to the sign-in, and back to the page afterwards. */
function endingAtSignIn(router: Router): Router {
  onSessionEnd(() => {
    const { pathname, search } = router.state.location;
    queryClient.setQueryData(meQuery.queryKey, null);
    void router.navigate(signInAddress(pathname + search));
  });
  return router;
}

export function openRouter(): Router {
  return endingAtSignIn(createBrowserRouter(routes));
}

/** The same screens without a browser's address bar, for tests. */
export function openRouterAt(address: string): Router {
  return endingAtSignIn(createMemoryRouter(routes, { initialEntries: [address] }));
}
