// The drawing from astern in sentences, for who cannot see it.
import type { BoatScene } from '../../drawings/boat-scene.ts';
import type { FanSector } from '../../drawings/fan-wedges.ts';
import { degreeRange } from '../../drawings/wedge-labels.ts';
import type { FitState } from './fit-state.ts';

export function sceneWords(state: Pick<FitState, 'motors' | 'offsetMm'>, { sectors }: Pick<BoatScene, 'sectors'>): string {
  const motors = { one: 'one motor', two: 'two motors', none: 'no motor' }[state.motors];
  const side = state.offsetMm < 0 ? 'port' : 'starboard';
  const where = state.offsetMm === 0 ? 'on the centreline' : `${Math.abs(Math.round(state.offsetMm))} mm to ${side}`;
  const seen = (['port', 'starboard'] as const).flatMap((name) => {
    const found = sectors[name];
    return found === null
      ? []
      : [`${name === 'port' ? 'Port' : 'Starboard'}: ${found.length === 0 ? 'clear' : found.map(sectorWords).join('; ')}.`];
  });
  return [`The boat from astern, to scale, with ${motors} and the sensor ${where}.`, ...seen].join(' ');
}

function sectorWords({ fromDeg, toDeg, kind, by }: FanSector): string {
  return `${kind} by the ${by}, ${degreeRange(fromDeg, toDeg)} below level`;
}
