// The stern of the same boat, seen from starboard: mm from the keel at the transom, bow to the right, y downwards; to scale.
/** Usual for a small planing boat at speed. */
const trimDeg = 4;
const radius = 700;
const transomAngleDeg = 13;
const transomHeight = 420;
const lean = transomHeight * Math.tan((transomAngleDeg * Math.PI) / 180);
const sensor = { length: 220, height: 38, standoff: 25, below: 5 };
const keelEnd = { x: radius * Math.cos((trimDeg * Math.PI) / 180), y: -radius * Math.sin((trimDeg * Math.PI) / 180) };

/** The other half of the trouble: the bow lifts under way, and the sensor with it. */
export function TiltDrawing() {
  return (
    <figure className="flex flex-col gap-2">
      <svg viewBox="-640 -410 1560 810" role="img" aria-labelledby="tilt-title" className="block w-full bg-sheet">
        <title id="tilt-title">
          The stern from the side at speed: the bow has risen by {trimDeg} degrees, so the sensor is set {trimDeg} degrees nose-down and
          stands level in the water.
        </title>
        <rect x="-640" y="-36" width="1560" height="440" className="fill-slate-wash" />
        <line x1="-640" x2="920" y1="-36" y2="-36" className="stroke-slate" strokeWidth="3" strokeDasharray="36 12 8 12" />
        <g transform={`rotate(${-trimDeg})`}>
          <g className="fill-paper stroke-ink" strokeWidth="5">
            <rect x="-370" y="-640" width="270" height="280" />
            <rect x="-310" y="-360" width="110" height="385" />
            <rect x="-420" y="25" width="290" height="9" />
            <path d="M-302 34H-196L-212 140H-300Z" />
            <path d="M-250 218H-372L-350 362H-290Z" />
            <rect x="-420" y="138" width="390" height="84" rx="42" />
            <rect x="-462" y="50" width="44" height="260" fill="none" strokeDasharray="14 12" />
          </g>
          <path d={`M0 0H1100V-560H${-lean}V${-transomHeight}Z`} className="fill-sheet stroke-ink" strokeWidth="6" />
        </g>
        <line x1="0" x2="820" className="stroke-ink-2" strokeWidth="3" strokeDasharray="12 10" />
        <path
          d={`M${radius} 0A${radius} ${radius} 0 0 0 ${keelEnd.x.toFixed(1)} ${keelEnd.y.toFixed(1)}`}
          fill="none"
          className="stroke-rust"
          strokeWidth="8"
        />
        <rect
          x={-sensor.standoff - sensor.length}
          y={sensor.below - sensor.height}
          width={sensor.length}
          height={sensor.height}
          rx="6"
          className="fill-ink stroke-sheet"
          strokeWidth="5"
        />
        <path d="M-60 14L40 130" className="stroke-ink" strokeWidth="3" />
        <g className="fill-ink text-[52px] max-tablet:text-[60px]">
          <text x="880" y="80" textAnchor="end">
            bow up {trimDeg}°
          </text>
          <text x="50" y="180">
            sensor set nose-down {trimDeg}°:
          </text>
          <text x="50" y="250">
            level in the water
          </text>
        </g>
      </svg>
      <figcaption className="text-note text-ink-2">
        From starboard, at speed. The bow lifts and the sensor with it, so it has to be set the other way by as much, before any hole is
        drilled.
      </figcaption>
    </figure>
  );
}
