import { Link } from 'react-router-dom';
import { DescriptionList } from '#src/components/description-list.tsx';
import { Tabs } from '#src/components/tabs.tsx';
import { formatInstant } from '#src/lib/dates.ts';
import type { DemoMail } from './mail-list.tsx';

/** One mail; in its text, links that lead into Fretline open here. */
export function MailReader({ mail }: { mail: DemoMail }) {
  return (
    <article aria-label={mail.subject} className="border border-hairline bg-sheet p-4">
      <h2 className="mb-2 text-lg">{mail.subject}</h2>
      <DescriptionList
        items={[
          { label: 'To', value: mail.toAddress },
          { label: 'From', value: mail.fromAddress },
          { label: 'Received', value: formatInstant(mail.receivedAt) },
        ]}
      />
      <div className="mt-4">
        <Tabs
          label="Form of the mail"
          items={[
            { value: 'text', label: 'Text', content: <MailText mail={mail} /> },
            {
              value: 'html',
              label: 'As a mail program shows it',
              content: <MailHtml mail={mail} />,
            },
          ]}
        />
      </div>
    </article>
  );
}

function MailText({ mail }: { mail: DemoMail }) {
  return (
    <p className="max-w-prose break-words whitespace-pre-wrap">
      {piecesOf(mail.textBody, mail.links).map(({ text, to }, index) =>
        to === null ? (
          text
        ) : (
          <Link key={index} className="ink-link" to={to}>
            {text}
          </Link>
        ),
      )}
    </p>
  );
}

/** In a frame that may run nothing, load nothing and lead nowhere. */
function MailHtml({ mail }: { mail: DemoMail }) {
  return (
    <iframe
      title={`${mail.subject}, as a mail program shows it`}
      sandbox=""
      srcDoc={mail.htmlBody}
      className="h-[42rem] w-full border border-hairline"
    />
  );
}

interface Piece {
  text: string;
  /** Where in Fretline it leads; null for plain text. */
  to: string | null;
}

/** Cuts a text at its links; only those that the server knows as its own lead anywhere. */
export function piecesOf(text: string, links: readonly string[]): Piece[] {
  const parts = text.split(/(https?:\/\/\S+)/u);
  return parts
    .filter((part) => part !== '')
    .map((part) => {
      const isAddress = /^https?:\/\//u.test(part);
      const to = isAddress ? links.find((link) => part.endsWith(link)) : undefined;
      return { text: part, to: to ?? null };
    });
}
