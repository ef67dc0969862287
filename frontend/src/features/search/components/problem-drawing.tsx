import { depressionDeg, hiddenByCircle, type Point, sectorPath } from '../sight-line.ts';

// A 16 ft aluminium boat with a 30 hp motor, mm from the keel at the transom, y downwards; drawn to scale.
const chine = { halfBeam: 640, rise: 90 };
const gunwale = { halfBeam: 760, rise: 560 };
const plate = { halfWidth: 95, y: 25, thickness: 9 };
const torpedo = { x: 0, y: 180, radius: 42 };
const propRadius = 130;
const skegBottom = 362;
const eye: Point = { x: 360, y: -44 };
const reach = 880;
/** The usual outer edges of a side-looking fan: a little under level to almost straight down. */
const fan = { fromDeg: 6, toDeg: 72 };

const strutTopDeg = depressionDeg(eye, { x: 0, y: plate.y });
const torpedoDeg = hiddenByCircle(eye, torpedo, torpedo.radius);

/** The whole trouble in one picture: from one place beside the motor, one side is dark. */
export function ProblemDrawing() {
  return (
    <figure className="flex flex-col gap-2">
      <svg viewBox="-860 -680 1720 1260" role="img" aria-labelledby="problem-title" className="block w-full bg-sheet">
        <title id="problem-title">
          A boat from astern. The transducer sits to starboard of the motor. To starboard its fan is open; to port the lower unit hides the
          middle of it.
        </title>
        <defs>
          <pattern id="problem-hidden" width="26" height="26" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <rect width="26" height="26" className="fill-rust-wash" />
            <line y2="26" className="stroke-rust" strokeWidth="5" />
          </pattern>
        </defs>
        <rect x="-860" y="-60" width="1720" height="640" className="fill-slate-wash" />
        <line x1="-860" x2="860" y1="-60" y2="-60" className="stroke-slate" strokeWidth="3" strokeDasharray="36 12 8 12" />
        <g strokeWidth="4">
          <path d={sectorPath(eye, reach, fan.fromDeg, fan.toDeg, 1)} className="fill-sheet stroke-slate" />
          <path d={sectorPath(eye, reach, fan.fromDeg, strutTopDeg, -1)} className="fill-sheet stroke-slate" />
          <path d={sectorPath(eye, reach, strutTopDeg, torpedoDeg.toDeg, -1)} fill="url(#problem-hidden)" className="stroke-rust" />
          <path d={sectorPath(eye, reach, torpedoDeg.toDeg, fan.toDeg, -1)} className="fill-sheet stroke-slate" />
        </g>
        <path
          d={`M${-gunwale.halfBeam} ${-gunwale.rise}L${-chine.halfBeam} ${-chine.rise}L0 0L${chine.halfBeam} ${-chine.rise}L${gunwale.halfBeam} ${-gunwale.rise}Z`}
          className="fill-sheet stroke-ink"
          strokeWidth="6"
        />
        <g className="fill-paper stroke-ink" strokeWidth="5">
          <rect x="-34" y="-560" width="68" height={560 + plate.y} />
          <rect x={-plate.halfWidth} y={plate.y} width={2 * plate.halfWidth} height={plate.thickness} />
          <rect x="-22" y={plate.y + plate.thickness} width="44" height={torpedo.y - plate.y - plate.thickness} />
          <rect x="-6" y={torpedo.y} width="12" height={skegBottom - torpedo.y} />
          <circle cx={torpedo.x} cy={torpedo.y} r={torpedo.radius} />
          <circle cx={torpedo.x} cy={torpedo.y} r={propRadius} fill="none" strokeDasharray="14 12" />
        </g>
        <rect x={eye.x - 26} y={eye.y - 36} width="52" height="36" className="fill-ink" />
        <g className="fill-ink text-[52px] max-tablet:text-[64px] [paint-order:stroke] [stroke-linejoin:round] [stroke-width:16px]">
          <text x="-800" y="-600" className="fill-ink-2 stroke-sheet">
            port
          </text>
          <text x="800" y="-600" textAnchor="end" className="fill-ink-2 stroke-sheet">
            starboard
          </text>
          <text x="-60" y="-606" textAnchor="end" className="stroke-sheet">
            motor
          </text>
          <text x={eye.x} y="-180" textAnchor="middle" className="stroke-sheet">
            sensor
          </text>
          <text x="-300" y="296" textAnchor="middle" className="stroke-rust-wash font-strong">
            hidden
          </text>
          <text x="640" y="220" textAnchor="middle" className="stroke-sheet">
            seen
          </text>
        </g>
        <line x1={eye.x} x2={eye.x} y1="-164" y2={eye.y - 46} className="stroke-ink" strokeWidth="3" />
      </svg>
      <figcaption className="text-note text-ink-2">
        From astern, to scale. A sensor beside the motor looks out to both sides, and the lower unit stands in its way to one. That wedge
        stays dark whatever is set on the screen.
      </figcaption>
    </figure>
  );
}
