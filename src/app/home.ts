import type { QueryClient } from '@tanstack/react-query';
import { redirect } from 'react-router-dom';
import type { SessionResponse } from '#shared/contracts/session.ts';
import { sessionQuery } from '#src/features/session/api/session.ts';

/** Where a person lands after signing in without having been on the way anywhere. */
export function homeOf(session: SessionResponse): string {
  const [first] = session.memberships;
  if (first !== undefined) return `/sites/${first.siteId}`;
  return session.isAdministrator ? '/administration' : '/no-site';
}

export const homeLoader = (queryClient: QueryClient) => async (): Promise<Response> => {
  const session = await queryClient.ensureQueryData(sessionQuery());
  return redirect(session === null ? '/sign-in' : homeOf(session));
};
