import { type BoatScene, housingCornersM } from './boat-scene.ts';
import type { PaperBounds } from './paper-scale.ts';
import { solidOutline } from './solid-outline.ts';
import { project } from './views.ts';

/** Below this width the whole beam would leave the motor a few pixels: the drawing closes in on what matters. */
const narrowPx = 520;

/** What the view from astern has to show, metres: the beam where there is room, otherwise motors and sensor with water around. */
export function asternBounds(scene: BoatScene, widthPx: number): PaperBounds {
  const outlines = scene.solids.flatMap((solid) => solidOutline(solid, 'astern'));
  const housing = housingCornersM(scene.sensor).map((corner) => project('astern', corner));
  const outermostM = Math.max(...[...outlines, ...housing].map(([u]) => Math.abs(u)), 0.2);
  const wholeM = Math.max(scene.beamM / 2 + 0.1, outermostM + 0.25);
  const closeM = Math.max(outermostM + 0.3, 0.7);
  const halfM = widthPx < narrowPx ? Math.min(wholeM, closeM) : wholeM;
  const lowestM = Math.max(...[...outlines, ...housing].map(([, v]) => v), 0.3);
  // A motor tilted clear stands above the transom: some of it is shown, not all of the height it needs.
  const risesM = -scene.hull.transomHeightM - Math.min(...outlines.map(([, v]) => v), -scene.hull.transomHeightM);
  const topM = -scene.hull.transomHeightM - Math.min(risesM, 0.15);
  return { leftM: -halfM, rightM: halfM, topM, bottomM: lowestM + 0.1 };
}
