import { useEffect, useRef } from 'react';
import { useSearchParams } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { ComparisonForm, Differences } from '../../features/editions/components/edition-comparison.tsx';
import { EditionList } from '../../features/editions/components/edition-list.tsx';
import { TableDownloads } from '../../features/editions/components/table-downloads.tsx';
import { readBetween } from '../../features/editions/edition-pair.ts';
import { RoleGate } from '../../features/session/components/role-gate.tsx';
import { StewardWays } from './steward-ways.tsx';

export default function StewardEditions() {
  return (
    <div className="flex flex-col gap-8 px-4 py-8 desk:px-6">
      <header className="flex flex-col gap-4">
        <PageTitle title="Editions" />
        <StewardWays />
      </header>
      <RoleGate needs="steward" what="look after the editions of the catalog">
        <Comparison />
        <section>
          <h2 className="mb-2 border-b border-ink pb-2 text-title">What was published</h2>
          <EditionList />
        </section>
        <section className="flex flex-col gap-3">
          <h2 className="border-b border-ink pb-2 text-title">Take a table with you</h2>
          <p className="text-ink-2">As CSV, as the newest edition has it. Uploaded again unchanged, every row reads “unchanged”.</p>
          <TableDownloads />
        </section>
      </RoleGate>
    </div>
  );
}

function Comparison() {
  const [search, setSearch] = useSearchParams();
  const [from, to] = [search.get('from') ?? '', search.get('to') ?? ''];
  const between = readBetween(from, to);
  const heading = useRef<HTMLHeadingElement>(null);
  const before = useRef(`${from} ${to}`);
  // The answer stands far from the edition it was asked at.
  useEffect(() => {
    if (before.current === `${from} ${to}`) return;
    before.current = `${from} ${to}`;
    heading.current?.focus();
  }, [from, to]);
  return (
    <section className="flex flex-col gap-4" aria-labelledby="compare">
      <h2 id="compare" ref={heading} tabIndex={-1} className="border-b border-ink pb-2 text-title">
        Compare two editions
      </h2>
      <ComparisonForm
        key={`${from} ${to}`}
        from={from}
        to={to}
        error={typeof between === 'string' ? between : null}
        onCompare={(earlier, later) => setSearch({ from: earlier, to: later }, { preventScrollReset: true })}
      />
      {between !== null && typeof between !== 'string' && <Differences key={`${between.from} ${between.to}`} {...between} />}
    </section>
  );
}
