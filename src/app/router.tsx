import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, Outlet, ScrollRestoration, type RouteObject } from 'react-router-dom';
import { NotFoundPage, RouteErrorPage } from './error-pages.tsx';
import { OfflineNotice } from './offline-notice.tsx';
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
      errorElement: <RouteErrorPage />,
      // Shown for the moment before the first route's module and data are there.
      hydrateFallbackElement: <></>,
      children: [...routes(queryClient), { path: '*', element: <NotFoundPage /> }],
    },
  ];
}

export function createRouter(queryClient: QueryClient) {
  return createBrowserRouter(routeTree(queryClient));
}
