import { Link, useParams, useSearchParams } from 'react-router';
import { Day } from '../../components/ui/day.tsx';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { Failure, Pending } from '../../components/ui/states.tsx';
import { useImport } from '../../features/imports/api/get-import.ts';
import { ImportSheet } from '../../features/imports/components/import-sheet.tsx';
import { allFates, statusWords } from '../../features/imports/import-words.ts';
import { RoleGate } from '../../features/session/components/role-gate.tsx';
import { paths } from '../../lib/paths.ts';
import { tableWords } from '../../lib/table-words.ts';

export default function StewardImport() {
  const { id = '' } = useParams();
  return (
    <div className="flex flex-col gap-6 px-4 py-8 desk:px-6">
      <Link to={paths.steward} className="flex min-h-11 items-center self-start">
        All tables
      </Link>
      <RoleGate needs="steward" what="see uploaded tables">
        <Upload id={id} />
      </RoleGate>
    </div>
  );
}

function Upload({ id }: { id: string }) {
  const [search] = useSearchParams();
  const query = useImport(id);
  if (query.isPending) {
    return (
      <>
        <PageTitle title="An uploaded table" />
        <Pending what="Fetching the upload" />
      </>
    );
  }
  if (query.isError) {
    return (
      <>
        <PageTitle title="No upload to show" />
        <Failure error={query.error} what="fetch this upload" retry={() => void query.refetch()} />
      </>
    );
  }
  const record = query.data;
  const fate = allFates.find((word) => word === search.get('fate'));
  return (
    <>
      <header>
        <PageTitle title={record.fileName} className="text-head break-all" />
        <p className="text-ink-2">
          Table of {tableWords[record.table]} · {statusWords[record.status]} · uploaded <Day iso={record.createdAt} />
        </p>
      </header>
      <ImportSheet record={record} fate={fate} atColumns={search.get('step') === 'columns'} />
    </>
  );
}
