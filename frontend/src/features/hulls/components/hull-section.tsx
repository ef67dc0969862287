import { bottomZM } from '@tiltwright/shared/engine/hull.ts';
import { radToDeg } from '@tiltwright/shared/engine/units.ts';
import { bottomLine } from '../../../drawings/boat-scene.ts';
import { DimensionAcross, PaperText, ScaleBar } from '../../../drawings/dimension-line.tsx';
import { DrawingFrame } from '../../../drawings/drawing-frame.tsx';
import { paperScale, round, scaleBarMm, svgPoints } from '../../../drawings/paper-scale.ts';
import { useMeasuredWidth } from '../../../drawings/use-measured-width.ts';
import type { Point2 } from '../../../drawings/views.ts';
import { formatQuantity } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import type { HullFigure } from '../hull-figure.ts';

const margins = { leftPx: 16, rightPx: 16, topPx: 20, bottomPx: 74 };

/** The hull's section at the transom, from astern, to scale. */
export function HullSection({ figure }: { figure: HullFigure }) {
  const units = useUnits();
  const [boxRef, widthPx] = useMeasuredWidth<HTMLDivElement>(480);
  const { shape, beamM, strakes } = figure;
  const halfM = Math.max(beamM, shape.chineBeamM) / 2;
  const scale = paperScale({ leftM: -halfM, rightM: halfM, topM: -shape.transomHeightM, bottomM: 0 }, margins, widthPx, 340);
  const bottom = bottomLine(shape).map(scale.at);
  const [left, right] = [bottom[0] as Point2, bottom.at(-1) as Point2];
  const keel = scale.at([0, 0]);
  const topY = scale.at([0, -shape.transomHeightM])[1];
  const deadrise = formatQuantity(radToDeg(shape.deadriseRad), 'angleDeg', units);
  const chine = formatQuantity(shape.chineBeamM, 'lengthM', units);
  const barMm = scaleBarMm(scale.pxPerM, Math.min(140, widthPx / 3));
  const halfPx = halfM * scale.pxPerM;
  return (
    <DrawingFrame
      title="From astern"
      alternative={`Section at the transom: deadrise ${deadrise}, chine beam ${chine}${strakeWords(strakes.length)}.`}
      scale={`1 : ${scale.ratio}`}
      boxRef={boxRef}
      widthPx={widthPx}
      heightPx={scale.heightPx}
    >
      <polygon
        points={svgPoints([[keel[0] - halfPx, topY], ...bottom, [keel[0] + halfPx, topY]])}
        className="fill-paper stroke-ink-2"
        strokeWidth="1"
      />
      <polyline points={svgPoints(bottom)} fill="none" className="stroke-ink" strokeWidth="2" strokeLinejoin="round" />
      <line
        x1={round(keel[0])}
        x2={round(keel[0])}
        y1={round(topY)}
        y2={round(keel[1])}
        className="stroke-ink-2"
        strokeDasharray="10 3 2 3"
        strokeWidth="0.75"
      />
      {strakes.flatMap(({ offsetM, endsM }) =>
        [-offsetM, offsetM].map((y) => {
          const [u, v] = scale.at([y, bottomZM(shape, y)]);
          // A strake that ends ahead of the transom is only outlined there.
          return (
            <path key={y} d={`M${round(u - 4)} ${round(v)}h8l-4 7z`} className={`stroke-ink ${endsM === 0 ? 'fill-ink' : 'fill-sheet'}`} />
          );
        }),
      )}
      <line
        x1={round(keel[0])}
        x2={round(right[0])}
        y1={round(keel[1])}
        y2={round(keel[1])}
        className="stroke-ink-2"
        strokeDasharray="4 4"
      />
      <PaperText x={right[0]} y={keel[1] + 18} anchor="end" strong>
        {`deadrise ${deadrise}`}
      </PaperText>
      <DimensionAcross fromX={left[0]} toX={right[0]} y={keel[1] + 46} fromY={left[1] + 4} toY={right[1] + 4} text={chine} />
      <ScaleBar x={16} y={scale.heightPx - 10} lengthPx={(barMm / 1000) * scale.pxPerM} text={`${barMm} mm`} />
    </DrawingFrame>
  );
}

function strakeWords(count: number): string {
  return count === 0 ? '' : `, ${count === 1 ? 'one strake' : `${count} strakes`} a side`;
}
