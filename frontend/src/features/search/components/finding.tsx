import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { SearchHit } from '@tiltwright/shared/schemas/edition.ts';
import type { Hull } from '@tiltwright/shared/schemas/hull.ts';
import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { hullFormWords } from '../../../lib/form-words.ts';
import { formatQuantity, formatYears } from '../../../lib/format-units.ts';
import { paths } from '../../../lib/paths.ts';
import { useUnits } from '../../../lib/unit-choice.ts';

const kindWords: Record<CatalogTable, string> = {
  hulls: 'boat',
  'lower-units': 'motor',
  transducers: 'transducer',
  mounts: 'mount',
};

interface LineProps {
  to: string;
  name: ReactNode;
  about: string;
}

function Line({ to, name, about }: LineProps) {
  return (
    <li className="border-b border-rule">
      <Link to={to} className="group flex min-h-14 flex-col justify-center px-1 py-2 no-underline hover:bg-slate-wash">
        <span className="group-hover:underline">{name}</span>
        <span className="text-note text-ink-2">{about}</span>
      </Link>
    </li>
  );
}

interface Named {
  maker: string;
  model: string;
  package?: string | null;
}
function Name({ maker, model, package: pack }: Named) {
  return (
    <>
      {maker} <span className="font-firm">{model}</span>
      {pack && ` ${pack}`}
    </>
  );
}

export function HullFinding({ hull }: { hull: Hull }) {
  const units = useUnits();
  const about = [
    formatYears(hull.yearFrom, hull.yearTo),
    hullFormWords(hull.form),
    formatQuantity(hull.lengthM, 'lengthM', units),
    hull.deadriseDeg === undefined ? null : `deadrise\u00a0${formatQuantity(hull.deadriseDeg, 'angleDeg', units)}`,
    hull.generic ? 'usual values for boats of this kind' : null,
  ];
  return <Line to={paths.hull(hull.id)} name={<Name {...hull} />} about={about.filter(Boolean).join(' · ')} />;
}

export function PartFinding({ hit }: { hit: SearchHit }) {
  const about = [kindWords[hit.kind], formatYears(hit.yearFrom, hit.yearTo), hit.generic ? 'usual values for parts of this kind' : null];
  return <Line to={paths.part(hit.kind, hit.id)} name={<Name {...hit} />} about={about.filter(Boolean).join(' · ')} />;
}
