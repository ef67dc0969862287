import type { ReactNode } from 'react';
import { NavLink } from 'react-router';
import { PageTitle } from '../components/ui/page-title.tsx';
import { RoleGate } from '../features/session/components/role-gate.tsx';
import { paths } from '../lib/paths.ts';

const ways = [
  [paths.admin, 'People'],
  [paths.adminInvitations, 'Invitations'],
  [paths.adminLimits, 'Limits'],
  [paths.adminAudit, 'Audit log'],
  [paths.adminMail, 'Mail'],
  [paths.adminHealth, 'Health'],
] as const;

/** What stands around every page of the admin: its title, the ways between them, and the door. */
export function AdminPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div className="flex flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title={title} />
      <RoleGate needs="admin" what="run the site">
        <nav aria-label="Running the site" className="-mx-2 flex flex-wrap border-b border-rule">
          {ways.map(([to, label]) => (
            <NavLink
              key={to}
              to={to}
              end={to === paths.admin}
              className="flex min-h-11 items-center border-b-[3px] border-transparent px-2 pt-[3px] text-ink-2 no-underline hover:border-rule hover:text-ink aria-[current=page]:border-ink aria-[current=page]:font-firm aria-[current=page]:text-ink"
            >
              {label}
            </NavLink>
          ))}
        </nav>
        {children}
      </RoleGate>
    </div>
  );
}
