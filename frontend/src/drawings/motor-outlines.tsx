import type { Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import type { Vec3 } from '@tiltwright/shared/engine/vec3.ts';
import { type PaperScale, svgPoints } from './paper-scale.ts';
import { solidOutline } from './solid-outline.ts';
import { depthInView, type View } from './views.ts';

interface MotorOutlinesProps {
  solids: readonly Solid[];
  view: View;
  scale: PaperScale;
  move?: (pointM: Vec3) => Vec3;
}

/** Every part of the engines, the farthest drawn first; the propeller as the dashed outline of what it sweeps. */
export function MotorOutlines({ solids, view, scale, move }: MotorOutlinesProps) {
  const farFirst = [...solids].sort((a, b) => depthInView(view, b.pose.originM) - depthInView(view, a.pose.originM));
  return (
    <g className="stroke-ink" strokeWidth="1.25" strokeLinejoin="round">
      {farFirst.map((solid) => (
        <polygon
          key={`${solid.owner.unit} ${solid.owner.part} ${solid.owner.label ?? ''}`}
          points={svgPoints(solidOutline(solid, view, move).map(scale.at))}
          className={solid.owner.part === 'propeller' ? 'fill-none' : 'fill-paper'}
          strokeDasharray={solid.owner.part === 'propeller' ? '4 3' : undefined}
          data-part={solid.owner.part}
        />
      ))}
    </g>
  );
}
