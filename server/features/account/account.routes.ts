import { z } from 'zod';
import { anyoneBecause, signedIn } from '#server/auth/access.ts';
import { handled, route } from '#server/http/route.ts';
import {
  mailChoiceRequest,
  mailChoicesResponse,
  unsubscribeResponse,
} from '#shared/contracts/mail.ts';
import type { MailChoicesService } from './mail-choices.service.ts';

const tokenParams = z.object({ token: z.string().max(200) });

/** A person's own settings, and the way out of a kind of mail without signing in. */
export const accountRoutes = (choices: MailChoicesService, publicUrl: () => string) => [
  route({
    method: 'get',
    path: '/api/account/mail',
    access: signedIn(),
    response: mailChoicesResponse,
    handle: ({ principal }) => choices.choicesOf(principal),
  }),
  route({
    method: 'put',
    path: '/api/account/mail',
    access: signedIn(),
    body: mailChoiceRequest,
    response: mailChoicesResponse,
    handle: ({ principal, body }) => choices.choose(principal, body),
  }),
  route({
    method: 'get',
    path: '/api/unsubscribe/:token',
    access: anyoneBecause('a mail program without one-click opens this: it leads to the page'),
    params: tokenParams,
    response: 'binary',
    handle: async ({ params, res }) => {
      res.redirect(303, `${publicUrl()}/unsubscribe/${encodeURIComponent(params.token)}`);
      return handled;
    },
  }),
  route({
    method: 'get',
    path: '/api/unsubscribe/:token/standing',
    access: anyoneBecause('the signed token of the mail is the proof; it tells the kind alone'),
    params: tokenParams,
    response: unsubscribeResponse,
    handle: ({ params }) => choices.standingOf(params.token),
  }),
  route({
    // RFC 8058: mail programs post here by themselves, with a form body that is not looked at.
    method: 'post',
    path: '/api/unsubscribe/:token',
    access: anyoneBecause('the signed token of the mail is the proof; it switches one kind off'),
    params: tokenParams,
    response: unsubscribeResponse,
    handle: ({ params }) => choices.unsubscribe(params.token),
  }),
];
