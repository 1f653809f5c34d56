import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { mailKindWords, type OutboxItem } from '#shared/contracts/mail.ts';
import { Button } from '#src/components/button.tsx';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Figure } from '#src/components/figure.tsx';
import { Select } from '#src/components/select.tsx';
import { useToast } from '#src/components/toast.tsx';
import { toApiError } from '#src/lib/api-error.ts';
import { formatInstant } from '#src/lib/dates.ts';
import { outboxQuery, useSendAgain, type OutboxOf } from '../api/outbox.ts';

/** Where a mail stands, in words: "sent", "tried 3 times, next …", "given up after 30 attempts". */
export function mailStanding(mail: OutboxItem): string {
  if (mail.state === 'sent') return 'Sent';
  if (mail.state === 'failed') return `Given up after ${mail.attempts} attempts`;
  if (mail.attempts === 0) return 'Waiting';
  return `Tried ${mail.attempts === 1 ? 'once' : `${mail.attempts} times`} in vain`;
}

const columns = (onSendAgain: (mail: OutboxItem) => void): DataTableColumn<OutboxItem>[] => [
  { id: 'subject', header: 'Subject', rowHeader: true, cell: (mail) => mail.subject },
  { id: 'to', header: 'To', cell: (mail) => <span className="figures">{mail.toAddress}</span> },
  {
    id: 'kind',
    header: 'Kind',
    cell: (mail) => (mail.kind === null ? '' : mailKindWords[mail.kind]),
  },
  {
    id: 'written',
    header: 'Written',
    cell: (mail) => <Figure value={formatInstant(mail.createdAt)} />,
  },
  {
    id: 'state',
    header: 'State',
    cell: (mail) => (
      <>
        {mail.lastError === null ? mailStanding(mail) : <strong>{mailStanding(mail)}</strong>}
        {mail.sentAt !== null && <span className="figures"> {formatInstant(mail.sentAt)}</span>}
        {mail.lastError !== null && <span className="block text-xs">{mail.lastError}</span>}
        {mail.attempts > 0 && mail.nextAttemptAt !== null && (
          <span className="block text-xs text-ink-faint">
            Next attempt {formatInstant(mail.nextAttemptAt)}
          </span>
        )}
      </>
    ),
  },
  {
    id: 'again',
    header: 'Again',
    cell: (mail) =>
      mail.lastError !== null &&
      mail.state !== 'sent' && (
        <Button
          size="small"
          aria-label={`Send now: ${mail.subject}, to ${mail.toAddress}`}
          onClick={() => onSendAgain(mail)}
        >
          Send now
        </Button>
      ),
  },
];

/** The mails on their way and what became of them; a faulty one can be sent again. */
export function OutboxView({
  of,
  faulty,
  onFaulty,
}: {
  of: OutboxOf;
  faulty: boolean;
  onFaulty: (faulty: boolean) => void;
}) {
  const { data, isFetching } = useQuery({
    ...outboxQuery(of, faulty),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  const sendAgain = useSendAgain(of);
  const notify = useToast();
  return (
    <div className="flex flex-col gap-3">
      <Select
        aria-label="Mails shown"
        className="w-56"
        value={faulty ? 'faulty' : 'all'}
        options={[
          { value: 'all', label: 'The newest mails' },
          { value: 'faulty', label: 'Mails with a fault' },
        ]}
        onChange={({ target }) => onFaulty(target.value === 'faulty')}
      />
      <DataTable
        label="Mails"
        rows={data?.mails ?? []}
        rowId={(mail) => mail.id}
        fetching={isFetching && data === undefined}
        columns={columns(({ id }) =>
          sendAgain.mutate(id, {
            onSuccess: () => notify({ text: 'The mail is tried again now.' }),
            onError: (error) => notify({ text: toApiError(error).message, failed: true }),
          }),
        )}
        empty={
          faulty ? (
            <EmptyState title="No mail with a fault">
              Every mail was delivered, or waits for its first attempt.
            </EmptyState>
          ) : (
            <EmptyState title="No mails yet">
              The first one is written when an inspection is assigned.
            </EmptyState>
          )
        }
      />
    </div>
  );
}
