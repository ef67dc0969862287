import { planingTrim } from '@tiltwright/shared/engine/trim/savitsky.ts';
import { degToRad, gravityMps2, radToDeg } from '@tiltwright/shared/engine/units.ts';
import { checkTruth, numberIn } from '../support/truth-table.ts';

checkTruth('savitsky', 12, (row) => {
  const n = (column: string) => numberIn(row, column);
  const deadriseRad = degToRad(n('deadrise_deg'));
  const chineBeamM = n('beam_m');
  // Where friction has no arm, the centre of gravity is put at the height friction acts at.
  const vcgM = row.friction_arm === 'no' ? (chineBeamM / 4) * Math.tan(deadriseRad) : n('vcg_m');
  const hull = { massKg: n('weight_n') / gravityMps2, lcgM: n('lcg_m'), vcgM, chineBeamM, deadriseRad };
  const thrust = { armM: n('thrust_arm_m'), inclinationRad: degToRad(n('thrust_deg')) };
  const viscosityM2s = n('density_kgm3') > 1010 ? 1.19e-6 : 1.14e-6;
  const state = planingTrim(hull, thrust, n('speed_mps'), { densityKgM3: n('density_kgm3'), viscosityM2s });
  if (!state) throw new Error('no balance');
  switch (row.quantity) {
    case 'trim':
      return radToDeg(state.trimRad);
    case 'drag':
      return state.dragN;
    case 'lambda':
      return state.wettedLengthRatio;
    default:
      throw new Error(`unknown quantity ${row.quantity}`);
  }
});
