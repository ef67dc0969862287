import { Limit, LimitedCaller, LimitSetting, limitedCallers } from '@tiltwright/shared/schemas/limit.ts';
import { eq } from 'drizzle-orm';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import { limits as limitsTable } from '../../db/schema/limits.ts';
import type { Deps } from '../../deps.ts';
import { listOf } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { audit } from '../audit.ts';

const tag = 'Limits';
const may = 'limits.manage';
const callerParams = z.strictObject({ caller: LimitedCaller });

export function limitRoutes({ db, limits }: Deps): Route[] {
  const read = (caller: LimitedCaller): Limit => {
    const row = db.select().from(limitsTable).where(eq(limitsTable.caller, caller)).get();
    return { caller, ...limits.current()[caller], changedAt: row?.changedAt ?? null, changedBy: row?.changedBy ?? null };
  };
  return [
    route(
      {
        id: 'listLimits',
        method: 'get',
        path: '/limits',
        tag,
        summary: 'How much each kind of caller may ask',
        may,
        reply: { status: 200, description: 'The limits as they hold now.', schema: listOf(Limit) },
        cache: noStore,
      },
      () => ({ data: limitedCallers.map(read), next: null }),
    ),
    route(
      {
        id: 'changeLimit',
        method: 'put',
        path: '/limits/{caller}',
        tag,
        summary: 'Change how much one kind of caller may ask',
        description: 'Holds at once, also for minutes that have begun.',
        may,
        params: callerParams,
        body: LimitSetting,
        bodyExample: { unitsPerMinute: 6000, unitsPerDay: 500000 },
        reply: { status: 200, description: 'The limit as it holds now.', schema: Limit },
        cache: noStore,
      },
      ({ actor, params, body }) => {
        const row = { ...body, changedAt: new Date().toISOString(), changedBy: actorId(actor) };
        db.transaction(
          (tx) => {
            tx.insert(limitsTable)
              .values({ caller: params.caller, ...row })
              .onConflictDoUpdate({ target: limitsTable.caller, set: row })
              .run();
            audit(tx, actorId(actor), 'limit.change', params.caller, { ...body });
          },
          { behavior: 'immediate' },
        );
        limits.reload();
        return read(params.caller);
      },
    ),
    route(
      {
        id: 'resetLimit',
        method: 'delete',
        path: '/limits/{caller}',
        tag,
        summary: 'Go back to the configured limit',
        may,
        params: callerParams,
        reply: { status: 204, description: 'It is as configured.' },
        cache: noStore,
      },
      ({ actor, params }) => {
        db.transaction(
          (tx) => {
            const { changes } = tx.delete(limitsTable).where(eq(limitsTable.caller, params.caller)).run();
            if (changes > 0) audit(tx, actorId(actor), 'limit.change', params.caller, { reset: true });
          },
          { behavior: 'immediate' },
        );
        limits.reload();
      },
    ),
  ];
}
