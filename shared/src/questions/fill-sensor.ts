// A transducer and its mount with nothing missing.
import { apertureShare, usual, usualHousing, usualSideBeam, usualStandoff, usualTiltRange } from '../class-defaults.ts';
import type { Assumption } from '../schemas/answer.ts';
import { type Filled, partReader, type Quantity } from './filled.ts';
import type { MountPart, TransducerPart } from './parts.ts';

export const transducerQuantities = [
  'housingLengthMm',
  'sideDepressionDeg',
  'sideVerticalBeamDeg',
  'sideAlongBeamDeg',
  'sideApertureMm',
  'sideFrequencyKhz',
] as const;
export type FilledTransducer = Filled<(typeof transducerQuantities)[number]>;

/** Side-beam figures are only filled in where the transducer has a side element. */
export function fillTransducer(transducer: TransducerPart, assumptions: Assumption[]): FilledTransducer {
  const hasSide = transducer.kinds.includes('side');
  const read = partReader(transducer, 'transducer', hasSide ? assumptions : []);
  const why = 'Usual for side-looking elements.';
  const housing = partReader(transducer, 'transducer', assumptions);
  const housingLengthMm = housing('housingLengthMm', usualHousing.housingLengthMm, 'Usual housing.');
  return {
    housingLengthMm,
    sideDepressionDeg: read('sideDepressionDeg', usualSideBeam.sideDepressionDeg, why),
    sideVerticalBeamDeg: read('sideVerticalBeamDeg', usualSideBeam.sideVerticalBeamDeg, why),
    sideAlongBeamDeg: read('sideAlongBeamDeg', usualSideBeam.sideAlongBeamDeg, why),
    sideApertureMm: read('sideApertureMm', usual(apertureShare * housingLengthMm.value), 'Usual share of the housing.'),
    sideFrequencyKhz: read('sideFrequencyKhz', usualSideBeam.sideFrequencyKhz, why),
  };
}

/** Kinds of mount that hold the sensor on the transom; the others place the face centre itself. */
export const transomKinds = ['transom-bracket', 'kick-up-bracket', 'transom-board', 'sensor-jack'] as const;

/** Whether the leading edge is measured from the transom: a mount says so by its kind, without one a stated `forwardMm` says no. */
export function standsOnTransom(mount: MountPart | undefined, forwardMm: number | undefined): boolean {
  if (mount) return (transomKinds as readonly string[]).includes(mount.kind);
  return forwardMm === undefined;
}

/** Standoff without any board: the question's, else the mount's, else the usual one. */
export function fillStandoff(asked: number | undefined, mount: MountPart | undefined, assumptions: Assumption[]): Quantity {
  if (asked !== undefined) return { value: asked, sigma: 3, basis: 'measured' };
  return partReader(mount ?? {}, mount ? 'mount' : 'placement', assumptions)('standoffMm', usualStandoff, 'Usual for transom brackets.');
}

/** Range of the bracket's scale and where its zero stands, degrees. */
export function fillTiltScale(mount: MountPart, assumptions: Assumption[]) {
  const read = partReader(mount, 'mount', assumptions);
  const one = read('tiltMinDeg', usual(usualTiltRange.tiltMinDeg, 3), 'Usual range of brackets.').value;
  const other = read('tiltMaxDeg', usual(usualTiltRange.tiltMaxDeg, 3), 'Usual range of brackets.').value;
  return {
    minDeg: Math.min(one, other),
    maxDeg: Math.max(one, other),
    zeroDeg: read('tiltZeroDeg', usual(0, 0), 'The scale is taken to read 0 square to the transom face.').value,
  };
}
