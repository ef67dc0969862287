import { type ReactNode, type RefObject, useId } from 'react';

interface DrawingFrameProps {
  title: string;
  /** What the drawing shows, in sentences, for who cannot see it. */
  alternative: string;
  /** The outcome in a few words, under the title. */
  outcome?: string | undefined;
  /** "1 : 12" and the like. */
  scale: string;
  boxRef: RefObject<HTMLDivElement | null>;
  widthPx: number;
  heightPx: number;
  /** Still the last answer, while the next one is on its way. */
  stale?: boolean;
  children: ReactNode;
}

/** A drawing with its caption, its scale and its words. It is laid out in pixels, so text keeps its size at any width. */
export function DrawingFrame({
  title,
  alternative,
  outcome,
  scale,
  boxRef,
  widthPx,
  heightPx,
  stale,

  children,
}: DrawingFrameProps) {
  const id = useId();
  return (
    <figure className="m-0 bg-sheet" data-drawing={title}>
      <figcaption className="flex flex-wrap items-baseline justify-between gap-x-4 px-3 pt-2">
        <span className="font-firm">{title}</span>
        <span className="text-note text-ink-2">{scale}</span>
        {outcome && <span className="w-full text-note text-ink-2">{outcome}</span>}
      </figcaption>
      <div ref={boxRef} className="w-full overflow-hidden">
        <svg
          role="img"
          aria-labelledby={`${id}-words`}
          aria-busy={stale ? true : undefined}
          viewBox={`0 0 ${widthPx} ${heightPx}`}
          width={widthPx}
          height={heightPx}
          className="block h-auto max-w-full"
        >
          <title id={`${id}-words`}>{alternative}</title>
          {children}
        </svg>
      </div>
    </figure>
  );
}
