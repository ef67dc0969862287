// A small boat to time the engine with, and meshes of its solids for the comparison.
import type { Solid } from '@tiltwright/shared/engine/solids/solid.ts';
import type { HullPart, LowerUnitPart, MountPart, TransducerPart } from '@tiltwright/shared/questions/parts.ts';
import * as three from 'three';

const hull: HullPart = { form: 'shallow-v', lengthM: 4.2, deadriseDeg: 8, transomAngleDeg: 13, material: 'aluminium', strakes: [] };
const motor: LowerUnitPart = { drive: 'outboard', powerHp: 25, rotation: 'right' };
const transducer: TransducerPart = { kinds: ['side'], housingLengthMm: 220 };
const mount: MountPart = { kind: 'transom-bracket', tiltMinDeg: -20, tiltMaxDeg: 10 };
export const benchRig = { hull, motor, transducer, mount };

/** A mesh of a solid in the boat frame, as finely cut as drawings usually are. */
export function meshOf({ shape, pose }: Solid): three.BufferGeometry {
  const [a, b, c, d, e, f, g, h, i] = pose.rotation;
  const [x, y, z] = pose.originM;
  return ownMesh(shape).applyMatrix4(new three.Matrix4().set(a, b, c, x, d, e, f, y, g, h, i, z, 0, 0, 0, 1));
}

function ownMesh(shape: Solid['shape']): three.BufferGeometry {
  switch (shape.kind) {
    case 'box':
      return new three.BoxGeometry(2 * shape.halfLengthM, 2 * shape.halfWidthM, 2 * shape.halfHeightM);
    case 'capsule':
      return new three.CapsuleGeometry(shape.radiusM, 2 * shape.halfAxisM, 12, 48).rotateZ(Math.PI / 2);
    case 'elliptic-strut':
      return new three.CylinderGeometry(1, 1, 2 * shape.halfHeightM, 64)
        .rotateX(Math.PI / 2)
        .scale(shape.halfChordM, shape.halfThicknessM, 1);
    case 'prop-disc':
      return new three.CylinderGeometry(shape.radiusM, shape.radiusM, 2 * shape.halfDepthM, 64).rotateZ(Math.PI / 2);
    case 'prism':
      throw new Error('an open prism has no mesh');
    default:
      return shape satisfies never;
  }
}
