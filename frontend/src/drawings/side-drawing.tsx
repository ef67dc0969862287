import { boatToWater, toBoat } from '@tiltwright/shared/engine/frames.ts';
import { bottomZM, transomXM } from '@tiltwright/shared/engine/hull.ts';
import { radToDeg } from '@tiltwright/shared/engine/units.ts';
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';
import { type BoatScene, housingCornersM } from './boat-scene.ts';
import { convexOutline } from './convex-outline.ts';
import { ScaleBar } from './dimension-line.tsx';
import { DrawingFrame } from './drawing-frame.tsx';
import { MotorOutlines } from './motor-outlines.tsx';
import { paperScale, round, scaleBarMm, svgPoints } from './paper-scale.ts';
import { solidOutline } from './solid-outline.ts';
import { useMeasuredWidth } from './use-measured-width.ts';
import { type Point2, project } from './views.ts';

interface SideDrawingProps {
  scene: BoatScene;
  /** Running trim at the speed named in the title, bow up positive. */
  trimRad: number;
  title: string;
  alternative: string;
  lengthText: (mm: number) => string;
  stale?: boolean;
  maxHeightPx?: number;
}

const margins = { leftPx: 12, rightPx: 12, topPx: 12, bottomPx: 30 };
/** How much of the hull ahead of the transom has to be seen, and of the water aft of the motor, m. The hull itself runs off the paper. */
const aheadM = 0.55;
const asideM = 0.12;
const offPaperM = 6;

/** From port, in the water frame: how the boat runs, how the sensor stands to the keel line and to the water. */
export function SideDrawing({ scene, trimRad, title, alternative, lengthText, stale = false, maxHeightPx }: SideDrawingProps) {
  const [boxRef, widthPx] = useMeasuredWidth<HTMLDivElement>(360);
  const { hull, sensor } = scene;
  const water = (pointM: Vec3) => boatToWater(pointM, trimRad);
  const onPaper = (pointM: Vec3): Point2 => project('side', water(pointM));

  const outlines = scene.solids.flatMap((solid) => solidOutline(solid, 'side', water));
  const housing = convexOutline(housingCornersM(sensor).map(onPaper));
  const top: Vec3 = [transomXM(hull, -hull.transomHeightM), 0, -hull.transomHeightM];
  const seen = [...outlines, ...housing, onPaper(top), onPaper([aheadM, 0, 0])];
  const bounds = {
    leftM: Math.min(...seen.map(([u]) => u)),
    rightM: Math.max(...seen.map(([u]) => u)) + asideM,
    topM: Math.min(...seen.map(([, v]) => v)) - 0.04,
    bottomM: Math.max(...seen.map(([, v]) => v), 0.1) + 0.05,
  };
  const scale = paperScale(bounds, margins, widthPx, maxHeightPx);
  const at = (pointM: Vec3) => scale.at(onPaper(pointM));

  const bottomZ = bottomZM(hull, sensor.offsetM);
  const leaving = [at([transomXM(hull, bottomZ), 0, bottomZ]), at([-offPaperM, 0, bottomZ])] as const;
  const hullLine = [at([offPaperM, 0, -hull.transomHeightM]), at(top), at([0, 0, 0]), at([offPaperM, 0, 0])];
  const axis = [
    at(toBoat(sensor.pose, [sensor.housingM.length, 0, 0])),
    at(toBoat(sensor.pose, [-1.6 * sensor.housingM.length, 0, 0])),
  ] as [Point2, Point2];
  const outcome = `boat ${angleWords(radToDeg(trimRad), 'bow up', 'bow down')}, sensor ${angleWords(radToDeg(sensor.tiltRad + trimRad), 'nose-up', 'nose-down')} in the water`;
  const [originX, originY] = at([0, 0, 0]);
  const barMm = scaleBarMm(scale.pxPerM, Math.min(120, widthPx / 4));

  return (
    <DrawingFrame
      title={title}
      alternative={alternative}
      outcome={outcome}
      scale={`1 : ${scale.ratio}`}
      boxRef={boxRef}
      widthPx={widthPx}
      heightPx={scale.heightPx}
      stale={stale}
    >
      <polygon
        points={svgPoints([at([offPaperM, 0, bottomZ]), ...leaving, [widthPx * 9, scale.heightPx], [-widthPx * 9, scale.heightPx]])}
        className="fill-slate-wash"
      />
      <polygon points={svgPoints(hullLine)} className="fill-sheet stroke-none" />
      <polyline points={svgPoints(hullLine)} fill="none" className="stroke-ink" strokeWidth="2" strokeLinejoin="round" />
      <line {...ends(at([offPaperM, 0, bottomZ]), leaving[0])} className="stroke-ink-2" strokeWidth="1" />
      <line {...ends(leaving[0], leaving[1])} className="stroke-slate" strokeDasharray="9 3 2 3" />
      <g className="stroke-ink-2" strokeWidth="0.75">
        <line x1="0" x2={round(originX)} y1={round(originY)} y2={round(originY)} strokeDasharray="2 3" />
        <line {...ends([originX, originY], at([-0.5, 0, 0]))} strokeDasharray="10 3 2 3" />
      </g>
      <MotorOutlines solids={scene.solids} view="side" scale={scale} move={water} />
      <polygon points={svgPoints(housing.map(scale.at))} className="fill-ink stroke-ink" strokeWidth="1" />
      <line {...ends(axis[0], axis[1])} className="stroke-rust" strokeWidth="1.25" />
      <ScaleBar x={12} y={scale.heightPx - 10} lengthPx={(barMm / 1000) * scale.pxPerM} text={lengthText(barMm)} />
    </DrawingFrame>
  );
}

function ends([x1, y1]: Point2, [x2, y2]: Point2) {
  return { x1: round(x1), y1: round(y1), x2: round(x2), y2: round(y2) };
}

/** "4.0° bow up", "level": short, because it stands at the head of the drawing. */
function angleWords(deg: number, up: string, down: string): string {
  const size = Math.abs(deg).toFixed(1);
  return Number(size) === 0 ? 'level' : `${size}° ${deg > 0 ? up : down}`;
}
