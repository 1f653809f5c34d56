import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { outboxResponse } from '#shared/contracts/mail.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';

const freshMs = 10_000;

/** Whose mails: those of a site, or all of them for the administrator. */
export type OutboxOf = number | 'all';

const address = (of: OutboxOf) =>
  of === 'all' ? '/api/administration/mails' : `/api/sites/${of}/mails`;
const key = (of: OutboxOf) => (of === 'all' ? ['administration', 'mails'] : ['sites', of, 'mails']);

/** Mails come and go on their own, so the list is read again while it is open. */
export const outboxQuery = (of: OutboxOf, faulty: boolean) =>
  queryOptions({
    queryKey: [...key(of), faulty],
    refetchInterval: freshMs,
    queryFn: ({ signal }) => request(address(of), outboxResponse, { query: { faulty }, signal }),
  });

export function useSendAgain(of: OutboxOf) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (mailId: number) =>
      requestNothing(`${address(of)}/${mailId}/send-again`, { method: 'POST' }),
    onSettled: () => client.invalidateQueries({ queryKey: key(of) }),
  });
}
