import { queryOptions } from '@tanstack/react-query';
import { demoMailboxResponse } from '#shared/contracts/mail.ts';
import { request } from '#src/lib/api-client.ts';

const freshMs = 5_000;

/** Mails arrive on their own, so the box is looked into again and again while it is open. */
export const demoMailsQuery = () =>
  queryOptions({
    queryKey: ['demo', 'mails'],
    refetchInterval: freshMs,
    queryFn: ({ signal }) => request('/api/demo/mails', demoMailboxResponse, { signal }),
  });
