import { Link } from 'react-router-dom';
import { DescriptionList } from '#src/components/description-list.tsx';
import { formatInstant } from '#src/lib/dates.ts';
import type { DemoMail } from './mail-list.tsx';

/** One mail as text; links that lead into Fretline open here. */
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
      <p className="mt-4 max-w-prose break-words whitespace-pre-wrap">
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
    </article>
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
