import { useLocation } from 'react-router';
import { ButtonLink } from '../../components/ui/button.tsx';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { paths } from '../../lib/paths.ts';

export default function NotFound() {
  const { pathname } = useLocation();
  return (
    <div className="flex max-w-[72ch] flex-col items-start gap-4 px-4 py-8 desk:px-6">
      <PageTitle title="Nothing at this address" />
      <p className="text-ink-2">
        There is no screen at <span className="font-firm break-all">{pathname}</span>. The link may have lost a part on its way.
      </p>
      <div className="flex flex-wrap gap-3">
        <ButtonLink kind="main" to={paths.home}>
          Look for a boat
        </ButtonLink>
        <ButtonLink to={paths.fit}>Check a fit</ButtonLink>
      </div>
    </div>
  );
}
