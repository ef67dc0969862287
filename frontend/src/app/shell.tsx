import { Suspense } from 'react';
import { Link, NavLink, Outlet, useLocation } from 'react-router';
import { Pending } from '../components/ui/states.tsx';
import { mayAct, useSession } from '../features/session/api/get-session.ts';
import { AccountLinks } from '../features/session/components/account-links.tsx';
import { AccountUnits } from '../features/session/components/account-units.tsx';
import { paths } from '../lib/paths.ts';
import { ErrorBoundary } from './error-boundary.tsx';
import { Mark } from './mark.tsx';
import { Preferences } from './preferences.tsx';

/** What stands around every screen: the skip link, the name, the ways to go, the screen itself, the small print. */
export function Shell() {
  const { pathname } = useLocation();
  return (
    <div className="flex min-h-dvh flex-col">
      <a href="#screen" className="sr-only focus:not-sr-only focus:absolute focus:z-10 focus:bg-ink focus:p-3 focus:text-sheet">
        Skip to the screen
      </a>
      <Header />
      <main id="screen" tabIndex={-1} className="flex-1 focus:outline-none">
        <ErrorBoundary resetOn={pathname}>
          <Suspense
            fallback={
              <div className="min-h-dvh px-4 py-6 desk:px-6">
                <Pending what="Fetching the screen" />
              </div>
            }
          >
            <Outlet />
          </Suspense>
        </ErrorBoundary>
      </main>
      <Footer />
    </div>
  );
}

function Header() {
  const session = useSession();
  return (
    <header className="flex flex-wrap items-stretch gap-x-2 border-b border-ink px-4 tablet:gap-x-6 desk:px-6">
      <Link to={paths.home} className="flex min-h-14 items-center gap-2 text-lead font-strong no-underline">
        <Mark />
        Tiltwright
      </Link>
      <nav aria-label="Screens" className="order-last -mx-2 flex w-full flex-wrap tablet:order-none tablet:w-auto">
        <Way to={paths.home}>Boats</Way>
        <Way to={paths.fit}>Check a fit</Way>
        {mayAct(session.data?.account?.roles, 'steward') && <Way to={paths.steward}>Tables</Way>}
        {mayAct(session.data?.account?.roles, 'admin') && <Way to={paths.admin}>The site</Way>}
      </nav>
      <div className="-mr-2 ml-auto flex items-center tablet:gap-2">
        <Preferences />
        <AccountLinks />
        <AccountUnits />
      </div>
    </header>
  );
}

function Way({ to, children }: { to: string; children: string }) {
  return (
    <NavLink
      to={to}
      end={to === paths.home}
      className="flex min-h-11 items-center border-b-[3px] border-transparent px-2 pt-[3px] text-ink-2 no-underline hover:border-rule hover:text-ink aria-[current=page]:border-ink aria-[current=page]:font-firm aria-[current=page]:text-ink"
    >
      {children}
    </NavLink>
  );
}

function Footer() {
  return (
    <footer className="mt-12 border-t border-rule px-4 py-4 text-note text-ink-2 desk:px-6">
      <p className="max-w-[72ch]">
        An estimate, not an approval, and not for navigation. Follow the instructions of whoever built the boat, the motor and the
        transducer, and the local rules; ask a qualified technician when unsure. <a href="/api/docs">The same answers over an API</a>.
      </p>
    </footer>
  );
}
