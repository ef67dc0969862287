import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { AuditEntry } from '@tiltwright/shared/schemas/desk.ts';
import { api, apiBase, bodyOf } from '../../../lib/api-client.ts';

export interface AuditFilter {
  actor?: string;
  action?: string;
  subject?: string;
  from?: string;
  to?: string;
}

const auditQuery = (filter: AuditFilter, cursor: string | undefined) =>
  queryOptions({
    queryKey: ['audit', filter, cursor ?? ''],
    queryFn: ({ signal }): Promise<{ data: AuditEntry[]; next: string | null }> =>
      bodyOf(api.GET('/audit', { params: { query: { ...filter, limit: 50, ...(cursor && { cursor }) } }, signal })),
    staleTime: 0,
    placeholderData: keepPreviousData,
  });
export const useAudit = (filter: AuditFilter, cursor: string | undefined) => useQuery(auditQuery(filter, cursor));

/** Address of the same entries as a table to keep. */
export function auditExportAddress(filter: AuditFilter): string {
  const query = new URLSearchParams(Object.entries(filter)).toString();
  return `${apiBase}/audit.csv${query && `?${query}`}`;
}
