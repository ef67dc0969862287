import { useNavigate } from 'react-router';
import { Day } from '../../components/ui/day.tsx';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { Failure, Pending } from '../../components/ui/states.tsx';
import { useInvitationOffer } from '../../features/session/api/invitation.ts';
import { InvitationForm } from '../../features/session/components/invitation-form.tsx';
import { LinkNotWhole } from '../../features/session/components/link-not-whole.tsx';
import { useLinkToken } from '../../lib/link-token.ts';
import { paths } from '../../lib/paths.ts';
import { hasCode } from '../../lib/problem.ts';
import { roleListWords } from '../../lib/role-words.ts';

export default function InvitationPage() {
  const token = useLinkToken();
  return (
    <div className="flex max-w-[30rem] flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title="An invitation" />
      {token === '' ? <LinkNotWhole used={false} again={{ to: paths.home, label: 'Look for a boat' }} /> : <Offer token={token} />}
    </div>
  );
}

function Offer({ token }: { token: string }) {
  const navigate = useNavigate();
  const offer = useInvitationOffer(token);
  if (offer.isPending) return <Pending what="Reading the invitation" />;
  if (hasCode(offer.error, 'link-expired')) return <LinkNotWhole used again={{ to: paths.home, label: 'Look for a boat' }} />;
  if (offer.isError) return <Failure error={offer.error} what="read the invitation" retry={() => void offer.refetch()} />;
  return (
    <>
      <p>
        You are invited as {roleListWords(offer.data.roles)}, with the address{' '}
        <span className="font-firm break-all">{offer.data.email}</span>. The invitation is good until <Day iso={offer.data.expiresAt} />.
      </p>
      <InvitationForm token={token} offer={offer.data} onAccepted={() => void navigate(paths.home, { replace: true })} />
    </>
  );
}
