import { CreatedKey, Key, NewKey, Rotation } from '@tiltwright/shared/schemas/account.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { listOf } from '../../http/cursor.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { createKey, revokeKey, rotateKey } from './issue-key.ts';
import { listKeys, toKey } from './queries.ts';

const tag = 'API keys';
const may = 'keys.own';
const keyParams = z.strictObject({ id: z.string().min(1).max(80) });

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
      ({ actor }) => ({ data: listKeys(db, actorId(actor)).map(toKey), next: null }),
    ),
    route(
      {
        id: 'createKey',
        method: 'post',
        path: '/me/keys',
        tag,
        summary: 'Make an API key',
        description:
          'The whole key is in this answer alone; it is stored hashed. A browser key is bound to the origins of the pages that use it.',
        may,
        body: NewKey,
        bodyExample: { name: 'Stock list', scopes: ['catalog:read', 'fit:compute'] },
        reply: { status: 201, description: 'The key, shown once.', schema: CreatedKey },
        repeat: 'refuse',
        cache: noStore,
      },
      ({ actor, body }) => createKey(db, actorId(actor), body),
    ),
    route(
      {
        id: 'rotateKey',
        method: 'post',
        path: '/me/keys/{id}/rotate',
        tag,
        summary: 'Give an API key a new secret',
        description:
          'Id, scopes and usage stay. For the overlap both secrets work, so that a program can be moved to the new one at leisure.',
        may,
        params: keyParams,
        body: Rotation,
        bodyExample: { overlapHours: 24 },
        reply: { status: 200, description: 'The key with its new secret, shown once.', schema: CreatedKey },
        problems: ['not-found', 'wrong-state'],
        cache: noStore,
      },
      ({ actor, params, body }) => rotateKey(db, actorId(actor), params.id, body.overlapHours),
    ),
    route(
      {
        id: 'revokeKey',
        method: 'delete',
        path: '/me/keys/{id}',
        tag,
        summary: 'Revoke an API key at once',
        may,
        params: keyParams,
        reply: { status: 204, description: 'Revoked.' },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, params }) => revokeKey(db, actorId(actor), params.id),
    ),
  ];
}
