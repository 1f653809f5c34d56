import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { redirect, useLoaderData, type LoaderFunctionArgs } from 'react-router-dom';
import type { SessionResponse } from '#shared/contracts/session.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Figure } from '#src/components/figure.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Panel } from '#src/components/panel.tsx';
import { TextInput } from '#src/components/text-input.tsx';
import { useToast } from '#src/components/toast.tsx';
import {
  peopleQuery,
  sitesQuery,
  useCreatePerson,
  useCreateSite,
  useSetMembership,
} from '#src/features/administration/api/administration.ts';
import { PeopleTable } from '#src/features/administration/components/people-table.tsx';
import { PersonForm } from '#src/features/administration/components/person-form.tsx';
import { sessionQuery } from '#src/features/session/api/session.ts';
import { toApiError } from '#src/lib/api-error.ts';
import { AccountMenu } from '../account-menu.tsx';
import { Shell } from '../shell.tsx';
import { signInAddress } from '../site-layout.tsx';

export const administrationLoader =
  (queryClient: QueryClient) =>
  async ({ request }: LoaderFunctionArgs): Promise<SessionResponse | Response> => {
    const session = await queryClient.ensureQueryData(sessionQuery());
    if (session === null) return redirect(signInAddress(request));
    if (!session.isAdministrator) throw new Response(null, { status: 404 });
    await Promise.all([
      queryClient.ensureQueryData(sitesQuery()),
      queryClient.ensureQueryData(peopleQuery()),
    ]);
    return session;
  };

export function AdministrationPage() {
  const session = useLoaderData<SessionResponse>();
  const { data: sites } = useSuspenseQuery(sitesQuery());
  const { data: people } = useSuspenseQuery(peopleQuery());
  const createPerson = useCreatePerson();
  const setMembership = useSetMembership();
  const notify = useToast();
  const [adding, setAdding] = useState(false);
  return (
    <Shell homeTo="/" account={<AccountMenu session={session} />}>
      <PageHeader
        title="Administration"
        facts={[
          { label: 'Sites', value: <Figure value={String(sites.sites.length)} /> },
          { label: 'People', value: <Figure value={String(people.people.length)} /> },
        ]}
        actions={
          <>
            <Button icon="plus" variant="primary" onClick={() => setAdding(true)}>
              New person
            </Button>
            <ButtonLink to="/administration/mails">E-mails sent</ButtonLink>
          </>
        }
      />
      <div className="flex flex-col gap-5">
        <PeopleTable
          people={people.people}
          sites={sites.sites}
          onSetRole={({ userId, name }, siteId, role) =>
            setMembership.mutate(
              { userId, siteId, role },
              {
                onSuccess: () => notify({ text: `The role of ${name} is set.` }),
                onError: (error) => notify({ text: toApiError(error).message, failed: true }),
              },
            )
          }
        />
        <SitesPanel />
      </div>
      <Dialog title="New person" open={adding} onOpenChange={setAdding}>
        <PersonForm
          saving={createPerson.isPending}
          failure={createPerson.isError ? toApiError(createPerson.error) : null}
          onSave={(body) => createPerson.mutate(body, { onSuccess: () => setAdding(false) })}
        />
      </Dialog>
    </Shell>
  );
}

function SitesPanel() {
  const { data } = useSuspenseQuery(sitesQuery());
  const create = useCreateSite();
  const notify = useToast();
  const [name, setName] = useState('');
  return (
    <Panel title="Sites">
      <ul className="mb-4 flex max-w-2xl flex-col border-t border-hairline">
        {data.sites.map((site) => (
          <li key={site.id} className="flex gap-4 border-b border-hairline py-1.5 text-sm">
            <span className="grow">{site.name}</span>
            <Figure value={String(site.memberCount)} unit="people" />
            <Figure value={String(site.machineCount)} unit="machines" />
          </li>
        ))}
      </ul>
      <form
        className="flex max-w-md gap-2"
        onSubmit={(event) => {
          event.preventDefault();
          create.mutate(
            { name },
            {
              onSuccess: () => setName(''),
              onError: (error) => notify({ text: toApiError(error).message, failed: true }),
            },
          );
        }}
      >
        <TextInput
          aria-label="Name of the new site"
          placeholder="Name of the new site"
          value={name}
          onChange={(event) => setName(event.target.value)}
        />
        <Button type="submit" busy={create.isPending}>
          Add site
        </Button>
      </form>
    </Panel>
  );
}
