import { type ReactNode, useId, useState } from 'react';
import { Link } from 'react-router';
import { Button } from '../../../components/ui/button.tsx';
import { controlClass } from '../../../components/ui/field.tsx';
import { Failure, Pending } from '../../../components/ui/states.tsx';
import { formatYears } from '../../../lib/format-units.ts';
import { useSettled } from '../../../lib/use-settled.ts';
import { useFindParts } from '../api/find-parts.ts';
import type { FitPartName } from '../fit-state.ts';
import { partName } from '../use-fit-parts.ts';

const settleMs = 150;

interface PartPickerProps {
  kind: FitPartName;
  /** "Boat", "Lower unit" … */
  label: string;
  id: string | null;
  /** Name of the chosen one, once it is known. */
  name: string | undefined;
  sheet: (id: string) => string;
  onChange: (id: string | null) => void;
  /** Button that lets the catalog go: "describe it by shape and length". */
  without: string;
  /** What stands in place of a chosen part. */
  children?: ReactNode;
}

/** A part from the catalog, or the inputs that describe one instead. */
export function PartPicker({ kind, label, id, name, sheet, onChange, without, children }: PartPickerProps) {
  const [open, setOpen] = useState(false);
  const choose = (chosen: string | null) => {
    setOpen(false);
    onChange(chosen);
  };
  return (
    <div className="flex flex-col gap-3">
      {id !== null && (
        <p>
          {kind !== 'hull' && <span className="block font-firm">{label}</span>}
          {name && (
            <Link to={sheet(id)} className="inline-flex min-h-11 items-center">
              {name}
            </Link>
          )}
        </p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button aria-expanded={open} onClick={() => setOpen(!open)}>
          {id === null ? `${label} from the catalog` : 'Choose another'}
        </Button>
        {id !== null && <Button onClick={() => choose(null)}>{without}</Button>}
      </div>
      {open && <Finder kind={kind} label={label} onChoose={choose} />}
      {id === null && children}
    </div>
  );
}

function Finder({ kind, label, onChoose }: { kind: FitPartName; label: string; onChoose: (id: string) => void }) {
  const inputId = useId();
  const [typed, setTyped] = useState('');
  const found = useFindParts(kind, useSettled(typed.trim(), settleMs));
  return (
    <div className="flex flex-col gap-1 border-l border-ink pl-3">
      <label htmlFor={inputId} className="font-firm">
        {label}: maker or model
      </label>
      <input
        id={inputId}
        type="search"
        autoComplete="off"
        spellCheck={false}
        maxLength={80}
        className={controlClass}
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
      />
      {found.isPending && <Pending what="Looking" />}
      {found.isError && <Failure error={found.error} what="look in the catalog" retry={() => void found.refetch()} />}
      {found.data && (
        <>
          <p role="status" className="sr-only">
            {found.data.length === 0 ? 'Nothing found.' : `${found.data.length} found.`}
          </p>
          {found.data.length === 0 && <p className="text-note text-ink-2">Nothing of that name. Describe it below instead.</p>}
          <ul className="max-h-80 overflow-y-auto">
            {found.data.map((part) => (
              <li key={part.id}>
                <button
                  type="button"
                  onClick={() => onChoose(part.id)}
                  className="flex min-h-11 w-full flex-wrap items-baseline gap-x-2 border-b border-rule py-2 text-left hover:bg-slate-wash"
                >
                  <span className="font-firm">{partName(part)}</span>
                  <span className="text-note text-ink-2">
                    {part.generic ? 'usual for its class' : formatYears(part.yearFrom, part.yearTo)}
                  </span>
                </button>
              </li>
            ))}
          </ul>
        </>
      )}
    </div>
  );
}
