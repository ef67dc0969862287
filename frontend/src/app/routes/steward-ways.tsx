import { NavLink } from 'react-router';
import { paths } from '../../lib/paths.ts';

const ways = [
  { to: paths.steward, words: 'Uploads' },
  { to: paths.stewardEditions, words: 'Editions' },
];

/** The steward's screens, side by side. */
export function StewardWays() {
  return (
    <nav aria-label="Tables">
      <ul className="flex flex-wrap">
        {ways.map(({ to, words }) => (
          <li key={to} className="-ml-px first:ml-0">
            <NavLink
              to={to}
              end
              className="flex min-h-11 items-center border border-ink bg-sheet px-4 no-underline hover:bg-slate-wash aria-[current=page]:bg-ink aria-[current=page]:text-sheet"
            >
              {words}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
