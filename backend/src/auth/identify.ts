// Who is asking: a bearer key, a session, or a visitor. Sets req.actor; decides nothing else.
import { and, eq, isNotNull, sql } from 'drizzle-orm';
import type { RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import { Strategy as BearerStrategy } from 'passport-http-bearer';
import type { Config } from '../config.ts';
import type { Db } from '../db/connect.ts';
import { secondFactors } from '../db/schema/access.ts';
import { apiKeys, users } from '../db/schema/people.ts';
import { ApiProblem } from '../errors.ts';
import { allowOrigin } from '../http/cors.ts';
import type { Actor } from './actor.ts';
import { readKey, secretMatches } from './keys.ts';
import { DrizzleSessionStore } from './session-store.ts';

export const cookieName = 'tiltwright';
type KeyActor = Extract<Actor, { kind: 'key' }>;

export function identify(db: Db, config: Config): RequestHandler[] {
  const findUser = db
    .select()
    .from(users)
    .where(eq(users.id, sql.placeholder('id')))
    .prepare();
  const findFactor = db
    .select({ userId: secondFactors.userId })
    .from(secondFactors)
    .where(and(eq(secondFactors.userId, sql.placeholder('id')), isNotNull(secondFactors.confirmedAt)))
    .prepare();
  const findKey = db
    .select({ key: apiKeys, user: users })
    .from(apiKeys)
    .innerJoin(users, eq(users.id, apiKeys.userId))
    .where(eq(apiKeys.id, sql.placeholder('id')))
    .prepare();
  const guards = new passport.Passport();

  guards.serializeUser((user, done) => done(null, user.id));
  guards.deserializeUser((id: string, done) => done(null, findUser.get({ id }) ? { id } : false));
  guards.use(
    new BearerStrategy((token, done) => {
      const parts = readKey(token);
      const found = parts && findKey.get({ id: parts.id });
      if (!found || found.user.disabledAt || !isGood(found.key, parts.secret)) return done(null, false);
      noteUse(db, found.key);
      const actor: KeyActor = {
        kind: 'key',
        keyId: found.key.id,
        userId: found.user.id,
        roles: found.user.roles,
        scopes: found.key.scopes,
        origins: found.key.kind === 'browser' ? found.key.origins : null,
      };
      return done(null, actor as never);
    }),
  );

  const sessions = session({
    name: cookieName,
    secret: config.sessionSecret,
    store: new DrizzleSessionStore(db, config.sessionMs),
    resave: false,
    saveUninitialized: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure: config.mode === 'production', maxAge: config.sessionMs },
  });

  /** Tokens in an address end up in logs; the strategy would take them from there. */
  const refuseMisplacedTokens: RequestHandler = (req, _res, next) => {
    const inBody = typeof req.body === 'object' && req.body !== null && Object.hasOwn(req.body, 'access_token');
    if (Object.hasOwn(req.query, 'access_token') || inBody)
      throw new ApiProblem('token-misplaced', 'Send the key as `Authorization: Bearer …`, never in the address or the body.');
    next();
  };

  const bearer: RequestHandler = (req, res, next) => {
    if (req.headers.authorization === undefined) return next();
    // The strategy's own 401 is plain text; a callback keeps every error problem+json.
    guards.authenticate('bearer', { session: false }, (error: unknown, actor: KeyActor | false) => {
      if (error) return next(error);
      if (!actor)
        return next(
          new ApiProblem('invalid-key', 'The key is unknown, revoked, expired or mistyped.', [], {
            'WWW-Authenticate': 'Bearer realm="tiltwright"',
          }),
        );
      const refusal = refusedOrigin(actor, req.headers.origin);
      if (refusal) return next(new ApiProblem('foreign-origin', refusal));
      if (req.headers.origin !== undefined) allowOrigin(res, req.headers.origin);
      req.actor = actor;
      next();
    })(req, res, next);
  };

  const skipForKeys =
    (handler: RequestHandler): RequestHandler =>
    (req, res, next) =>
      req.actor?.kind === 'key' ? next() : handler(req, res, next);

  const person: RequestHandler = (req, _res, next) => {
    if (req.actor) return next();
    const user = req.user && findUser.get({ id: req.user.id });
    const hadSession = new RegExp(`(^|;\\s*)${cookieName}=`).test(req.headers.cookie ?? '');
    req.actor =
      user && !user.disabledAt
        ? {
            kind: 'person',
            userId: user.id,
            roles: user.roles,
            factorLacking: config.staffSecondFactor && !findFactor.get({ id: user.id }),
          }
        : { kind: 'visitor', hadSession };
    next();
  };

  return [refuseMisplacedTokens, bearer, skipForKeys(sessions), skipForKeys(guards.session() as RequestHandler), person];
}

/** The present secret, or the one before it while the overlap of a rotation lasts. */
function isGood(key: typeof apiKeys.$inferSelect, secret: string): boolean {
  const now = new Date().toISOString();
  if (key.revokedAt || (key.expiresAt !== null && key.expiresAt <= now)) return false;
  if (secretMatches(secret, key.secretHash)) return true;
  return key.previousHash !== null && key.previousUntil !== null && key.previousUntil > now && secretMatches(secret, key.previousHash);
}

/** Why a key may not be used from where the request comes; undefined where it may. */
function refusedOrigin({ origins }: KeyActor, origin: string | undefined): string | undefined {
  if (origins === null)
    return origin === undefined ? undefined : 'A server key must not be used from a browser; anyone could read it there.';
  if (origin === undefined) return 'A browser key is for pages of its origins; a program takes a server key.';
  return origins.includes(origin) ? undefined : `The key does not list ${origin}.`;
}

/** Day by day is enough to see which keys are in use, and spares a write a request. */
function noteUse(db: Db, key: typeof apiKeys.$inferSelect): void {
  const now = new Date().toISOString();
  if (key.lastUsedAt?.slice(0, 10) === now.slice(0, 10)) return;
  db.update(apiKeys).set({ lastUsedAt: now }).where(eq(apiKeys.id, key.id)).run();
}
