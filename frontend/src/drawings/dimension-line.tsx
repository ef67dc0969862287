import { round } from './paper-scale.ts';

interface AcrossProps {
  fromX: number;
  toX: number;
  y: number;
  /** Where the extension lines start: the height of the thing measured. */
  fromY: number;
  toY: number;
  text: string;
}

/** A dimension across the paper: slashes at its ends, extension lines to what is measured, the figure over the middle. */
export function DimensionAcross({ fromX, toX, y, fromY, toY, text }: AcrossProps) {
  const middle = (fromX + toX) / 2;
  return (
    <g className="stroke-ink" strokeWidth="1">
      <line x1={round(fromX)} x2={round(toX)} y1={round(y)} y2={round(y)} />
      <Slash x={fromX} y={y} />
      <Slash x={toX} y={y} />
      <g className="stroke-ink-2" strokeWidth="0.75">
        <line x1={round(fromX)} x2={round(fromX)} y1={round(fromY)} y2={round(y - 5)} />
        <line x1={round(toX)} x2={round(toX)} y1={round(toY)} y2={round(y - 5)} />
      </g>
      <PaperText x={middle} y={y - 6} anchor="middle" strong>
        {text}
      </PaperText>
    </g>
  );
}

/** The slash that ends a dimension line, as on a drawing board. */
function Slash({ x, y }: { x: number; y: number }) {
  return <line x1={round(x - 4)} y1={round(y + 4)} x2={round(x + 4)} y2={round(y - 4)} strokeWidth="1.5" />;
}

interface PaperTextProps {
  x: number;
  y: number;
  children: string;
  anchor?: 'start' | 'middle' | 'end';
  strong?: boolean;
  className?: string;
}

/** Text with a halo of paper, so that lines under it do not cut through the figures. */
export function PaperText({ x, y, children, anchor = 'start', strong = false, className = 'fill-ink' }: PaperTextProps) {
  return (
    <text
      x={round(x)}
      y={round(y)}
      textAnchor={anchor}
      className={`stroke-sheet text-[13px] ${strong ? 'font-firm' : ''} ${className}`}
      strokeWidth="4"
      strokeLinejoin="round"
      paintOrder="stroke"
    >
      {children}
    </text>
  );
}

/** A bar of a round length with its figure: true at any zoom, unlike a stated ratio. */
export function ScaleBar({ x, y, lengthPx, text }: { x: number; y: number; lengthPx: number; text: string }) {
  return (
    <g className="stroke-ink" strokeWidth="1.5">
      <path d={`M${round(x)} ${round(y - 5)} v5 h${round(lengthPx)} v-5`} fill="none" />
      <PaperText x={x + lengthPx + 6} y={y + 1}>
        {text}
      </PaperText>
    </g>
  );
}
