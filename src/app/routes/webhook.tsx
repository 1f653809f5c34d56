import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import type { LoaderFunctionArgs } from 'react-router-dom';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { useToast } from '#src/components/toast.tsx';
import { useTellAgain, webhookQuery } from '#src/features/webhooks/api/webhook.ts';
import { DeliveryTable } from '#src/features/webhooks/components/delivery-table.tsx';
import { WebhookForm } from '#src/features/webhooks/components/webhook-form.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { useSite } from '../site-context.ts';

export const webhookLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(webhookQuery(Number(params.siteId)));
    return null;
  };

/** Connects the plant's own maintenance system to the inspections. */
export function WebhookPage() {
  const { siteId } = useSite();
  const { data } = useSuspenseQuery(webhookQuery(siteId));
  const tellAgain = useTellAgain(siteId);
  const notify = useToast();
  return (
    <>
      <PageHeader
        title="Maintenance system"
        crumbs={[{ label: 'Desk', to: `/sites/${siteId}/desk` }, { label: 'Maintenance system' }]}
        facts={[{ label: 'Connection', value: data.url === null ? 'none' : 'set' }]}
      />
      <div className="flex flex-col gap-5">
        <div className="grid items-start gap-5 lg:grid-cols-2">
          <Panel title="Where changes are told">
            <WebhookForm siteId={siteId} url={data.url} />
          </Panel>
          <Panel title="What is sent">
            <div className="flex max-w-prose flex-col gap-3 text-sm text-ink-soft">
              <p>
                On every change of state of an inspection, a POST with JSON: ids, states, work
                order, machine, position, due date, time and link. It is repeated with growing waits
                for a day until the answer is 2xx; a repeat carries the same id.
              </p>
              <p>
                The header <code className="figures">Fretline-Signature</code> is HMAC-SHA256,
                hexadecimal, with the secret, over the header{' '}
                <code className="figures">Fretline-Timestamp</code> (seconds since 1970), a full
                stop and the body. Refuse what is older than a few minutes.
              </p>
            </div>
          </Panel>
        </div>
        <DeliveryTable
          siteId={siteId}
          deliveries={data.deliveries}
          onTellAgain={(id) =>
            tellAgain.mutate(id, {
              onSuccess: () => notify({ text: 'It is told again now.' }),
              onError: (error) => notify({ text: toApiError(error).message, failed: true }),
            })
          }
        />
      </div>
    </>
  );
}
