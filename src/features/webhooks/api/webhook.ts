import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { webhookResponse, type SetWebhookRequest } from '#shared/contracts/webhook.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';

const freshMs = 10_000;
const address = (siteId: number) => `/api/sites/${siteId}/webhook`;

/** Deliveries come and go on their own, so they are read again while the page is open. */
export const webhookQuery = (siteId: number) =>
  queryOptions({
    queryKey: ['sites', siteId, 'webhook'],
    refetchInterval: freshMs,
    queryFn: ({ signal }) => request(address(siteId), webhookResponse, { signal }),
  });

export function useSetWebhook(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: SetWebhookRequest) =>
      request(address(siteId), webhookResponse, { method: 'PUT', body }),
    onSuccess: (webhook) => client.setQueryData(webhookQuery(siteId).queryKey, webhook),
  });
}

export function useRemoveWebhook(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => requestNothing(address(siteId), { method: 'DELETE' }),
    onSettled: () => client.invalidateQueries({ queryKey: webhookQuery(siteId).queryKey }),
  });
}

export function useTellAgain(siteId: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (deliveryId: number) =>
      requestNothing(`${address(siteId)}/deliveries/${deliveryId}/send-again`, { method: 'POST' }),
    onSettled: () => client.invalidateQueries({ queryKey: webhookQuery(siteId).queryKey }),
  });
}
