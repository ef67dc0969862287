import { type AnyBasis, basisWords } from '../../lib/basis-words.ts';
import { formatEstimate, type Quantity } from '../../lib/format-units.ts';
import { useUnits } from '../../lib/unit-choice.ts';

interface EstimateProps {
  /** In the stored unit that `quantity` names. */
  value: number;
  /** One standard deviation in the same unit; null where nobody stated one. */
  sigma?: number | null;
  quantity: Quantity;
  basis?: AnyBasis;
  /** Words after the number that say where it comes from; on by default where a basis is given. */
  showBasis?: boolean;
}

/** A number with how sure it is: "4.1° ± 1.0, measured". */
export function Estimate({ value, sigma = null, quantity, basis, showBasis = true }: EstimateProps) {
  const units = useUnits();
  return (
    <span>
      <span className="font-firm whitespace-nowrap">{formatEstimate(value, sigma, quantity, units)}</span>
      {basis && showBasis && <span className="text-note text-ink-2">, {basisWords(basis)}</span>}
    </span>
  );
}
