import { useQuery, type QueryClient } from '@tanstack/react-query';
import {
  redirect,
  useLoaderData,
  useSearchParams,
  type LoaderFunctionArgs,
} from 'react-router-dom';
import type { SessionResponse } from '#shared/contracts/session.ts';
import { PageHeader } from '#src/components/page-header.tsx';
import { outboxQuery, type OutboxOf } from '#src/features/outbox/api/outbox.ts';
import { OutboxView } from '#src/features/outbox/components/outbox-view.tsx';
import { sessionQuery } from '#src/features/session/api/session.ts';
import { AccountMenu } from '../account-menu.tsx';
import { Shell } from '../shell.tsx';
import { useSite } from '../site-context.ts';
import { signInAddress } from '../site-layout.tsx';

const isFaulty = (search: URLSearchParams) => search.get('faulty') === 'true';

export const siteMailsLoader =
  (queryClient: QueryClient) =>
  async ({ params, request }: LoaderFunctionArgs) => {
    const faulty = isFaulty(new URL(request.url).searchParams);
    await queryClient.ensureQueryData(outboxQuery(Number(params.siteId), faulty));
    return null;
  };

export const allMailsLoader =
  (queryClient: QueryClient) =>
  async ({ request }: LoaderFunctionArgs): Promise<SessionResponse | Response> => {
    const session = await queryClient.ensureQueryData(sessionQuery());
    if (session === null) return redirect(signInAddress(request));
    if (!session.isAdministrator) throw new Response(null, { status: 404 });
    const faulty = isFaulty(new URL(request.url).searchParams);
    await queryClient.ensureQueryData(outboxQuery('all', faulty));
    return session;
  };

/** The lead's view of the site's mails. */
export function SiteMailsPage() {
  const { siteId } = useSite();
  return <Mails of={siteId} crumb={{ label: 'Desk', to: `/sites/${siteId}/desk` }} />;
}

/** The administrator's view of all mails. */
export function AllMailsPage() {
  const session = useLoaderData<SessionResponse>();
  return (
    <Shell homeTo="/" account={<AccountMenu session={session} />}>
      <Mails of="all" crumb={{ label: 'Administration', to: '/administration' }} />
    </Shell>
  );
}

function Mails({ of, crumb }: { of: OutboxOf; crumb: { label: string; to: string } }) {
  const [search, setSearch] = useSearchParams();
  const faulty = isFaulty(search);
  const { data } = useQuery(outboxQuery(of, faulty));
  return (
    <>
      <PageHeader
        title="E-mails sent"
        crumbs={[crumb, { label: 'E-mails' }]}
        facts={[
          { label: 'Waiting', value: String(data?.waitingCount ?? '–') },
          { label: 'Given up', value: String(data?.failedCount ?? '–') },
        ]}
      />
      <OutboxView
        of={of}
        faulty={faulty}
        onFaulty={(next) => setSearch(next ? { faulty: 'true' } : {}, { replace: true })}
      />
    </>
  );
}
