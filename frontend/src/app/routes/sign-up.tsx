import { Link, useNavigate, useSearchParams } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { SignUpForm } from '../../features/session/components/sign-up-form.tsx';
import { paths, safeNext } from '../../lib/paths.ts';

export default function SignUp() {
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const next = search.get('next');
  return (
    <div className="flex max-w-[30rem] flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title="Make an account" />
      <p className="text-ink-2">With an account you keep boats and checks. The address is used to sign in and for nothing else.</p>
      <SignUpForm onSignedUp={() => void navigate(safeNext(next), { replace: true })} />
      <p>
        Have one already? <Link to={`${paths.signIn}${next ? `?next=${encodeURIComponent(next)}` : ''}`}>Sign in</Link>
      </p>
    </div>
  );
}
