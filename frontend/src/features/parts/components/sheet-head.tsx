import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { PageTitle } from '../../../components/ui/page-title.tsx';
import { Notice } from '../../../components/ui/states.tsx';
import { formatYears } from '../../../lib/format-units.ts';
import { paths } from '../../../lib/paths.ts';
import type { AnySheet } from '../api/get-sheet.ts';

interface SheetHeadProps {
  table: CatalogTable;
  sheet: AnySheet;
  /** The thing in a few words, e.g. "flat bottom · 4.2 m". */
  about: string;
  action?: ReactNode;
}

/** Name, years, what it is, and whether it still stands. */
export function SheetHead({ table, sheet, about, action }: SheetHeadProps) {
  const { maker, model, package: pack, yearFrom, yearTo, aliases, notes, edition } = sheet;
  const name = [maker, model, pack].filter(Boolean).join(' ');
  const facts = [formatYears(yearFrom, yearTo), about, `edition ${edition}`].filter(Boolean).join(' · ');
  return (
    <header className="flex flex-col gap-3">
      <PageTitle title={name}>
        <span className="block text-lead font-normal text-ink-2">{maker}</span> {model}{' '}
        {pack && <span className="font-normal">{pack}</span>}
      </PageTitle>
      <p className="text-ink-2">{facts}</p>
      {aliases && aliases.length > 0 && <p className="text-note text-ink-2">Also written: {aliases.join(', ')}</p>}
      {sheet.generic && (
        <Notice title="Not one make, but the usual values of its kind.">
          <p className="text-ink-2">
            Each is uncertain by as much as such things differ. A measured value of your own makes any answer surer.
          </p>
        </Notice>
      )}
      {sheet.status === 'superseded' && (
        <Notice tone="care" title="This entry has been replaced.">
          {sheet.supersededBy && <Link to={paths.part(table, sheet.supersededBy)}>Go to the entry that stands now</Link>}
        </Notice>
      )}
      {sheet.status === 'withdrawn' && (
        <Notice tone="care" title="This entry has been withdrawn.">
          <p className="text-ink-2">It stays readable for older checks; do not rig by it.</p>
        </Notice>
      )}
      {notes && <p className="max-w-[72ch] whitespace-pre-line">{notes}</p>}
      {action}
    </header>
  );
}
