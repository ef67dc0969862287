import {
  type Column,
  type ColumnDef,
  createSortedRowModel,
  type RowData,
  rowSortingFeature,
  type SortingState,
  sortFn_alphanumeric,
  sortFn_basic,
  sortFn_datetime,
  sortFn_text,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { type ReactNode, useState } from 'react';

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns: { alphanumeric: sortFn_alphanumeric, basic: sortFn_basic, datetime: sortFn_datetime, text: sortFn_text },
});

/**
 * Where a cell goes once the row is a short list on a narrow screen: at the head, at its right, under it in small print
 * with or without the heading before it, or at full size.
 */
type NarrowPlace = 'head' | 'side' | 'note' | 'labelled' | 'body';
/** `header` must be words: on a narrow screen it may stand before the cell. */
export type TableColumn<T extends RowData> = ColumnDef<typeof features, T> & { header: string; narrow?: NarrowPlace };
export type Sorting = SortingState;

interface DataTableProps<T extends RowData> {
  /** What the table shows, for those who do not see it; also its caption unless `captionHidden`. */
  caption: ReactNode;
  captionHidden?: boolean;
  /** Keep it outside the component, or memoised: a new list means a new table. */
  columns: readonly TableColumn<T>[];
  rows: readonly T[];
  rowId: (row: T) => string;
  /** Offered only where sorting helps. */
  sortable?: boolean;
  /** Where the order is kept outside, e.g. in the address. */
  sorting?: Sorting;
  onSortingChange?: (sorting: Sorting) => void;
}

/** Rows and columns; below the tablet width each row becomes a short list with the headings as labels, so nothing scrolls sideways. */
export function DataTable<T extends RowData>(props: DataTableProps<T>) {
  const { caption, captionHidden, columns, rows, rowId, sortable = false, onSortingChange } = props;
  const [ownSorting, setOwnSorting] = useState<Sorting>([]);
  const sorting = props.sorting ?? ownSorting;
  const table = useTable({
    features,
    columns: columns as TableColumn<T>[],
    data: rows as T[],
    getRowId: rowId,
    enableSorting: sortable,
    enableMultiSort: false,
    state: { sorting },
    onSortingChange: (update) => {
      const next = typeof update === 'function' ? update(sorting) : update;
      (onSortingChange ?? setOwnSorting)(next);
    },
  });

  // Roles are written out: a table laid out as blocks loses them in some browsers.
  return (
    // biome-ignore-start lint/a11y/noRedundantRoles: see above
    // biome-ignore-start lint/a11y/useSemanticElements: see above
    <table role="table" className="w-full border-collapse text-left max-tablet:block">
      <caption className={captionHidden ? 'sr-only' : 'pb-2 text-left text-note text-ink-2 max-tablet:block'}>{caption}</caption>
      <thead role="rowgroup" className="max-tablet:sr-only">
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id} role="row" className="border-b border-ink align-bottom">
            {group.headers.map((header) => (
              <th
                key={header.id}
                role="columnheader"
                scope="col"
                aria-sort={sortable ? ariaSort(header.column) : undefined}
                className="py-2 pr-4 text-note last:pr-0"
              >
                {header.column.getCanSort() ? (
                  <button
                    type="button"
                    onClick={header.column.getToggleSortingHandler()}
                    className="min-h-11 text-left font-strong underline underline-offset-4"
                  >
                    <table.FlexRender header={header} />
                    <SortWord column={header.column} />
                  </button>
                ) : (
                  <table.FlexRender header={header} />
                )}
              </th>
            ))}
          </tr>
        ))}
      </thead>
      <tbody role="rowgroup" className="max-tablet:block">
        {table.getRowModel().rows.map((row) => (
          <tr
            key={row.id}
            role="row"
            className="border-b border-rule align-top max-tablet:grid max-tablet:grid-cols-[minmax(0,1fr)_auto] max-tablet:gap-x-4 max-tablet:py-3"
          >
            {row.getAllCells().map((cell) => (
              <td
                key={cell.id}
                role="cell"
                data-label={(cell.column.columnDef as TableColumn<T>).header}
                className={`py-2 pr-4 last:pr-0 max-tablet:p-0 ${narrowLooks[(cell.column.columnDef as TableColumn<T>).narrow ?? 'labelled']}`}
              >
                <div className="min-w-0">
                  <table.FlexRender cell={cell} />
                </div>
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
    // biome-ignore-end lint/a11y/useSemanticElements: see above
    // biome-ignore-end lint/a11y/noRedundantRoles: see above
  );
}

const narrowLooks: Record<NarrowPlace, string> = {
  body: 'max-tablet:col-span-2 max-tablet:py-1',
  head: 'max-tablet:-order-2 max-tablet:col-start-1',
  side: 'max-tablet:-order-1 max-tablet:col-start-2 max-tablet:max-w-48 max-tablet:text-right',
  note: 'max-tablet:col-span-2 max-tablet:text-note max-tablet:text-ink-2 max-tablet:has-[.narrow-skip]:hidden',
  labelled:
    'labelled max-tablet:col-span-2 max-tablet:grid max-tablet:grid-cols-[7rem_minmax(0,1fr)] max-tablet:gap-2 max-tablet:text-note max-tablet:has-[.narrow-skip]:hidden',
};

/** Stands in a cell for what nobody noted; on a narrow screen the whole line is left out. */
export function NotNoted({ words = 'not noted' }: { words?: string }) {
  return <span className="narrow-skip text-ink-2">{words}</span>;
}

function ariaSort<T extends RowData>(column: Column<typeof features, T>) {
  const order = column.getIsSorted();
  return order === 'asc' ? 'ascending' : order === 'desc' ? 'descending' : 'none';
}

function SortWord<T extends RowData>({ column }: { column: Column<typeof features, T> }) {
  const order = column.getIsSorted();
  if (!order) return null;
  return <span className="font-normal text-ink-2"> {order === 'asc' ? 'up' : 'down'}</span>;
}
