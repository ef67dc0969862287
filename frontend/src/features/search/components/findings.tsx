import { Empty, Failure } from '../../../components/ui/states.tsx';
import { useHullSearch } from '../api/search-hulls.ts';
import { usePartSearch } from '../api/search-parts.ts';
import { HullFinding, PartFinding } from './finding.tsx';

const most = 8;

interface FindingsProps {
  q: string;
  /** True while more is being typed. */
  waiting: boolean;
}

/** What a name was like, best first; where no boat is like it, the other parts that are. */
export function Findings({ q, waiting }: FindingsProps) {
  const hulls = useHullSearch(q, most);
  const found = hulls.data?.data ?? [];
  const noBoat = hulls.isSuccess && !hulls.isPlaceholderData && found.length === 0;
  const parts = usePartSearch(q, noBoat);

  if (hulls.isError) return <Failure error={hulls.error} what="search the catalog" retry={() => void hulls.refetch()} />;
  const late = waiting || hulls.isPlaceholderData;
  return (
    <div aria-busy={late || hulls.isPending}>
      <p role="status" className="sr-only">
        {late || hulls.isPending ? '' : sentence(found.length, hulls.data?.next != null)}
      </p>
      {found.length > 0 && (
        <ul className={`border-t border-ink ${late ? 'text-ink-2' : ''}`} aria-label="Boats">
          {found.map((hull) => (
            <HullFinding key={hull.id} hull={hull} />
          ))}
        </ul>
      )}
      {hulls.data?.next != null && !late && (
        <p className="pt-2 text-note text-ink-2">There are more; another word of the name narrows them down.</p>
      )}
      {noBoat && <NoBoat q={q} parts={parts.data?.data ?? []} />}
    </div>
  );
}

function NoBoat({ q, parts }: { q: string; parts: Parameters<typeof PartFinding>[0]['hit'][] }) {
  const others = parts.filter((hit) => hit.kind !== 'hulls');
  return (
    <>
      <Empty title={`No boat here is called “${q}”.`}>
        <p>Try the maker or the model alone. A boat that is not listed can be described by its shape and length instead.</p>
      </Empty>
      {others.length > 0 && (
        <>
          <h2 className="pt-4 text-note">Other parts with a name like that</h2>
          <ul>
            {others.map((hit) => (
              <PartFinding key={hit.id} hit={hit} />
            ))}
          </ul>
        </>
      )}
    </>
  );
}

function sentence(count: number, more: boolean): string {
  if (count === 0) return 'No boat found.';
  return `${more ? `The best ${count} boats` : count === 1 ? 'One boat' : `${count} boats`} found. The down arrow leads to them.`;
}
