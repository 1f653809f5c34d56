import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, Outlet, ScrollRestoration, type RouteObject } from 'react-router-dom';
import { NotFoundPage, RouteErrorPage } from './error-pages.tsx';
import { OfflineNotice } from './offline-notice.tsx';
import { Shell } from './shell.tsx';
import { routes } from './routes.tsx';

function Root() {
  return (
    <>
      <OfflineNotice />
      <Outlet />
      <ScrollRestoration />
    </>
  );
}

/** Every route of the product beneath one root, so that no failure leaves a blank page. */
export function routeTree(queryClient: QueryClient): RouteObject[] {
  return [
    {
      element: <Root />,
      errorElement: (
        <Shell homeTo="/">
          <RouteErrorPage />
        </Shell>
      ),
      // Shown for the moment before the first route's module and data are there.
      hydrateFallbackElement: <></>,
      children: [
        ...routes(queryClient),
        {
          path: '*',
          element: (
            <Shell homeTo="/">
              <NotFoundPage />
            </Shell>
          ),
        },
      ],
    },
  ];
}

export function createRouter(queryClient: QueryClient) {
  return createBrowserRouter(routeTree(queryClient));
}
