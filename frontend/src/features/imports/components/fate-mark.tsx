import type { Fate } from '@tiltwright/shared/schemas/import.ts';

const looks: Record<Fate, string> = {
  new: 'border-slate bg-slate',
  changed: 'border-slate bg-slate-wash',
  unchanged: 'border-slate bg-sheet',
  duplicate: 'border-brass bg-sheet',
  conflict: 'border-brass dotted-ground',
  error: 'border-rust hatched',
};

/** A swatch that differs by its filling first and its colour second; the word stands beside it. */
export function FateMark({ fate }: { fate: Fate }) {
  return <span aria-hidden="true" className={`inline-block h-3 w-5 flex-none border ${looks[fate]}`} />;
}
