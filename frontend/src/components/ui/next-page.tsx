import { useSearchParams } from 'react-router';
import { ButtonLink } from './button.tsx';

/** Ways to the first and the next page of a long list; the place is kept in the address. */
export function NextPage({ next }: { next: string | null }) {
  const [search] = useSearchParams();
  const here = search.get('cursor');
  if (!next && !here) return null;
  const to = (cursor: string | null) => {
    const query = new URLSearchParams(search);
    if (cursor) query.set('cursor', cursor);
    else query.delete('cursor');
    return `?${query}`;
  };
  return (
    <nav aria-label="Pages" className="flex flex-wrap gap-3 pt-4">
      {here && <ButtonLink to={to(null)}>First page</ButtonLink>}
      {next && <ButtonLink to={to(next)}>Next page</ButtonLink>}
    </nav>
  );
}
