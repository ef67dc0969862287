import { useNavigate } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { ImportList } from '../../features/imports/components/import-list.tsx';
import { UploadForm } from '../../features/imports/components/upload-form.tsx';
import { RoleGate } from '../../features/session/components/role-gate.tsx';
import { paths } from '../../lib/paths.ts';
import { StewardWays } from './steward-ways.tsx';

export default function Steward() {
  const navigate = useNavigate();
  return (
    <div className="flex flex-col gap-8 px-4 py-8 desk:px-6">
      <header className="flex flex-col gap-4">
        <PageTitle title="Tables" />
        <StewardWays />
      </header>
      <RoleGate needs="steward" what="bring tables into the catalog">
        <section className="flex flex-col gap-4">
          <h2 className="border-b border-ink pb-2 text-title">Upload a table</h2>
          <UploadForm onUploaded={(id) => void navigate(paths.stewardImport(id))} />
        </section>
        <section>
          <h2 className="mb-2 border-b border-ink pb-2 text-title">Uploads</h2>
          <ImportList />
        </section>
      </RoleGate>
    </div>
  );
}
