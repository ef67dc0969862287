import { useSearchParams } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { LinkNotWhole } from '../../features/session/components/link-not-whole.tsx';
import { OutboxList } from '../../features/session/components/outbox-list.tsx';
import { paths } from '../../lib/paths.ts';

export default function Outbox() {
  const [search] = useSearchParams();
  const to = search.get('to') ?? '';
  return (
    <div className="flex max-w-[44rem] flex-col gap-6 px-4 py-8 desk:px-6">
      <PageTitle title="The trial’s mail" />
      <p className="text-ink-2">A trial sends nothing: what would have gone out is kept on this machine and shown here.</p>
      {to === '' ? <LinkNotWhole used={false} again={{ to: paths.signUp, label: 'Sign up' }} /> : <OutboxList to={to} />}
    </div>
  );
}
