import type { QueryClient } from '@tanstack/react-query';
import { redirect, useLoaderData } from 'react-router-dom';
import type { SessionResponse } from '#shared/contracts/session.ts';
import { EmptyState } from '#src/components/empty-state.tsx';
import { sessionQuery } from '#src/features/session/api/session.ts';
import { AccountMenu } from '../account-menu.tsx';
import { Shell } from '../shell.tsx';

export const noSiteLoader =
  (queryClient: QueryClient) => async (): Promise<SessionResponse | Response> => {
    const session = await queryClient.ensureQueryData(sessionQuery());
    return session ?? redirect('/sign-in');
  };

/** For an account that belongs nowhere yet. */
export function NoSitePage() {
  const session = useLoaderData<SessionResponse>();
  return (
    <Shell homeTo="/" account={<AccountMenu session={session} />}>
      <EmptyState title="You are not a member of a site yet">
        Ask your administrator to give {session.email} a role at your site, then reload this page.
      </EmptyState>
    </Shell>
  );
}
