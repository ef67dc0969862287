import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Mail, MailSheet } from '@tiltwright/shared/schemas/desk.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export type MailState = Mail['status'];

const mailsQuery = (status: MailState | undefined, cursor: string | undefined) =>
  queryOptions({
    queryKey: ['mail', 'list', status ?? '', cursor ?? ''],
    queryFn: ({ signal }): Promise<{ data: Mail[]; next: string | null }> =>
      bodyOf(api.GET('/mail', { params: { query: { limit: 50, ...(status && { status }), ...(cursor && { cursor }) } }, signal })),
    staleTime: 0,
  });
export const useMails = (status: MailState | undefined, cursor: string | undefined) => useQuery(mailsQuery(status, cursor));

const mailQuery = (id: string) =>
  queryOptions({
    queryKey: ['mail', id],
    queryFn: ({ signal }): Promise<MailSheet> => bodyOf(api.GET('/mail/{id}', { params: { path: { id } }, signal })),
    staleTime: 0,
  });
export const useMail = (id: string) => useQuery(mailQuery(id));

/** Puts a mail that failed or waits at the head of the queue. */
export function useResendMail(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => bodyOf(api.POST('/mail/{id}/resend', { params: { path: { id } } })),
    onSuccess: () => client.invalidateQueries({ queryKey: ['mail'] }),
  });
}
