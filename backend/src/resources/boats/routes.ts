import { Boat } from '@tiltwright/shared/schemas/boat.ts';
import { asc, eq } from 'drizzle-orm';
import { actorId } from '../../auth/actor.ts';
import { boats } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { listOf } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';

export function boatRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'listBoats',
        method: 'get',
        path: '/me/boats',
        tag: 'Boats',
        summary: 'The account’s boats, each as the question its rig asks',
        may: 'boats.own',
        reply: { status: 200, description: 'The boats.', schema: listOf(Boat) },
        cache: noStore,
      },
      ({ actor }) => {
        const rows = db
          .select()
          .from(boats)
          .where(eq(boats.userId, actorId(actor)))
          .orderBy(asc(boats.id))
          .all();
        return { data: rows.map(({ id, name, story, hullId, question }) => ({ id, name, story, hull: hullId, question })), next: null };
      },
    ),
  ];
}
