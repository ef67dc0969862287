import type { BegunSecondFactor, SecondFactor } from '@tiltwright/shared/schemas/access.ts';
import { and, count, eq, isNull } from 'drizzle-orm';
import {
  factorUri,
  hashRecoveryCode,
  newFactorSecret,
  newRecoveryCodes,
  openSecret,
  sealSecret,
  stepOfCode,
} from '../../auth/second-factor.ts';
import type { Db } from '../../db/connect.ts';
import { recoveryCodes, secondFactors } from '../../db/schema/access.ts';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { enqueueMail } from '../../mail/enqueue-mail.ts';
import { secondFactorChanged } from '../../mail/letters.ts';
import { isStaff, type User } from '../accounts/queries.ts';
import { audit } from '../audit.ts';

type Needs = Pick<Deps, 'db' | 'config'>;
const immediate = { behavior: 'immediate' } as const;

export function readSecondFactor({ db, config }: Needs, user: User): SecondFactor {
  const since = db.select().from(secondFactors).where(eq(secondFactors.userId, user.id)).get()?.confirmedAt ?? null;
  const left = db
    .select({ n: count() })
    .from(recoveryCodes)
    .where(and(eq(recoveryCodes.userId, user.id), isNull(recoveryCodes.usedAt)))
    .get();
  return { enabled: since !== null, since, recoveryCodesLeft: left?.n ?? 0, demanded: config.staffSecondFactor && isStaff(user) };
}

/** A new secret, good for nothing until a code confirms it. @throws ApiProblem wrong-state where one is in use */
export function beginSecondFactor({ db, config }: Needs, user: User, now = new Date()): BegunSecondFactor {
  const secret = newFactorSecret();
  const row = {
    userId: user.id,
    sealedSecret: sealSecret(secret, config.sessionSecret),
    createdAt: now.toISOString(),
    confirmedAt: null,
    lastStep: 0,
  };
  const { changes } = db
    .insert(secondFactors)
    .values(row)
    .onConflictDoUpdate({ target: secondFactors.userId, set: row, setWhere: isNull(secondFactors.confirmedAt) })
    .run();
  if (changes === 0) throw new ApiProblem('wrong-state', 'A second factor is in use; remove it before you set up another.');
  return { secret, uri: factorUri(secret, user.email) };
}

/** From here on signing in needs a code. @returns recovery codes, shown once @throws ApiProblem wrong-state or wrong-code */
export function confirmSecondFactor({ db, config }: Needs, user: User, code: string, now = new Date()): string[] {
  return db.transaction((tx) => {
    const begun = tx.select().from(secondFactors).where(eq(secondFactors.userId, user.id)).get();
    if (!begun || begun.confirmedAt) throw new ApiProblem('wrong-state', 'No second factor is waiting for its first code; begin anew.');
    const secret = openSecret(begun.sealedSecret, config.sessionSecret);
    const step = secret ? stepOfCode(secret, code, 0, now.getTime()) : null;
    if (step === null) throw new ApiProblem('wrong-code', 'The code does not match; look whether the clock of the device is right.');
    tx.update(secondFactors).set({ confirmedAt: now.toISOString(), lastStep: step }).where(eq(secondFactors.userId, user.id)).run();
    audit(tx, user.id, 'second-factor.add', user.id);
    enqueueMail(tx, user.email, secondFactorChanged('on', `${config.siteUrl}/account`), { now });
    return renewRecoveryCodes(tx, user.id);
  }, immediate);
}

/** Ten new ones; the old ones end. Inside a transaction. */
export function renewRecoveryCodes(tx: Pick<Db, 'insert' | 'delete'>, userId: string): string[] {
  const codes = newRecoveryCodes();
  tx.delete(recoveryCodes).where(eq(recoveryCodes.userId, userId)).run();
  tx.insert(recoveryCodes)
    .values(codes.map((code) => ({ userId, codeHash: hashRecoveryCode(code) })))
    .run();
  return codes;
}

/** @param actor who removes it: the person, or an admin for one who lost everything */
export function removeSecondFactor({ db, config }: Needs, user: User, actor: string, now = new Date()): void {
  db.transaction((tx) => {
    const { changes } = tx.delete(secondFactors).where(eq(secondFactors.userId, user.id)).run();
    tx.delete(recoveryCodes).where(eq(recoveryCodes.userId, user.id)).run();
    if (changes === 0) return;
    audit(tx, actor, 'second-factor.remove', user.id);
    enqueueMail(tx, user.email, secondFactorChanged('off', `${config.siteUrl}/account`), { now });
  }, immediate);
}
