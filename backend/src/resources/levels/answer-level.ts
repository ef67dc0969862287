import { cautionCodes, coded } from '@tiltwright/shared/engine/codes.ts';
import { euroCoins, runningAngle, shimForAngle, stacksFor, usCoins } from '@tiltwright/shared/engine/level.ts';
import { degToRad, mmToM, mToMm, radToDeg } from '@tiltwright/shared/engine/units.ts';
import { engineVersion } from '@tiltwright/shared/engine/version.ts';
import { rounded } from '@tiltwright/shared/questions/reply.ts';
import type { LevelQuestion, LevelReply } from '@tiltwright/shared/schemas/level.ts';
import { ApiProblem } from '../../errors.ts';

const coins = { none: [], us: usCoins, euro: euroCoins };
/** Higher than this, a stack does not stand on a moving boat. */
const highestStackMm = 120;

/** @throws ApiProblem invalid-input where the stack would be higher than one that stands */
export function answerLevel({ ref, readings, stackFor }: LevelQuestion): LevelReply {
  return {
    ...(ref !== undefined && { ref }),
    ...rounded({ angle: readings ? angleOf(readings) : null, stack: stackFor ? stackOf(stackFor) : null }),
    cautions: [coded(cautionCodes, 'measuring-under-way')],
    engineVersion,
  };
}

function angleOf({ runs, trailerReadingDeg, bothDirections }: NonNullable<LevelQuestion['readings']>) {
  const measured = runs.map(({ shimMm, contactLengthMm }) => ({ shimM: mmToM(shimMm), contactLengthM: mmToM(contactLengthMm) }));
  const { value, sigma, flags } = runningAngle(measured, degToRad(trailerReadingDeg), bothDirections);
  return { valueDeg: radToDeg(value), sigmaDeg: radToDeg(sigma), flags: [...flags] };
}

function stackOf({ angleDeg, contactLengthMm, coins: set }: NonNullable<LevelQuestion['stackFor']>): LevelReply['stack'] {
  const shimMm = Math.abs(mToMm(shimForAngle(degToRad(angleDeg), mmToM(contactLengthMm))));
  if (shimMm > highestStackMm) {
    const message = `${Math.round(shimMm)} mm of shims do not stand under way; take a shorter level.`;
    throw new ApiProblem('invalid-input', message, [{ path: '/stackFor/contactLengthMm', code: 'stack-too-high', message }]);
  }
  const angleAt = (heightMm: number) => radToDeg(Math.asin(heightMm / contactLengthMm));
  const stacks = stacksFor(shimMm, coins[set]).map((stack) => ({ ...stack, errorDeg: angleAt(stack.heightMm) - Math.abs(angleDeg) }));
  return { shimMm, under: angleDeg < 0 ? 'forward' : 'aft', stacks };
}
