// The one place that decides who may do what. Every operation names one permission.
import type { Role, Scope } from '@tiltwright/shared/schemas/account.ts';
import { ApiProblem } from '../errors.ts';
import type { Actor } from './actor.ts';

interface Rule {
  /** 'anyone' includes visitors; 'members' is whoever is signed in. */
  who: 'anyone' | 'members' | readonly Role[];
  /** Scope an API key needs; null: not for keys at all. */
  scope: Scope | null;
}

const rules = {
  'catalog.read': { who: 'anyone', scope: 'catalog:read' },
  'fit.compute': { who: 'anyone', scope: 'fit:compute' },
  'session.use': { who: 'anyone', scope: null },
  'account.own': { who: 'members', scope: null },
  'boats.own': { who: ['customer'], scope: 'boats:write' },
  'keys.own': { who: ['integrator'], scope: null },
  'batch.compute': { who: 'members', scope: 'fit:compute' },
  'webhooks.own': { who: ['integrator'], scope: 'webhooks:manage' },
  'site.run': { who: ['admin'], scope: null },
  'limits.manage': { who: ['admin'], scope: null },
  'imports.manage': { who: ['steward'], scope: null },
} as const satisfies Record<string, Rule>;
export type Permission = keyof typeof rules;

/** An admin may all that a steward may; customer and integrator stand on their own. */
const effectiveRoles = (roles: readonly Role[]) => (roles.includes('admin') ? [...roles, 'steward' as const] : roles);

/** @throws ApiProblem sign-in-needed, session-expired, scope-missing, not-allowed or second-factor-required */
export function demand(actor: Actor, permission: Permission): void {
  const rule: Rule = rules[permission];
  if (actor.kind === 'key') {
    if (rule.scope === null) throw new ApiProblem('not-allowed', 'An API key cannot do this; sign in on the site.');
    if (!actor.scopes.includes(rule.scope)) throw new ApiProblem('scope-missing', `The key needs the scope ${rule.scope}.`);
  }
  if (rule.who === 'anyone') return;
  if (actor.kind === 'visitor') {
    throw actor.hadSession
      ? new ApiProblem('session-expired', 'The session has ended; sign in again. Nothing was changed.')
      : new ApiProblem('sign-in-needed', 'Sign in to do this.');
  }
  if (rule.who === 'members') return;
  const roles = effectiveRoles(actor.roles);
  if (!rule.who.some((role) => roles.includes(role))) throw new ApiProblem('not-allowed', `This needs the role ${rule.who.join(' or ')}.`);
  if (isStaffWork(permission) && actor.kind === 'person' && actor.factorLacking)
    throw new ApiProblem('second-factor-required', 'Set up a second factor on your account page first; this site asks it of its staff.');
}

/** In words, for the API document. */
export function describePermission(permission: Permission): string {
  const rule: Rule = rules[permission];
  const who = rule.who === 'anyone' ? 'Anyone' : rule.who === 'members' ? 'Whoever is signed in' : `Role ${rule.who.join(' or ')}`;
  return rule.scope ? `${who}; a key needs the scope \`${rule.scope}\`.` : `${who}; not for API keys.`;
}

export const keyScopeOf = (permission: Permission): Scope | null => rules[permission].scope;
/** Whether it is work of stewards or admins alone. */
export function isStaffWork(permission: Permission): boolean {
  const { who }: Rule = rules[permission];
  return typeof who !== 'string' && who.every((role) => role === 'steward' || role === 'admin');
}
export const openToAnyone = (permission: Permission): boolean => rules[permission].who === 'anyone';
