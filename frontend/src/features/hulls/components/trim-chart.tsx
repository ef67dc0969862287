import type { TrimPoint } from '@tiltwright/shared/schemas/trim-point.ts';
import { useId } from 'react';
import { useMeasuredWidth } from '../../../drawings/use-measured-width.ts';
import { formatNumber, formatQuantity, formatShort, toShown, unitWord } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { axisTicks } from '../axis-ticks.ts';
import type { CurvePlace } from '../trim-curve.ts';

interface TrimChartProps {
  points: readonly TrimPoint[];
  /** Rising speeds; may be empty. */
  curve: readonly CurvePlace[];
}

const margin = { left: 44, right: 12, top: 28, bottom: 44 };
const heightPx = 300;

/** Running trim over speed: what was measured, and the line the engine draws through it with one standard deviation to either side. */
export function TrimChart({ points, curve }: TrimChartProps) {
  const units = useUnits();
  const id = useId();
  const [box, widthPx] = useMeasuredWidth<HTMLDivElement>(640);
  const topKn = Math.max(10, ...points.map((p) => p.speedKn), ...curve.map((p) => p.speedKn));
  const angles = [
    ...points.flatMap((p) => [p.trimDeg - (p.sigmaDeg ?? 0), p.trimDeg + (p.sigmaDeg ?? 0)]),
    ...curve.flatMap((p) => [p.valueDeg - p.sigmaDeg, p.valueDeg + p.sigmaDeg]),
  ];
  const low = Math.floor(Math.min(0, ...angles));
  const high = Math.ceil(Math.max(4, ...angles));
  const x = (speedKn: number) => margin.left + (speedKn / topKn) * (widthPx - margin.left - margin.right);
  const y = (deg: number) => heightPx - margin.bottom - ((deg - low) / (high - low)) * (heightPx - margin.top - margin.bottom);
  const speeds = axisTicks(0, toShown(topKn, 'speedKn', units), widthPx < 420 ? 5 : 9);
  const knPerUnit = 1 / toShown(1, 'speedKn', units);

  return (
    <div ref={box}>
      <svg width={widthPx} height={heightPx} role="img" aria-labelledby={`${id}-title`} className="block max-w-full bg-sheet">
        <title id={`${id}-title`}>{altText(points, curve, (kn) => formatQuantity(kn, 'speedKn', units))}</title>
        <defs>
          <pattern id={`${id}-band`} width="6" height="6" patternUnits="userSpaceOnUse">
            <circle cx="1.5" cy="1.5" r="0.9" className="fill-slate" />
          </pattern>
        </defs>
        <g className="fill-ink-2 text-[13px]">
          {axisTicks(low, high, 6).map((deg) => (
            <g key={deg}>
              <line
                x1={margin.left}
                x2={widthPx - margin.right}
                y1={y(deg)}
                y2={y(deg)}
                className={deg === 0 ? 'stroke-ink' : 'stroke-rule'}
              />
              <text x={margin.left - 8} y={y(deg) + 4} textAnchor="end">
                {formatNumber(deg, 0)}°
              </text>
            </g>
          ))}
          {speeds.map((speed) => (
            <g key={speed}>
              <line
                x1={x(speed * knPerUnit)}
                x2={x(speed * knPerUnit)}
                y1={heightPx - margin.bottom}
                y2={heightPx - margin.bottom + 5}
                className="stroke-ink"
              />
              <text x={x(speed * knPerUnit)} y={heightPx - margin.bottom + 20} textAnchor="middle">
                {formatShort(speed, 1)}
              </text>
            </g>
          ))}
          <text x={widthPx - margin.right} y={heightPx - 6} textAnchor="end">
            speed, {unitWord('speedKn', units)}
          </text>
          <text x={4} y={16}>
            running trim, bow up
          </text>
        </g>
        {curve.length > 1 && <path d={bandPath(curve, x, y)} fill={`url(#${id}-band)`} className="stroke-none" />}
        {stretches(curve).map((stretch) => (
          <path
            key={stretch[0]?.speedKn}
            d={linePath(stretch, x, y)}
            fill="none"
            className="stroke-slate"
            strokeWidth="2"
            strokeDasharray={stretch[0]?.estimated ? '8 5' : undefined}
          />
        ))}
        {points.map((point) => (
          <g key={point.id} className="stroke-ink" strokeWidth="1.5">
            {point.sigmaDeg !== undefined && (
              <line
                x1={x(point.speedKn)}
                x2={x(point.speedKn)}
                y1={y(point.trimDeg - point.sigmaDeg)}
                y2={y(point.trimDeg + point.sigmaDeg)}
              />
            )}
            <rect x={x(point.speedKn) - 4} y={y(point.trimDeg) - 4} width="8" height="8" className="fill-sheet" />
          </g>
        ))}
      </svg>
    </div>
  );
}

type Scale = (value: number) => number;

function linePath(places: readonly CurvePlace[], x: Scale, y: Scale): string {
  return places.map((p, i) => `${i === 0 ? 'M' : 'L'}${x(p.speedKn).toFixed(1)} ${y(p.valueDeg).toFixed(1)}`).join('');
}

function bandPath(places: readonly CurvePlace[], x: Scale, y: Scale): string {
  const edge = (p: CurvePlace, sign: 1 | -1) => `${x(p.speedKn).toFixed(1)} ${y(p.valueDeg + sign * p.sigmaDeg).toFixed(1)}`;
  return `M${places.map((p) => edge(p, 1)).join('L')}L${places
    .toReversed()
    .map((p) => edge(p, -1))
    .join('L')}Z`;
}

/** The curve cut where it changes between measured and estimated; neighbours share a place, so that no gap shows. */
function stretches(curve: readonly CurvePlace[]): CurvePlace[][] {
  const cut: CurvePlace[][] = [];
  for (const place of curve) {
    const last = cut.at(-1);
    const before = last?.at(-1);
    if (!last || !before) cut.push([place]);
    else if (before.estimated === place.estimated) last.push(place);
    else cut.push([{ ...before, estimated: place.estimated }, place]);
  }
  return cut;
}

function altText(points: readonly TrimPoint[], curve: readonly CurvePlace[], speed: (kn: number) => string): string {
  const top = curve.reduce<CurvePlace | null>((best, place) => (!best || place.valueDeg > best.valueDeg ? place : best), null);
  const count =
    points.length === 0 ? 'No measured points.' : points.length === 1 ? 'One measured point.' : `${points.length} measured points.`;
  if (!top) return `Running trim over speed. ${count}`;
  return `Running trim over speed. ${count} The curve is highest near ${speed(top.speedKn)} with ${formatNumber(top.valueDeg, 1)} degrees.`;
}
