// Making, rotating and revoking keys; each is one transaction with its line in the audit log.
import type { CreatedKey, NewKey } from '@tiltwright/shared/schemas/account.ts';
import { hashSecret, newSecret, writeKey } from '../../auth/keys.ts';
import type { Db } from '../../db/connect.ts';
import { apiKeys } from '../../db/schema/people.ts';
import { ApiProblem } from '../../errors.ts';
import { newId } from '../../ids.ts';
import { audit } from '../audit.ts';
import { type KeyRow, keyOrProblem, ownKey, toKey } from './queries.ts';

export function createKey(db: Db, owner: string, { name, scopes, kind, origins, expiresAt }: NewKey): CreatedKey {
  const secret = newSecret();
  const row: KeyRow = {
    id: newId('key'),
    userId: owner,
    name,
    secretHash: hashSecret(secret),
    scopes: [...new Set(scopes)],
    kind,
    origins: [...new Set(origins)],
    previousHash: null,
    previousUntil: null,
    expiresAt,
    createdAt: new Date().toISOString(),
    lastUsedAt: null,
    revokedAt: null,
  };
  db.transaction(
    (tx) => {
      tx.insert(apiKeys).values(row).run();
      audit(tx, owner, 'key.create', row.id, { scopes: row.scopes, kind });
    },
    { behavior: 'immediate' },
  );
  return { ...toKey(row), key: writeKey({ id: row.id, secret }) };
}

/** A new secret under the same id; the old one works for the overlap. @throws ApiProblem not-found, wrong-state */
export function rotateKey(db: Db, owner: string, id: string, overlapHours: number): CreatedKey {
  const key = keyOrProblem(db, owner, id);
  if (key.revokedAt) throw new ApiProblem('wrong-state', 'A revoked key cannot be rotated; make a new one.');
  const secret = newSecret();
  const change = {
    secretHash: hashSecret(secret),
    previousHash: overlapHours > 0 ? key.secretHash : null,
    previousUntil: overlapHours > 0 ? new Date(Date.now() + overlapHours * 3_600_000).toISOString() : null,
  };
  db.transaction(
    (tx) => {
      tx.update(apiKeys).set(change).where(ownKey(owner, id)).run();
      audit(tx, owner, 'key.rotate', id, { overlapHours });
    },
    { behavior: 'immediate' },
  );
  return { ...toKey({ ...key, ...change }), key: writeKey({ id, secret }) };
}

/** At once; revoking again changes nothing. @throws ApiProblem not-found */
export function revokeKey(db: Db, owner: string, id: string): void {
  if (keyOrProblem(db, owner, id).revokedAt) return;
  db.transaction(
    (tx) => {
      tx.update(apiKeys)
        .set({ revokedAt: new Date().toISOString(), previousHash: null, previousUntil: null })
        .where(ownKey(owner, id))
        .run();
      audit(tx, owner, 'key.revoke', id);
    },
    { behavior: 'immediate' },
  );
}
