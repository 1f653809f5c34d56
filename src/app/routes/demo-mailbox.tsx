import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { EmptyState } from '#src/components/empty-state.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { demoMailsQuery } from '#src/features/demo-mailbox/api/demo-mails.ts';
import { MailList } from '#src/features/demo-mailbox/components/mail-list.tsx';
import { MailReader } from '#src/features/demo-mailbox/components/mail-reader.tsx';
import { Shell } from '../shell.tsx';

export const demoMailboxLoader = (queryClient: QueryClient) => async () => {
  await queryClient.ensureQueryData(demoMailsQuery());
  return null;
};

/** What the demo's invented people have received; no mail leaves this computer. */
export function DemoMailboxPage() {
  const { data } = useSuspenseQuery(demoMailsQuery());
  const [search, setSearch] = useSearchParams();
  const { mails } = data;
  const wanted = Number(search.get('mail'));
  const open = mails.find((mail) => mail.id === wanted) ?? mails[0];
  return (
    <Shell homeTo="/">
      <PageHeader title="Demo mailbox" facts={[{ label: 'Mails', value: String(mails.length) }]} />
      <p className="mb-4 max-w-prose text-sm text-ink-soft">
        Mails to the people of the demo land here and leave this computer never. A link asks who you
        are: sign in as the person the mail was written to.
      </p>
      {open === undefined ? (
        <EmptyState title="No mail yet">
          Assign an inspection as the reliability lead: the owner’s mail appears here within
          seconds.
        </EmptyState>
      ) : (
        <div className="grid items-start gap-4 lg:grid-cols-[20rem_1fr]">
          <MailList
            mails={mails}
            openId={open.id}
            onOpen={(id) => setSearch({ mail: String(id) }, { replace: true })}
          />
          <MailReader mail={open} />
        </div>
      )}
    </Shell>
  );
}
