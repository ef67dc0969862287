import { DayOfUse } from '@tiltwright/shared/schemas/limit.ts';
import { and, asc, eq, gte, lte } from 'drizzle-orm';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import { usage as usageTable } from '../../db/schema/limits.ts';
import { apiKeys } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { listOf } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { dayOf } from './usage-counter.ts';

const dayMs = 86_400_000;

export function usageRoutes({ db, usage }: Deps): Route[] {
  return [
    route(
      {
        id: 'listUsage',
        method: 'get',
        path: '/me/usage',
        tag: 'API keys',
        summary: 'What each of the account’s keys asked for, day by day',
        description: 'Oldest first; the last 30 days where no other span is named, 400 days at most. Days are UTC.',
        may: 'keys.own',
        query: z.strictObject({ from: z.iso.date().optional(), to: z.iso.date().optional(), key: z.string().min(1).max(80).optional() }),
        reply: { status: 200, description: 'The days with any request.', schema: listOf(DayOfUse) },
        cache: noStore,
      },
      ({ actor, query }) => {
        usage.flush();
        const to = query.to ?? dayOf(new Date());
        const from = query.from ?? dayOf(new Date(Date.parse(to) - 29 * dayMs));
        const earliest = dayOf(new Date(Date.parse(to) - 399 * dayMs));
        const data = db
          .select({
            key: usageTable.keyId,
            day: usageTable.day,
            requests: usageTable.requests,
            units: usageTable.units,
            refused: usageTable.refused,
          })
          .from(usageTable)
          .innerJoin(apiKeys, eq(apiKeys.id, usageTable.keyId))
          .where(
            and(
              eq(apiKeys.userId, actorId(actor)),
              gte(usageTable.day, from),
              gte(usageTable.day, earliest),
              lte(usageTable.day, to),
              ...(query.key === undefined ? [] : [eq(usageTable.keyId, query.key)]),
            ),
          )
          .orderBy(asc(usageTable.day), asc(usageTable.keyId))
          .all();
        return { data, next: null };
      },
    ),
  ];
}
