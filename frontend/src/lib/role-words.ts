import type { Role } from '@tiltwright/shared/schemas/account.ts';

/** What each role comes for, in a line. */
export const roleTasks: Record<Role, string> = {
  customer: 'keeps boats, rigs and checks',
  integrator: 'uses the API with keys',
  steward: 'keeps the catalog: imports, corrections, editions',
  admin: 'runs the site; may do a steward’s work',
};

export const roleListWords = (roles: readonly Role[]): string =>
  roles.length < 2 ? roles.join('') : `${roles.slice(0, -1).join(', ')} and ${roles.at(-1)}`;
