import { Link, useNavigate, useSearchParams } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { SignInForm } from '../../features/session/components/sign-in-form.tsx';
import { paths, safeNext } from '../../lib/paths.ts';

export default function SignIn() {
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const next = search.get('next');
  return (
    <div className="flex max-w-[30rem] flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title="Sign in" />
      <p className="text-ink-2">Looking up boats and checking a fit needs no account. With one you keep boats and checks.</p>
      <SignInForm onSignedIn={() => void navigate(safeNext(next), { replace: true })} />
      <p>
        Password lost? <Link to={paths.reset}>Choose a new one</Link>
      </p>
      <p>
        No account yet? <Link to={`${paths.signUp}${next ? `?next=${encodeURIComponent(next)}` : ''}`}>Make one</Link>
      </p>
    </div>
  );
}
