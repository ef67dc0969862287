import { Link, useLocation, useNavigate } from 'react-router';
import { Button } from '../../../components/ui/button.tsx';
import { paths } from '../../../lib/paths.ts';
import { useEndSession } from '../api/end-session.ts';
import { useSession } from '../api/get-session.ts';

/** "Sign in", or who is signed in and the way out. */
export function AccountLinks() {
  const session = useSession();
  const end = useEndSession();
  const navigate = useNavigate();
  const { pathname, search } = useLocation();
  const account = session.data?.account;

  if (!account) {
    const next = pathname === paths.signIn || pathname === paths.signUp ? '' : `?next=${encodeURIComponent(pathname + search)}`;
    return (
      <Link to={`${paths.signIn}${next}`} className="flex min-h-11 items-center px-2">
        Sign in
      </Link>
    );
  }
  const signOut = () => end.mutate(undefined, { onSuccess: () => navigate(paths.home) });
  return (
    <>
      <Link to={paths.account} aria-label={`Your account, ${account.name}`} className="flex min-h-11 items-center px-2 text-ink-2">
        <span className="hidden max-w-40 truncate tablet:inline">{account.name}</span>
        <span className="tablet:hidden">Account</span>
      </Link>
      <Button kind="bare" onClick={signOut} busy={end.isPending && 'Signing out'}>
        Sign out
      </Button>
    </>
  );
}
