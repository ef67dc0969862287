import * as z from 'zod';

export const roles = ['customer', 'integrator', 'steward', 'admin'] as const;
export const Role = z.enum(roles).meta({ id: 'Role' });
export type Role = z.infer<typeof Role>;

export const Email = z.email().max(254).toLowerCase();
/** 12 characters or more, no other rule (NIST SP 800-63B 5.1.1 advises length over composition). */
export const Password = z.string().min(12, 'at least 12 characters').max(200);

export const PersonName = z
  .string()
  .trim()
  .min(1)
  .max(80)
  .refine((name) => !/\p{Cc}/u.test(name), 'must not contain control characters');

export const SignIn = z
  .strictObject({
    email: Email,
    password: z.string().min(1).max(200),
    code: z
      .string()
      .trim()
      .min(6)
      .max(40)
      .optional()
      .describe('Of the second factor, where the account has one: six digits, or a recovery code.'),
  })
  .meta({ id: 'SignIn' });
export type SignIn = z.infer<typeof SignIn>;

export const SignUp = z
  .strictObject({ email: Email, password: Password, name: PersonName, integrator: z.boolean().default(false) })
  .meta({ id: 'SignUp' });
export type SignUp = z.infer<typeof SignUp>;

/** The units a person reads and types in; the product itself keeps mm, m, kn and kg. */
export const Units = z
  .strictObject({ length: z.enum(['mm', 'in']), speed: z.enum(['kn', 'km/h', 'mph']), mass: z.enum(['kg', 'lb']) })
  .meta({ id: 'Units' });
export type Units = z.infer<typeof Units>;

export const Account = z
  .strictObject({
    id: z.string(),
    email: z.string(),
    name: z.string(),
    roles: z.array(Role),
    createdAt: z.iso.datetime(),
    units: Units.nullable().describe('Null until chosen.'),
    secondFactor: z.boolean().describe('Signing in needs a code as well.'),
    secondFactorDemanded: z.boolean().describe('This site asks staff for one; until it is set up, staff work is refused.'),
  })
  .meta({ id: 'Account' });
export type Account = z.infer<typeof Account>;

export const Session = z
  .strictObject({ account: Account.nullable().describe('Null for a visitor.'), expiresAt: z.iso.datetime().nullable() })
  .meta({ id: 'Session' });
export type Session = z.infer<typeof Session>;

export const scopes = ['catalog:read', 'fit:compute', 'boats:write', 'webhooks:manage'] as const;
export const Scope = z.enum(scopes).meta({ id: 'Scope' });
export type Scope = z.infer<typeof Scope>;

export const keyKinds = ['server', 'browser'] as const;
export const KeyKind = z
  .enum(keyKinds)
  .describe('A server key is a secret and refuses browsers; a browser key can be read by anyone and works from its origins alone.')
  .meta({ id: 'KeyKind' });
/** What a browser key may have. */
export const browserScopes: readonly Scope[] = ['catalog:read', 'fit:compute'];

const KeyOrigin = z
  .string()
  .max(200)
  .regex(/^https?:\/\/[a-z0-9.-]+(:\d{1,5})?$/, 'an origin as browsers send it: https://shop.example, no path, lower case');

export const NewKey = z
  .strictObject({
    name: z.string().trim().min(1).max(80),
    scopes: z.array(Scope).min(1).max(scopes.length),
    kind: KeyKind.default('server'),
    origins: z.array(KeyOrigin).max(20).default([]).describe('Of the pages that may use a browser key.'),
    expiresAt: z.iso.datetime().nullable().default(null).describe('When it stops working by itself; null for never.'),
  })
  .refine(({ kind, origins }) => (kind === 'browser') === origins.length > 0, {
    path: ['origins'],
    message: 'a browser key needs at least one origin, a server key takes none',
  })
  .refine(({ kind, scopes }) => kind === 'server' || scopes.every((scope) => browserScopes.includes(scope)), {
    path: ['scopes'],
    message: `a browser key may have ${browserScopes.join(' and ')} only`,
  })
  .meta({ id: 'NewKey' });
export type NewKey = z.infer<typeof NewKey>;

export const Key = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    prefix: z.string().describe('How the key begins; the rest is shown once, at its creation.'),
    scopes: z.array(Scope),
    kind: KeyKind,
    origins: z.array(z.string()),
    expiresAt: z.iso.datetime().nullable(),
    previousUntil: z.iso.datetime().nullable().describe('Until then the secret before the last rotation works too.'),
    createdAt: z.iso.datetime(),
    lastUsedAt: z.iso.datetime().nullable(),
    revokedAt: z.iso.datetime().nullable(),
  })
  .meta({ id: 'Key' });
export type Key = z.infer<typeof Key>;
export const CreatedKey = Key.extend({ key: z.string().describe('Shown once.') }).meta({ id: 'CreatedKey' });
export type CreatedKey = z.infer<typeof CreatedKey>;

export const Rotation = z
  .strictObject({ overlapHours: z.number().min(0).max(168).default(24).describe('How long the old secret works beside the new one.') })
  .meta({ id: 'Rotation' });
