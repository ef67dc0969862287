import { useNavigate } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { VerifyForm } from '../../features/session/components/verify-form.tsx';
import { useLinkToken, wayAfterSignUp } from '../../lib/link-token.ts';
import { safeNext } from '../../lib/paths.ts';

export default function Verify() {
  const navigate = useNavigate();
  const token = useLinkToken();
  const goOn = () => {
    const next = safeNext(wayAfterSignUp.get());
    wayAfterSignUp.set('');
    void navigate(next, { replace: true });
  };
  return (
    <div className="flex max-w-[30rem] flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title="Finish your account" />
      <VerifyForm token={token} onVerified={goOn} />
    </div>
  );
}
