import type { Side } from '@tiltwright/shared/engine/beams/fan.ts';
import { type BoatScene, wedgeOutline } from './boat-scene.ts';
import { PaperText } from './dimension-line.tsx';
import type { FanWedge } from './fan-wedges.ts';
import { type PaperScale, svgPoints } from './paper-scale.ts';
import type { WedgeLabel } from './wedge-labels.ts';

interface FanOutlinesProps {
  scene: BoatScene;
  side: Side;
  wedges: readonly FanWedge[];
  radiusM: number;
  scale: PaperScale;
  hiddenId: string;
  thinnedId: string;
}

/** One side's fan from astern: clear wedges open, thinned ones dotted, hidden ones hatched. */
export function FanOutlines({ scene, side, wedges, radiusM, scale, hiddenId, thinnedId }: FanOutlinesProps) {
  const looks = {
    clear: { className: 'fill-none stroke-slate', strokeWidth: 1.25 },
    thinned: { className: 'stroke-brass', fill: `url(#${thinnedId})`, strokeWidth: 1, strokeDasharray: '2 2' },
    hidden: { className: 'stroke-rust', fill: `url(#${hiddenId})`, strokeWidth: 1.25 },
  } as const;
  return wedges.map((wedge) => (
    <polygon
      key={`${wedge.kind} ${wedge.fromDeg}`}
      points={svgPoints(wedgeOutline(scene.sensor, side, wedge.fromDeg, wedge.toDeg, radiusM).map(scale.at))}
      strokeLinejoin="round"
      data-wedge={`${side} ${wedge.kind}`}
      {...looks[wedge.kind]}
    />
  ));
}

/** Words, or a letter, in the wedges that have room. */
export function WedgeWords({ labels }: { labels: readonly WedgeLabel[] }) {
  return labels.map(({ side, wedge, atPx, lines }) => {
    if (!atPx) return null;
    const [x, y] = atPx;
    return (
      <g key={`${side} ${wedge.fromDeg}`}>
        {lines.map((line, i) => (
          <PaperText
            key={line}
            x={x}
            y={y + 5 + (i - (lines.length - 1) / 2) * 16}
            anchor="middle"
            strong={lines.length === 1 || i === 0}
            className={wedge.kind === 'clear' ? 'fill-slate' : 'fill-ink'}
          >
            {line}
          </PaperText>
        ))}
      </g>
    );
  });
}
