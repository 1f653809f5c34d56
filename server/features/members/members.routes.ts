import { only } from '#server/auth/access.ts';
import type { AccountRepository } from '#server/auth/account.repository.ts';
import { route } from '#server/http/route.ts';
import { membersResponse } from '#shared/contracts/person.ts';

/** Who belongs to a site: the lead chooses owners and assignees from it. */
export const memberRoutes = (accounts: Pick<AccountRepository, 'membersOf'>) => [
  route({
    method: 'get',
    path: '/api/sites/:siteId/members',
    access: only('lead'),
    response: membersResponse,
    handle: async ({ principal }) => ({ members: await accounts.membersOf(principal.siteId) }),
  }),
];
