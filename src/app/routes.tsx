import type { QueryClient } from '@tanstack/react-query';
import type { RouteObject } from 'react-router-dom';
import { homeLoader } from './home.ts';
import { lazyPage } from './lazy-page.ts';
import { siteRouteId } from './site-context.ts';
import { sitePages } from './site-pages.ts';
import { siteIndexLoader, SiteLayout, siteLoader } from './site-layout.tsx';

/**
 * The table of pages; those of a site stand in `site-pages.ts`. A route module under `./routes/` exports its loader and page and is loaded
 * when it is gone to; `:siteId` pages find their site with `useSite()`.
 */
export function routes(queryClient: QueryClient): RouteObject[] {
  return [
    { path: '/', loader: homeLoader(queryClient), element: <></> },
    {
      path: '/sign-in',
      lazy: lazyPage(queryClient, async () => {
        const { signInLoader, SignInPage } = await import('./routes/sign-in.tsx');
        return { loader: signInLoader, Component: SignInPage };
      }),
    },
    {
      path: '/account',
      lazy: lazyPage(queryClient, async () => {
        const { accountLoader, AccountPage } = await import('./routes/account.tsx');
        return { loader: accountLoader, Component: AccountPage };
      }),
    },
    {
      path: '/unsubscribe/:token',
      lazy: lazyPage(queryClient, async () => {
        const { UnsubscribePage } = await import('./routes/unsubscribe.tsx');
        return { Component: UnsubscribePage };
      }),
    },
    {
      path: '/administration/mails',
      lazy: lazyPage(queryClient, async () => {
        const { allMailsLoader, AllMailsPage } = await import('./routes/mails.tsx');
        return { loader: allMailsLoader, Component: AllMailsPage };
      }),
    },
    {
      path: '/administration',
      lazy: lazyPage(queryClient, async () => {
        const { administrationLoader, AdministrationPage } =
          await import('./routes/administration.tsx');
        return { loader: administrationLoader, Component: AdministrationPage };
      }),
    },
    {
      path: '/no-site',
      lazy: lazyPage(queryClient, async () => {
        const { noSiteLoader, NoSitePage } = await import('./routes/no-site.tsx');
        return { loader: noSiteLoader, Component: NoSitePage };
      }),
    },
    {
      path: '/method',
      lazy: lazyPage(queryClient, async () => {
        const { methodLoader, MethodPage } = await import('./routes/method.tsx');
        return { loader: methodLoader, Component: MethodPage };
      }),
    },
    {
      path: '/demo/mailbox',
      lazy: lazyPage(queryClient, async () => {
        const { demoMailboxLoader, DemoMailboxPage } = await import('./routes/demo-mailbox.tsx');
        return { loader: demoMailboxLoader, Component: DemoMailboxPage };
      }),
    },
    {
      id: siteRouteId,
      path: '/sites/:siteId',
      loader: siteLoader(queryClient),
      element: <SiteLayout />,
      children: [{ index: true, loader: siteIndexLoader(queryClient) }, ...sitePages(queryClient)],
    },
  ];
}
