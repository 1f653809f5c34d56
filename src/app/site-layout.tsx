import type { QueryClient } from '@tanstack/react-query';
import { Outlet, redirect, useNavigate, type LoaderFunctionArgs } from 'react-router-dom';
import type { SiteRole } from '#shared/contracts/session.ts';
import { Select } from '#src/components/select.tsx';
import { sessionQuery } from '#src/features/session/api/session.ts';
import { AccountMenu } from './account-menu.tsx';
import { Shell, type NavigationItem } from './shell.tsx';
import { useSite, type SiteContext } from './site-context.ts';

/** Where a person begins, by role. */
export const firstPageOf: Readonly<Record<SiteRole, string>> = {
  analyst: 'surveys',
  lead: 'findings',
  owner: 'inspections',
};

const pages: readonly { path: string; label: string; roles: readonly SiteRole[] }[] = [
  { path: 'surveys', label: 'Surveys', roles: ['analyst', 'lead'] },
  { path: 'review', label: 'Review', roles: ['analyst', 'lead'] },
  { path: 'findings', label: 'Findings', roles: ['analyst', 'lead', 'owner'] },
  { path: 'desk', label: 'Desk', roles: ['lead'] },
  { path: 'inspections', label: 'Inspections', roles: ['analyst', 'lead', 'owner'] },
  { path: 'outcomes', label: 'Outcomes', roles: ['analyst', 'lead'] },
  { path: 'machines', label: 'Machines', roles: ['analyst', 'lead', 'owner'] },
  { path: 'routes', label: 'Routes', roles: ['analyst', 'lead'] },
  { path: 'fit-workbench', label: 'Fit workbench', roles: ['analyst', 'lead', 'owner'] },
];

/** The address of the sign-in page that leads back to where one was going. */
export function signInAddress(request: Request): string {
  const { pathname, search } = new URL(request.url);
  return `/sign-in?next=${encodeURIComponent(pathname + search)}`;
}

/** Lets members of the site pass; signed-out people are sent to sign in and come back. */
export const siteLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs): Promise<SiteContext | Response> => {
    const session = await queryClient.ensureQueryData(sessionQuery());
    if (session === null) return redirect(signInAddress(request));
    const membership = session.memberships.find(
      (candidate) => candidate.siteId === Number(params.siteId),
    );
    if (membership === undefined) throw new Response(null, { status: 404 });
    return { ...membership, session };
  };

/** Sends to the first page of the person's role. */
export const siteIndexLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs): Promise<Response> => {
    const session = await queryClient.ensureQueryData(sessionQuery());
    const role = session?.memberships.find((one) => one.siteId === Number(params.siteId))?.role;
    return redirect(`/sites/${params.siteId}/${firstPageOf[role ?? 'analyst']}`);
  };

/** The frame of every page of a site. */
export function SiteLayout() {
  const { siteId, siteName, role, session } = useSite();
  const navigate = useNavigate();
  const navigation: NavigationItem[] = pages
    .filter((page) => page.roles.includes(role))
    .map((page) => ({ to: `/sites/${siteId}/${page.path}`, label: page.label }));
  return (
    <Shell
      homeTo={`/sites/${siteId}`}
      site={
        session.memberships.length > 1 ? (
          <Select
            aria-label="Site"
            value={String(siteId)}
            options={session.memberships.map((one) => ({
              value: String(one.siteId),
              label: one.siteName,
            }))}
            onChange={(event) => void navigate(`/sites/${event.target.value}`)}
          />
        ) : (
          siteName
        )
      }
      navigation={navigation}
      account={<AccountMenu session={session} role={role} />}
    >
      <Outlet />
    </Shell>
  );
}
