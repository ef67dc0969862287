import { formatDay, formatExact } from '../../lib/format-date.ts';

/** A date in the reader's locale with the exact time on hover. */
export function Day({ iso }: { iso: string }) {
  return (
    <time dateTime={iso} title={formatExact(iso)} className="whitespace-nowrap">
      {formatDay(iso)}
    </time>
  );
}
