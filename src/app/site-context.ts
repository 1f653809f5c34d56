import { useRouteLoaderData } from 'react-router-dom';
import type { MembershipResponse, SessionResponse } from '#shared/contracts/session.ts';

export interface SiteContext extends MembershipResponse {
  session: SessionResponse;
}

/** Id of the layout route whose loader knows the site. */
export const siteRouteId = 'site';

/** The site of the address, and the person's role there. */
export function useSite(): SiteContext {
  const site = useRouteLoaderData(siteRouteId) as SiteContext | undefined;
  if (site === undefined) throw new Error('useSite is called outside a site page');
  return site;
}
