import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { mailKindWords } from '#shared/contracts/mail.ts';
import { Button } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Notice } from '#src/components/notice.tsx';
import { unsubscribeQuery, useUnsubscribe } from '#src/features/account/api/account.ts';
import { toApiError } from '#src/lib/api-error.ts';
import { Shell } from '../shell.tsx';

/** Behind the link in a mail's foot: no sign-in, one button, and nothing happens before it. */
export function UnsubscribePage() {
  const token = useParams().token ?? '';
  const { data: standing, error } = useQuery(unsubscribeQuery(token));
  const unsubscribe = useUnsubscribe(token);
  return (
    <Shell homeTo="/">
      <div className="mx-auto mt-6 flex max-w-xl flex-col gap-4">
        <h1 className="text-2xl">Mails from Fretline</h1>
        {error !== null && (
          <EmptyState title="This link does not work">
            It may have been cut short on its way. Sign in and choose your mails on the page of your
            account.
          </EmptyState>
        )}
        {standing?.wanted === true && (
          <>
            <p>
              You get mails of this kind: <strong>{mailKindWords[standing.kind]}</strong>.
            </p>
            {standing.kind === 'assigned' && (
              <Notice title="What it means to switch these off">
                New inspections are then shown on the page alone. The task, its due date and its
                cautions are yours all the same.
              </Notice>
            )}
            {unsubscribe.isError && (
              <Notice loud title={toApiError(unsubscribe.error).message}>
                You still get these mails.
              </Notice>
            )}
            <div>
              <Button
                variant="primary"
                busy={unsubscribe.isPending}
                onClick={() => unsubscribe.mutate()}
              >
                No more mails of this kind
              </Button>
            </div>
          </>
        )}
        {standing?.wanted === false && (
          <p role="status">
            You get no more mails of this kind: <strong>{mailKindWords[standing.kind]}</strong>.
          </p>
        )}
        <p className="text-sm text-ink-soft">
          Other kinds, and this one again:{' '}
          <Link to="/account" className="ink-link">
            choose your mails
          </Link>{' '}
          (asks you to sign in).
        </p>
      </div>
    </Shell>
  );
}
