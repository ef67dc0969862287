import type { Side } from '@tiltwright/shared/engine/beams/fan.ts';
import { toBoat } from '@tiltwright/shared/engine/frames.ts';
import { useId } from 'react';
import { type BoatScene, housingCornersM } from './boat-scene.ts';
import { convexOutline } from './convex-outline.ts';
import { PaperText, ScaleBar } from './dimension-line.tsx';
import { DrawingFrame } from './drawing-frame.tsx';
import { Hatching } from './hatching.tsx';
import { MotorOutlines } from './motor-outlines.tsx';
import { paperScale, round, scaleBarMm, svgPoints } from './paper-scale.ts';
import { solidOutline } from './solid-outline.ts';
import { useMeasuredWidth } from './use-measured-width.ts';
import { type Point2, project } from './views.ts';

interface AboveDrawingProps {
  scene: BoatScene;
  alternative: string;
  lengthText: (mm: number) => string;
  stale?: boolean;
  maxHeightPx?: number;
}

const margins = { leftPx: 8, rightPx: 8, topPx: 8, bottomPx: 30 };

/** From above, bow to the top: the strips of water that the two sides look into, and what stands in them. */
export function AboveDrawing({ scene, alternative, lengthText, stale = false, maxHeightPx }: AboveDrawingProps) {
  const id = useId();
  const [boxRef, widthPx] = useMeasuredWidth<HTMLDivElement>(320);
  const { hull, sensor } = scene;
  const outlines = scene.solids.flatMap((solid) => solidOutline(solid, 'above'));
  const housing = convexOutline(housingCornersM(sensor).map((corner) => project('above', corner)));
  const halfM = Math.max(hull.chineBeamM / 2 + 0.05, ...[...outlines, ...housing].map(([u]) => Math.abs(u) + 0.1));
  const bounds = {
    leftM: -halfM,
    rightM: halfM,
    topM: Math.min(-0.2, ...housing.map(([, v]) => v)),
    bottomM: Math.max(...[...outlines, ...housing].map(([, v]) => v), 0.3) + 0.05,
  };
  const scale = paperScale(bounds, margins, widthPx, maxHeightPx);
  const sides = (['port', 'starboard'] as const).filter((side) => scene.sectors[side] !== null);
  const half = hull.chineBeamM / 2;
  const hullEdge: Point2[] = [
    [-half, bounds.topM - 1],
    [-half, 0],
    [half, 0],
    [half, bounds.topM - 1],
  ];
  const barMm = scaleBarMm(scale.pxPerM, Math.min(120, widthPx / 4));

  return (
    <DrawingFrame
      title="From above"
      alternative={alternative}
      scale={`1 : ${scale.ratio}`}
      boxRef={boxRef}
      widthPx={widthPx}
      heightPx={scale.heightPx}
      stale={stale}
    >
      <Hatching hiddenId={`${id}-hidden`} thinnedId={`${id}-thinned`} />
      <rect x="0" y="0" width={widthPx} height={scale.heightPx} className="fill-slate-wash" />
      <polygon points={svgPoints(hullEdge.map(scale.at))} className="fill-sheet stroke-ink-2" />
      <line {...across(scale.at([-half, 0]), scale.at([half, 0]))} className="stroke-ink" strokeWidth="2" />
      {sides.map((side) => (
        <Strip
          key={side}
          scene={scene}
          side={side}
          halfM={halfM + 0.2}
          at={scale.at}
          ids={{ hidden: `${id}-hidden`, thinned: `${id}-thinned` }}
          stale={stale}
        />
      ))}
      <MotorOutlines solids={scene.solids} view="above" scale={scale} />
      <polygon points={svgPoints(housing.map(scale.at))} className="fill-ink stroke-ink" />
      <PaperText x={scale.at([0, 0])[0]} y={scale.at([0, 0])[1] - 8} anchor="middle" className="fill-ink-2">
        transom
      </PaperText>
      <PaperText x={12} y={scale.heightPx - 34} className="fill-ink-2">
        port
      </PaperText>
      <PaperText x={widthPx - 12} y={scale.heightPx - 34} anchor="end" className="fill-ink-2">
        starboard
      </PaperText>
      <ScaleBar x={12} y={scale.heightPx - 10} lengthPx={(barMm / 1000) * scale.pxPerM} text={lengthText(barMm)} />
    </DrawingFrame>
  );
}

interface StripProps {
  scene: BoatScene;
  side: Side;
  halfM: number;
  at: (point: Point2) => Point2;
  ids: { hidden: string; thinned: string };
  stale: boolean;
}

/** The strip as wide as the active face. It is open up to the first part that hides or thins it, hatched or dotted from there on. */
function Strip({ scene, side, halfM, at, ids, stale }: StripProps) {
  const { sensor, solids, sectors } = scene;
  const sign = side === 'starboard' ? 1 : -1;
  const half = sensor.element.apertureM / 2;
  const [nose, tail] = [project('above', toBoat(sensor.pose, [half, 0, 0])), project('above', toBoat(sensor.pose, [-half, 0, 0]))];
  const endU = sign * halfM;
  const found = sectors[side] ?? [];
  const kind = found.some((sector) => sector.kind === 'hidden') ? 'hidden' : found.length > 0 ? 'thinned' : 'clear';
  const startU =
    kind === 'clear' ? endU : (firstInStrip(solids, sensor.pose.originM[1], sign, [nose[1], tail[1]]) ?? sensor.pose.originM[1]);
  const strip = (fromU: number, toU: number) =>
    svgPoints([at([fromU, nose[1]]), at([toU, nose[1]]), at([toU, tail[1]]), at([fromU, tail[1]])]);
  const look = kind === 'hidden' ? 'stroke-rust' : 'stroke-brass';
  return (
    <g className={stale ? 'opacity-50' : ''} data-strip={`${side} ${kind}`}>
      <polygon points={strip(sensor.offsetM, startU)} className="fill-none stroke-slate" strokeWidth="1.25" />
      {kind !== 'clear' && (
        <polygon
          points={strip(startU, endU)}
          fill={`url(#${ids[kind]})`}
          className={look}
          strokeDasharray={kind === 'thinned' ? '2 2' : undefined}
        />
      )}
    </g>
  );
}

/** Nearest edge of a solid that lies in the strip on that side of the sensor; null where none does. */
function firstInStrip(solids: BoatScene['solids'], fromU: number, sign: number, [noseV, tailV]: readonly [number, number]): number | null {
  const edges = solids.flatMap((solid) => {
    const outline = solidOutline(solid, 'above');
    const vs = outline.map(([, v]) => v);
    if (Math.min(...vs) > tailV || Math.max(...vs) < noseV) return [];
    const us = outline.map(([u]) => u);
    const near = sign > 0 ? Math.min(...us) : Math.max(...us);
    return (near - fromU) * sign > 0 ? [near] : [];
  });
  if (edges.length === 0) return null;
  return sign > 0 ? Math.min(...edges) : Math.max(...edges);
}

function across([x1, y1]: Point2, [x2, y2]: Point2) {
  return { x1: round(x1), y1: round(y1), x2: round(x2), y2: round(y2) };
}
