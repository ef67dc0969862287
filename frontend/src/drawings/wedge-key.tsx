import { HatchSwatch } from './hatching.tsx';
import { degreeRange, type WedgeLabel } from './wedge-labels.ts';

/** What every hatched or dotted wedge is, by letter where the drawing had no room for words. */
export function WedgeKey({ labels, className = '' }: { labels: readonly WedgeLabel[]; className?: string }) {
  const named = labels.filter((label) => label.wedge.kind !== 'clear');
  if (named.length === 0) return null;
  return (
    <ul className={`flex flex-col gap-1 border-t border-rule px-3 py-2 text-note ${className}`}>
      {named.map(({ side, wedge, letter }) => (
        <li key={`${side} ${wedge.fromDeg}`} className="flex items-baseline gap-2">
          <HatchSwatch kind={wedge.kind} />
          <span>
            {letter && <b className="font-strong">{letter} </b>}
            {side}, {degreeRange(wedge.fromDeg, wedge.toDeg)} below level: {wedge.kind} by the {wedge.by}
          </span>
        </li>
      ))}
    </ul>
  );
}
