import { transomXM } from '@tiltwright/shared/engine/hull.ts';
import { radToDeg } from '@tiltwright/shared/engine/units.ts';
import { PaperText } from '../../../drawings/dimension-line.tsx';
import { DrawingFrame } from '../../../drawings/drawing-frame.tsx';
import { paperScale, round, svgPoints } from '../../../drawings/paper-scale.ts';
import { useMeasuredWidth } from '../../../drawings/use-measured-width.ts';
import { project } from '../../../drawings/views.ts';
import { formatQuantity } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import type { HullFigure } from '../hull-figure.ts';

const margins = { leftPx: 16, rightPx: 110, topPx: 20, bottomPx: 74 };
/** How much of the hull ahead of the transom is drawn, as a share of the transom's height. */
const lengthShare = 1.6;

/** The transom from the side, bow to the left, to scale: its lean and its height. */
export function TransomProfile({ figure: { shape } }: { figure: HullFigure }) {
  const units = useUnits();
  const [boxRef, widthPx] = useMeasuredWidth<HTMLDivElement>(480);
  const topM = shape.transomHeightM;
  const leanM = -transomXM(shape, -topM);
  const bounds = { leftM: -lengthShare * topM, rightM: leanM, topM: -topM, bottomM: 0 };
  const scale = paperScale(bounds, margins, widthPx, 340);
  const paper = (x: number, z: number) => scale.at(project('side', [x, 0, z]));
  const keel = paper(0, 0);
  const top = paper(-leanM, -topM);
  const bow = paper(lengthShare * topM, 0);
  const angle = formatQuantity(radToDeg(shape.transomAngleRad), 'angleDeg', units);
  const height = formatQuantity(topM * 1000, 'lengthMm', units);
  const dimX = Math.max(top[0], keel[0]) + 24;
  return (
    <DrawingFrame
      title="From the side"
      alternative={`The transom leans aft by ${angle}; it is ${height} high from the keel to where the motor clamps.`}
      scale={`1 : ${scale.ratio}`}
      boxRef={boxRef}
      widthPx={widthPx}
      heightPx={scale.heightPx}
    >
      <polyline
        points={svgPoints([[bow[0], top[1]], top, keel, bow])}
        className="fill-paper stroke-ink"
        strokeWidth="2"
        strokeLinejoin="round"
      />
      {/* Square to the keel line: the angle is measured from here. */}
      <line x1={round(keel[0])} x2={round(keel[0])} y1={round(keel[1])} y2={round(top[1])} className="stroke-ink-2" strokeDasharray="4 4" />
      <PaperText x={keel[0] - 8} y={top[1] + 24} anchor="end" strong>
        {`leans ${angle}`}
      </PaperText>
      <g className="stroke-ink" strokeWidth="1">
        <line x1={round(dimX)} x2={round(dimX)} y1={round(keel[1])} y2={round(top[1])} />
        {[keel[1], top[1]].map((y) => (
          <path key={y} d={`M${round(dimX - 4)} ${round(y + 4)}l8 -8`} strokeWidth="1.5" />
        ))}
        <g className="stroke-ink-2" strokeWidth="0.75">
          <line x1={round(keel[0] + 4)} x2={round(dimX + 5)} y1={round(keel[1])} y2={round(keel[1])} />
          <line x1={round(top[0] + 4)} x2={round(dimX + 5)} y1={round(top[1])} y2={round(top[1])} />
        </g>
      </g>
      <PaperText x={dimX + 8} y={(keel[1] + top[1]) / 2 + 4} strong>
        {height}
      </PaperText>
      <PaperText x={bow[0]} y={keel[1] + 18} className="fill-ink-2">
        keel, to the bow
      </PaperText>
    </DrawingFrame>
  );
}
