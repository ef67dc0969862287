import { buttonClass } from '../../../components/ui/button.tsx';
import { apiBase } from '../../../lib/api-client.ts';
import { allTables, tableWords } from '../../../lib/table-words.ts';

/** Each table of the newest edition as a file. */
export function TableDownloads() {
  return (
    <ul className="flex flex-wrap gap-3">
      {allTables.map((table) => (
        <li key={table}>
          <a className={buttonClass('plain')} href={`${apiBase}/exports/${table}.csv`} download>
            <span className="sr-only">Download </span>
            {tableWords[table]}
            <span className="sr-only"> as CSV</span>
          </a>
        </li>
      ))}
    </ul>
  );
}
