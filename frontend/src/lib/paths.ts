// Every address of the site, in one place. Parts of an address that come from data are escaped here.
import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';

const sheet = (table: CatalogTable) => (id: string) => `/${table}/${encodeURIComponent(id)}`;

export const paths = {
  home: '/',
  fit: '/fit',
  fitForHull: (id: string) => `/fit?hull=${encodeURIComponent(id)}`,
  hull: sheet('hulls'),
  lowerUnit: sheet('lower-units'),
  transducer: sheet('transducers'),
  mount: sheet('mounts'),
  part: (table: CatalogTable, id: string) => sheet(table)(id),
  signIn: '/sign-in',
  signUp: '/sign-up',
  verify: '/verify',
  reset: '/reset',
  invitation: '/invitation',
  account: '/account',
  outbox: '/outbox',
  admin: '/admin',
  adminInvitations: '/admin/invitations',
  adminAudit: '/admin/audit',
  adminPerson: (id: string) => `/admin/people/${encodeURIComponent(id)}`,
  adminLimits: '/admin/limits',
  auditBy: (id: string) => `/admin/audit?actor=${encodeURIComponent(id)}`,
  adminMail: '/admin/mail',
  adminMailSheet: (id: string) => `/admin/mail/${encodeURIComponent(id)}`,
  adminHealth: '/admin/health',
  steward: '/steward',
  stewardImport: (id: string) => `/steward/imports/${encodeURIComponent(id)}`,
  stewardEditions: '/steward/editions',
  /** What one edition changed. */
  stewardEdition: (n: number) => `/steward/editions?from=${n - 1}&to=${n}`,
} as const;

/** Only an address of this site, so that a link cannot send someone elsewhere after signing in. */
export function safeNext(next: string | null): string {
  return next?.startsWith('/') && !next.startsWith('//') && !next.startsWith('/\\') ? next : paths.home;
}
