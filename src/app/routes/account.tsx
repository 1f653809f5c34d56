import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { redirect, useLoaderData, type LoaderFunctionArgs } from 'react-router-dom';
import type { SessionResponse } from '#shared/contracts/session.ts';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { useToast } from '#src/components/toast.tsx';
import { mailChoicesQuery, useChooseMail } from '#src/features/account/api/account.ts';
import { MailChoices } from '#src/features/account/components/mail-choices.tsx';
import { PasswordForm } from '#src/features/account/components/password-form.tsx';
import { sessionQuery } from '#src/features/session/api/session.ts';
import { toApiError } from '#src/lib/api-error.ts';
import { AccountMenu } from '../account-menu.tsx';
import { Shell } from '../shell.tsx';
import { signInAddress } from '../site-layout.tsx';

export const accountLoader =
  (queryClient: QueryClient) =>
  async ({ request }: LoaderFunctionArgs): Promise<SessionResponse | Response> => {
    const session = await queryClient.ensureQueryData(sessionQuery());
    if (session === null) return redirect(signInAddress(request));
    await queryClient.ensureQueryData(mailChoicesQuery());
    return session;
  };

/** A person's own settings: which mails they get, and their password. */
export function AccountPage() {
  const session = useLoaderData<SessionResponse>();
  const { data } = useSuspenseQuery(mailChoicesQuery());
  const choose = useChooseMail();
  const notify = useToast();
  return (
    <Shell homeTo="/" account={<AccountMenu session={session} />}>
      <PageHeader title={session.name} facts={[{ label: 'E-mail address', value: data.email }]} />
      <div className="grid items-start gap-5 lg:grid-cols-2">
        <Panel title="E-mails I get">
          <MailChoices
            choices={data.choices}
            onChoose={(kind, wanted) =>
              choose.mutate(
                { kind, wanted },
                {
                  onSuccess: () =>
                    notify({
                      text: wanted ? 'The mail is switched on.' : 'The mail is switched off.',
                    }),
                  onError: (error) => notify({ text: toApiError(error).message, failed: true }),
                },
              )
            }
          />
        </Panel>
        <Panel title="Password">
          <p className="mb-4 max-w-prose text-sm text-ink-soft">
            With a new password you stay signed in here; everywhere else you are signed out within
            ten minutes.
          </p>
          <PasswordForm
            email={session.email}
            onChanged={() => notify({ text: 'The password is changed.' })}
          />
        </Panel>
      </div>
    </Shell>
  );
}
