import type { Fate, FateCounts } from '@tiltwright/shared/schemas/import.ts';
import { Link } from 'react-router';
import { allFates, fateWords } from '../import-words.ts';
import { FateMark } from './fate-mark.tsx';

interface FateFilterProps {
  counts: FateCounts;
  total: number;
  chosen: Fate | undefined;
}

/** How many rows have which fate; each leads to those rows. */
export function FateFilter({ counts, total, chosen }: FateFilterProps) {
  return (
    <nav aria-label="Rows by fate">
      <ul className="flex flex-wrap gap-y-2 tablet:gap-x-0">
        <Choice to="?" word="all" count={total} current={chosen === undefined} />
        {allFates.map((fate) => (
          <Choice key={fate} to={`?fate=${fate}`} word={fateWords[fate]} count={counts[fate]} current={chosen === fate} fate={fate} />
        ))}
      </ul>
    </nav>
  );
}

interface ChoiceProps {
  to: string;
  word: string;
  count: number;
  current: boolean;
  fate?: Fate;
}

function Choice({ to, word, count, current, fate }: ChoiceProps) {
  return (
    <li className="-ml-px first:ml-0">
      <Link
        to={to}
        replace
        preventScrollReset
        aria-current={current ? 'true' : undefined}
        className="flex min-h-11 items-center gap-2 border border-ink bg-sheet px-3 no-underline hover:bg-slate-wash aria-[current=true]:bg-ink aria-[current=true]:text-sheet"
      >
        {fate && <FateMark fate={fate} />}
        {word} <span className="font-strong">{count}</span>
      </Link>
    </li>
  );
}
