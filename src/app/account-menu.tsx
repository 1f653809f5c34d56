import { useNavigate } from 'react-router-dom';
import type { SessionResponse, SiteRole } from '#shared/contracts/session.ts';
import { Button } from '#src/components/button.tsx';
import { Menu, type MenuItem } from '#src/components/menu.tsx';
import { useSignOut } from '#src/features/session/api/session.ts';

export const roleWords: Readonly<Record<SiteRole, string>> = {
  analyst: 'Analyst',
  lead: 'Reliability lead',
  owner: 'Asset owner',
};

/** Who is signed in, in which role, and the way out. */
export function AccountMenu({ session, role }: { session: SessionResponse; role?: SiteRole }) {
  const navigate = useNavigate();
  const signOut = useSignOut();
  const roleText =
    role !== undefined ? roleWords[role] : session.isAdministrator ? 'Administrator' : 'No role';
  const items: MenuItem[] = [
    { label: 'Account and e-mails', onSelect: () => void navigate('/account') },
    ...(session.isAdministrator && role !== undefined
      ? [{ label: 'Administration', onSelect: () => void navigate('/administration') }]
      : []),
    { label: 'The screening method', onSelect: () => void navigate('/method') },
    ...(session.demo
      ? [{ label: 'Demo mailbox', onSelect: () => void navigate('/demo/mailbox') }]
      : []),
    {
      label: 'Sign out',
      onSelect: () => signOut.mutate(undefined, { onSettled: () => void navigate('/sign-in') }),
    },
  ];
  return (
    <Menu
      align="end"
      heading={
        <>
          {session.name}
          <span className="block text-xs text-ink-faint">{roleText}</span>
        </>
      }
      items={items}
      trigger={
        <Button
          variant="quiet"
          icon="chevron-down"
          aria-label={`Account of ${session.name}, ${roleText}`}
        >
          <span className="hidden max-w-40 truncate phone:inline">{session.name}</span>
        </Button>
      }
    />
  );
}
