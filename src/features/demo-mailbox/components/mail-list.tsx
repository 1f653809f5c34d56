import type { DemoMailboxResponse } from '#shared/contracts/mail.ts';
import { formatInstant } from '#src/lib/dates.ts';

export type DemoMail = DemoMailboxResponse['mails'][number];

/** The mails received, newest first, one of them open. */
export function MailList({
  mails,
  openId,
  onOpen,
}: {
  mails: readonly DemoMail[];
  openId: number | undefined;
  onOpen: (id: number) => void;
}) {
  return (
    <ul aria-label="Mails received" className="border border-hairline bg-sheet">
      {mails.map((mail) => (
        <li key={mail.id} className="border-b border-hairline last:border-b-0">
          <button
            type="button"
            aria-current={mail.id === openId ? 'true' : undefined}
            onClick={() => onOpen(mail.id)}
            className={`flex w-full cursor-pointer flex-col gap-0.5 border-l-4 px-3 py-2 text-left text-sm hover:bg-well ${mail.id === openId ? 'border-ink bg-well' : 'border-transparent'}`}
          >
            <span className="font-medium">{mail.subject}</span>
            <span className="text-xs text-ink-soft">To {mail.toAddress}</span>
            <span className="figures text-xs text-ink-faint">{formatInstant(mail.receivedAt)}</span>
          </button>
        </li>
      ))}
    </ul>
  );
}
