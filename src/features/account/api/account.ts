import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { ChangePasswordRequest } from '#shared/contracts/account.ts';
import {
  mailChoicesResponse,
  unsubscribeResponse,
  type MailChoiceRequest,
} from '#shared/contracts/mail.ts';
import { request, requestNothing } from '#src/lib/api-client.ts';

export const mailChoicesQuery = () =>
  queryOptions({
    queryKey: ['account', 'mail'],
    queryFn: ({ signal }) => request('/api/account/mail', mailChoicesResponse, { signal }),
  });

export function useChooseMail() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: MailChoiceRequest) =>
      request('/api/account/mail', mailChoicesResponse, { method: 'PUT', body }),
    onSuccess: (choices) => client.setQueryData(mailChoicesQuery().queryKey, choices),
  });
}

export function useChangePassword() {
  return useMutation({
    mutationFn: (body: ChangePasswordRequest) =>
      requestNothing('/api/session/password', { method: 'POST', body }),
  });
}

const unsubscribeAddress = (token: string) => `/api/unsubscribe/${encodeURIComponent(token)}`;

/** What the link of a mail is about; looking changes nothing. */
export const unsubscribeQuery = (token: string) =>
  queryOptions({
    queryKey: ['unsubscribe', token],
    retry: false,
    queryFn: ({ signal }) =>
      request(`${unsubscribeAddress(token)}/standing`, unsubscribeResponse, { signal }),
  });

export function useUnsubscribe(token: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => request(unsubscribeAddress(token), unsubscribeResponse, { method: 'POST' }),
    onSuccess: (standing) => client.setQueryData(unsubscribeQuery(token).queryKey, standing),
  });
}
