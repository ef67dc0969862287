import { Link } from 'react-router';
import { Failure, Pending } from '../../components/ui/states.tsx';
import { useOwnBoats } from '../../features/boats/api/list-boats.ts';
import { writeFitAddress } from '../../features/fit/fit-url.ts';
import { stateOfQuestion } from '../../features/fit/saved-question.ts';
import { paths } from '../../lib/paths.ts';

/** The boats of whoever is signed in, each one step from its check. */
export default function OwnBoats() {
  const boats = useOwnBoats();
  if (boats.isPending) return <Pending what="Fetching your boats" />;
  if (boats.isError) return <Failure error={boats.error} what="fetch your boats" retry={() => void boats.refetch()} />;
  if (boats.data.data.length === 0) return null;
  return (
    <section aria-labelledby="own-boats">
      <h2 id="own-boats" className="border-b border-ink pb-2 text-body">
        Your boats
      </h2>
      <ul>
        {boats.data.data.map((boat) => (
          <li key={boat.id} className="border-b border-rule">
            <Link
              to={`${paths.fit}?${writeFitAddress(stateOfQuestion(boat.question).state)}`}
              className="group flex min-h-14 flex-col justify-center px-1 py-2 no-underline hover:bg-slate-wash"
            >
              <span className="font-firm group-hover:underline">{boat.name}</span>
              {boat.story && <span className="text-note text-ink-2">{boat.story}</span>}
            </Link>
          </li>
        ))}
      </ul>
    </section>
  );
}
