import type { Side } from '@tiltwright/shared/engine/beams/fan.ts';
import { bottomZM } from '@tiltwright/shared/engine/hull.ts';
import { useId } from 'react';
import { asternBounds } from './astern-bounds.ts';
import { type BoatScene, bottomLine, fanEdgesDeg, housingCornersM } from './boat-scene.ts';
import { convexOutline } from './convex-outline.ts';
import { DimensionAcross, PaperText, ScaleBar } from './dimension-line.tsx';
import { DrawingFrame } from './drawing-frame.tsx';
import { FanOutlines, WedgeWords } from './fan-outlines.tsx';
import { fanWedges } from './fan-wedges.ts';
import { Hatching } from './hatching.tsx';
import { MotorOutlines } from './motor-outlines.tsx';
import { paperScale, round, scaleBarMm, svgPoints } from './paper-scale.ts';
import { solidOutline } from './solid-outline.ts';
import { useDrag } from './use-drag.ts';
import { useMeasuredWidth } from './use-measured-width.ts';
import { type Point2, project } from './views.ts';
import { WedgeKey } from './wedge-key.tsx';
import { boxAround, wedgeLabels } from './wedge-labels.ts';

interface AsternDrawingProps {
  scene: BoatScene;
  alternative: string;
  /** How much each side sees, in a few words. */
  outcome?: string;
  /** A length as the reader wants it, e.g. "380 mm". */
  lengthText: (mm: number) => string;
  stale?: boolean;
  maxHeightPx?: number;
  /** Called while the sensor is drawn sideways, with its new place off the centreline. */
  onMoveSensor?: ((offsetM: number) => void) | undefined;
  /** Of the drawing alone, without the key of letters that follows it. */
  className?: string;
  keyClassName?: string;
}

const margins = { leftPx: 12, rightPx: 12, topPx: 48, bottomPx: 30 };

/** The boat from astern, to scale: what each side sees and what hides it. */
export function AsternDrawing({
  scene,
  alternative,
  outcome,
  lengthText,
  stale = false,
  maxHeightPx,
  onMoveSensor,
  className = '',
  keyClassName = '',
}: AsternDrawingProps) {
  const id = useId();
  const [boxRef, widthPx] = useMeasuredWidth<HTMLDivElement>(640);
  const scale = paperScale(asternBounds(scene, widthPx), margins, widthPx, maxHeightPx);
  const { hull, sensor } = scene;
  const facePx = scale.at(project('astern', sensor.pose.originM));
  const drag = useDrag(scale, onMoveSensor && (([u]) => onMoveSensor(u)));

  // Both fans are drawn with one radius: out to the farther edge of the paper, so that they pass the motor.
  const radiusPx = Math.max(facePx[0], widthPx - facePx[0]) - 8;
  const radiusM = radiusPx / scale.pxPerM;
  const [fromDeg, toDeg] = fanEdgesDeg(sensor.element);
  const fans = (['port', 'starboard'] as const)
    .filter((side): side is Side => scene.sectors[side] !== null)
    .map((side) => ({ side, wedges: fanWedges(fromDeg, toDeg, scene.sectors[side] ?? []) }));
  const taken = scene.solids.map((solid) => boxAround(solidOutline(solid, 'astern').map(scale.at)));
  const labels = wedgeLabels(fans, facePx, radiusPx, { ...scale, taken });

  const bottom = bottomLine(hull).map(scale.at);
  const topY = scale.at([0, -hull.transomHeightM])[1];
  const housing = convexOutline(housingCornersM(sensor).map((corner) => project('astern', corner))).map(scale.at);
  const [left, right] = [bottom[0] as Point2, bottom[bottom.length - 1] as Point2];
  const halfBeamPx = (scene.beamM / 2) * scale.pxPerM;
  const keelX = scale.at([0, 0])[0];
  const barMm = scaleBarMm(scale.pxPerM, Math.min(140, widthPx / 3));

  return (
    <>
      <div className={className}>
        <DrawingFrame
          title="From astern"
          alternative={alternative}
          outcome={outcome}
          scale={`1 : ${scale.ratio}`}
          boxRef={boxRef}
          widthPx={widthPx}
          heightPx={scale.heightPx}
          stale={stale}
        >
          <Hatching hiddenId={`${id}-hidden`} thinnedId={`${id}-thinned`} />
          <clipPath id={`${id}-paper`}>
            <rect x="0" y={margins.topPx - 12} width={widthPx} height={scale.heightPx - margins.topPx + 12} />
          </clipPath>
          <g clipPath={`url(#${id}-paper)`}>
            <polygon
              points={svgPoints([[0, left[1]], ...bottom, [widthPx, right[1]], [widthPx, scale.heightPx], [0, scale.heightPx]])}
              className="fill-slate-wash"
            />
            <g className={stale ? 'opacity-50' : ''}>
              {fans.map(({ side, wedges }) => (
                <FanOutlines
                  key={side}
                  scene={scene}
                  side={side}
                  wedges={wedges}
                  radiusM={radiusM}
                  scale={scale}
                  hiddenId={`${id}-hidden`}
                  thinnedId={`${id}-thinned`}
                />
              ))}
            </g>
            <path
              d={`M0 ${round(left[1])} H${round(left[0])} M${round(right[0])} ${round(right[1])} H${widthPx}`}
              className="stroke-slate"
              strokeDasharray="9 3 2 3"
            />
            <polygon
              points={svgPoints([[keelX - halfBeamPx, topY], ...bottom, [keelX + halfBeamPx, topY]])}
              className="fill-sheet stroke-ink-2"
              strokeWidth="1"
            />
            <polyline points={svgPoints(bottom)} fill="none" className="stroke-ink" strokeWidth="2" strokeLinejoin="round" />
            <line
              x1={round(keelX)}
              x2={round(keelX)}
              y1={round(topY)}
              y2={round(scale.at([0, 0])[1])}
              className="stroke-ink-2"
              strokeDasharray="10 3 2 3"
              strokeWidth="0.75"
            />
            <MotorOutlines solids={scene.solids} view="astern" scale={scale} />
            <polygon points={svgPoints(housing)} className="fill-ink stroke-ink" strokeWidth="1" />
          </g>
          <DimensionAcross
            fromX={keelX}
            toX={facePx[0]}
            y={margins.topPx - 18}
            fromY={topY - 4}
            toY={Math.min(...housing.map(([, y]) => y)) - 3}
            text={lengthText(Math.abs(sensor.offsetM) * 1000)}
          />
          <DropFigure
            scene={scene}
            atPx={scale.at([sensor.offsetM, bottomZM(hull, sensor.offsetM)])}
            widthPx={widthPx}
            text={lengthText(Math.abs(sensor.dropM) * 1000)}
          />
          <WedgeWords labels={labels} />
          <PaperText x={12} y={18} className="fill-ink-2">
            port
          </PaperText>
          <PaperText x={widthPx - 12} y={18} anchor="end" className="fill-ink-2">
            starboard
          </PaperText>
          <ScaleBar x={12} y={scale.heightPx - 10} lengthPx={(barMm / 1000) * scale.pxPerM} text={lengthText(barMm)} />
          {onMoveSensor && (
            <circle
              cx={round(facePx[0])}
              cy={round(facePx[1])}
              r="22"
              className="cursor-ew-resize fill-transparent stroke-ink-2"
              strokeDasharray="2 4"
              {...drag}
            />
          )}
        </DrawingFrame>
      </div>
      <WedgeKey labels={labels} className={keyClassName} />
    </>
  );
}

/** The depth below the bottom is a few millimetres: too small for a dimension line at this scale, so a leader carries the figure. */
function DropFigure({ scene, atPx: [x, y], widthPx, text }: { scene: BoatScene; atPx: Point2; widthPx: number; text: string }) {
  const { dropM, offsetM } = scene.sensor;
  const outward = offsetM >= 0 ? 1 : -1;
  const roomPx = outward > 0 ? widthPx - x : x;
  const words = `${dropM >= 0 ? 'below' : 'above'} the bottom`;
  const lines = roomPx > 200 ? [`${text} ${words}`] : [text, words];
  const [bendX, bendY] = [x + outward * 24, y - 32];
  const edge = outward > 0 ? Math.min(bendX + 4, widthPx - 112) : Math.max(bendX - 4, 112);
  return (
    <g className="stroke-ink-2" strokeWidth="0.75">
      <path d={`M${round(x + outward * 6)} ${round(y - 2)} L${round(bendX)} ${round(bendY)}`} fill="none" />
      {lines.map((line, i) => (
        <PaperText key={line} x={edge} y={bendY - 6 - (lines.length - 1 - i) * 16} anchor={outward > 0 ? 'start' : 'end'}>
          {line}
        </PaperText>
      ))}
    </g>
  );
}
