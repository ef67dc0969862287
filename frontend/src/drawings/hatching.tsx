/** The hatching for what is hidden and the dots for what is thinned, as SVG patterns under the ids given. */
export function Hatching({ hiddenId, thinnedId }: { hiddenId: string; thinnedId: string }) {
  return (
    <defs>
      <pattern id={hiddenId} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
        <rect width="7" height="7" className="fill-rust-wash" />
        <line x1="0" y1="0" x2="0" y2="7" className="stroke-rust" strokeWidth="1.5" />
      </pattern>
      <pattern id={thinnedId} width="6" height="6" patternUnits="userSpaceOnUse">
        <rect width="6" height="6" className="fill-sheet" />
        <circle cx="1.5" cy="1.5" r="1" className="fill-brass" />
        <circle cx="4.5" cy="4.5" r="1" className="fill-brass" />
      </pattern>
    </defs>
  );
}

/** A little of the same hatching for a line of text. */
export function HatchSwatch({ kind }: { kind: 'clear' | 'thinned' | 'hidden' }) {
  const looks = { clear: 'border-slate', thinned: 'border-brass border-dotted dotted-ground', hidden: 'border-rust hatched' };
  return <span aria-hidden="true" className={`inline-block h-3 w-6 shrink-0 border ${looks[kind]}`} />;
}
