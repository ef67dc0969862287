import { queryOptions, useQuery } from '@tanstack/react-query';
import type { MailSheet } from '@tiltwright/shared/schemas/desk.ts';
import { api, bodyOf } from '../../../lib/api-client.ts';

export function readOutbox(to: string, signal?: AbortSignal): Promise<{ data: MailSheet[]; next: string | null }> {
  return bodyOf(api.GET('/outbox', { params: { query: { to } }, signal }));
}

export const outboxQuery = (to: string) =>
  queryOptions({ queryKey: ['outbox', to], queryFn: ({ signal }) => readOutbox(to, signal), staleTime: 0, enabled: to !== '' });

/** Mails of a trial to one address, newest first. */
export function useOutbox(to: string) {
  return useQuery(outboxQuery(to));
}
