import { anyoneBecause } from '#server/auth/access.ts';
import type { DemoMail } from '#server/db/entities/demo-mail.entity.ts';
import { route } from '#server/http/route.ts';
import { demoMailboxResponse } from '#shared/contracts/mail.ts';

const mailsShown = 100;

/** Links of a text that lead into this product, without its address. */
const linksOf = (text: string, publicUrl: string): string[] =>
  [...text.matchAll(/https?:\/\/\S+/g)]
    .map(([link]) => link)
    .filter((link) => link.startsWith(`${publicUrl}/`))
    .map((link) => link.slice(publicUrl.length));

/** The demo mailbox; the route exists in demo mode only. */
export const demoMailboxRoutes = (
  mailbox: { newest: (limit: number) => Promise<DemoMail[]> },
  publicUrl: () => string,
) => [
  route({
    method: 'get',
    path: '/api/demo/mails',
    access: anyoneBecause('mails of invented people, in demo mode only; read before signing in'),
    response: demoMailboxResponse,
    handle: async () => ({
      mails: (await mailbox.newest(mailsShown)).map((mail) => ({
        id: mail.id,
        toAddress: mail.toAddress,
        fromAddress: mail.fromAddress,
        subject: mail.subject,
        textBody: mail.textBody,
        htmlBody: mail.htmlBody,
        links: linksOf(mail.textBody, publicUrl()),
        receivedAt: mail.receivedAt.toISOString(),
      })),
    }),
  }),
];
