import type {
  AdministeredPerson,
  AdministeredSitesResponse,
} from '#shared/contracts/administration.ts';
import { siteRole, siteRoles, type SiteRole } from '#shared/contracts/session.ts';
import { Badge } from '#src/components/badge.tsx';
import { DataTable, type DataTableColumn } from '#src/components/data-table.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Select } from '#src/components/select.tsx';

const roleWords: Readonly<Record<SiteRole, string>> = {
  analyst: 'Analyst',
  lead: 'Reliability lead',
  owner: 'Asset owner',
};
const options = siteRoles.map((role) => ({ value: role, label: roleWords[role] }));

/** Every account with its role at every site; the roles are set here. */
export function PeopleTable({
  people,
  sites,
  onSetRole,
}: {
  people: readonly AdministeredPerson[];
  sites: AdministeredSitesResponse['sites'];
  onSetRole: (person: AdministeredPerson, siteId: number, role: SiteRole | null) => void;
}) {
  const columns: DataTableColumn<AdministeredPerson>[] = [
    { id: 'name', header: 'Name', rowHeader: true, cell: (person) => person.name },
    {
      id: 'email',
      header: 'E-mail address',
      cell: (person) => <span className="figures">{person.email}</span>,
    },
    {
      id: 'administrator',
      header: 'Account',
      cell: (person) => (person.isAdministrator ? <Badge>Administrator</Badge> : ''),
    },
    ...sites.map((site) => ({
      id: `site-${site.id}`,
      header: site.name,
      cell: (person: AdministeredPerson) => (
        <Select
          aria-label={`Role of ${person.name} at ${site.name}`}
          placeholder="No role"
          options={options}
          value={person.memberships.find((one) => one.siteId === site.id)?.role ?? ''}
          onChange={(event) =>
            onSetRole(
              person,
              site.id,
              event.target.value === '' ? null : siteRole.parse(event.target.value),
            )
          }
        />
      ),
    })),
  ];
  return (
    <DataTable
      label="People"
      columns={columns}
      rows={people}
      rowId={(person) => person.userId}
      empty={<EmptyState title="Nobody yet" />}
    />
  );
}
