import { useParams } from 'react-router';
import { PartSheet } from '../../features/parts/components/part-sheet.tsx';
import { formatQuantity } from '../../lib/format-units.ts';
import { useUnits } from '../../lib/unit-choice.ts';

export default function LowerUnit() {
  const { id = '' } = useParams();
  const units = useUnits();
  return (
    <PartSheet
      table="lower-units"
      id={id}
      kind="motor"
      about={({ drive, powerHp, shaftLengthMm }) =>
        [
          drive,
          formatQuantity(powerHp, 'powerHp', units),
          shaftLengthMm === undefined ? null : `shaft ${formatQuantity(shaftLengthMm, 'lengthMm', units)}`,
        ]
          .filter(Boolean)
          .join(' · ')
      }
    />
  );
}
