import { useParams } from 'react-router';
import { PartSheet } from '../../features/parts/components/part-sheet.tsx';
import { formatQuantity } from '../../lib/format-units.ts';
import { useUnits } from '../../lib/unit-choice.ts';

const elementWords = { side: 'looks to the sides', down: 'looks down', cone: 'round cone' } as const;

export default function Transducer() {
  const { id = '' } = useParams();
  const units = useUnits();
  return (
    <PartSheet
      table="transducers"
      id={id}
      kind="transducer"
      about={({ kinds, housingLengthMm }) =>
        [
          ...kinds.map((kind) => elementWords[kind]),
          housingLengthMm === undefined ? null : `housing ${formatQuantity(housingLengthMm, 'lengthMm', units)} long`,
        ]
          .filter(Boolean)
          .join(' · ')
      }
    />
  );
}
