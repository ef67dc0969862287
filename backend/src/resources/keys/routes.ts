import { CreatedKey, Key, NewKey } from '@tiltwright/shared/schemas/account.ts';
import { and, desc, eq } from 'drizzle-orm';
import * as z from 'zod';
import { type Actor, actorId } from '../../auth/actor.ts';
import { hashSecret, keyPrefix, newSecret, writeKey } from '../../auth/keys.ts';
import { apiKeys } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { listOf } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { newId } from '../../ids.ts';
import { audit } from '../audit.ts';

const tag = 'API keys';
const may = 'keys.own';

const toKey = ({ id, name, scopes, createdAt, lastUsedAt, revokedAt }: typeof apiKeys.$inferSelect): Key => ({
  id,
  name,
  prefix: keyPrefix(id),
  scopes,
  createdAt,
  lastUsedAt,
  revokedAt,
});
const owner = (actor: Actor) => eq(apiKeys.userId, actorId(actor));

export function keyRoutes({ db }: Deps): Route[] {
  return [
    route(
      {
        id: 'listKeys',
        method: 'get',
        path: '/me/keys',
        tag,
        summary: 'The account’s API keys, newest first',
        may,
        reply: { status: 200, description: 'The keys without their secrets.', schema: listOf(Key) },
        cache: noStore,
      },
      ({ actor }) => ({ data: db.select().from(apiKeys).where(owner(actor)).orderBy(desc(apiKeys.id)).all().map(toKey), next: null }),
    ),
    route(
      {
        id: 'createKey',
        method: 'post',
        path: '/me/keys',
        tag,
        summary: 'Make an API key',
        description: 'The whole key is in this answer alone; it is stored hashed.',
        may,
        body: NewKey,
        bodyExample: { name: 'Stock list', scopes: ['catalog:read', 'fit:compute'] },
        reply: { status: 201, description: 'The key, shown once.', schema: CreatedKey },
        cache: noStore,
      },
      ({ actor, body }) => {
        const secret = newSecret();
        const row = {
          id: newId('key'),
          userId: actorId(actor),
          name: body.name,
          secretHash: hashSecret(secret),
          scopes: [...new Set(body.scopes)],
          createdAt: new Date().toISOString(),
          lastUsedAt: null,
          revokedAt: null,
        };
        db.transaction(
          (tx) => {
            tx.insert(apiKeys).values(row).run();
            audit(tx, row.userId, 'key.create', row.id, { scopes: row.scopes });
          },
          { behavior: 'immediate' },
        );
        return { ...toKey(row), key: writeKey({ id: row.id, secret }) };
      },
    ),
    route(
      {
        id: 'revokeKey',
        method: 'delete',
        path: '/me/keys/{id}',
        tag,
        summary: 'Revoke an API key at once',
        may,
        params: z.strictObject({ id: z.string().min(1).max(80) }),
        reply: { status: 204, description: 'Revoked.' },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, params }) => {
        const mine = and(owner(actor), eq(apiKeys.id, params.id));
        const key = db.select().from(apiKeys).where(mine).get();
        if (!key) throw new ApiProblem('not-found', `You have no key ${params.id}.`);
        if (key.revokedAt) return;
        db.transaction(
          (tx) => {
            tx.update(apiKeys).set({ revokedAt: new Date().toISOString() }).where(mine).run();
            audit(tx, actorId(actor), 'key.revoke', key.id);
          },
          { behavior: 'immediate' },
        );
      },
    ),
  ];
}
