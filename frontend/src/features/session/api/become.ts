import type { QueryClient } from '@tanstack/react-query';
import type { Session } from '@tiltwright/shared/schemas/account.ts';
import { sessionQuery } from './get-session.ts';

/** Another person sits at the page now: whatever was read under the former one is forgotten. */
export function become(client: QueryClient, session: Session): void {
  const [sessionKey] = sessionQuery.queryKey;
  client.setQueryData(sessionQuery.queryKey, session);
  client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== sessionKey });
}
