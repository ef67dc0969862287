import * as z from 'zod';

export const roles = ['customer', 'integrator', 'steward', 'admin'] as const;
export const Role = z.enum(roles).meta({ id: 'Role' });
export type Role = z.infer<typeof Role>;

const Email = z.email().max(254).toLowerCase();
/** 12 characters or more, no other rule (NIST SP 800-63B 5.1.1 advises length over composition). */
const Password = z.string().min(12, 'at least 12 characters').max(200);

export const SignIn = z.strictObject({ email: Email, password: z.string().min(1).max(200) }).meta({ id: 'SignIn' });
export type SignIn = z.infer<typeof SignIn>;

export const SignUp = z
  .strictObject({ email: Email, password: Password, name: z.string().trim().min(1).max(80), integrator: z.boolean().default(false) })
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

export const NewKey = z
  .strictObject({ name: z.string().trim().min(1).max(80), scopes: z.array(Scope).min(1).max(scopes.length) })
  .meta({ id: 'NewKey' });
export type NewKey = z.infer<typeof NewKey>;

export const Key = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    prefix: z.string().describe('How the key begins; the rest is shown once, at its creation.'),
    scopes: z.array(Scope),
    createdAt: z.iso.datetime(),
    lastUsedAt: z.iso.datetime().nullable(),
    revokedAt: z.iso.datetime().nullable(),
  })
  .meta({ id: 'Key' });
export type Key = z.infer<typeof Key>;
export const CreatedKey = Key.extend({ key: z.string().describe('Shown once.') }).meta({ id: 'CreatedKey' });
export type CreatedKey = z.infer<typeof CreatedKey>;
