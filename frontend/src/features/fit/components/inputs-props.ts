import type { FitPartName, FitState } from '../fit-state.ts';

/** What every group of inputs is given. */
export interface InputsProps {
  state: FitState;
  change: (changes: Partial<FitState>) => void;
  /** Names of the parts chosen from the catalog. */
  names: Readonly<Partial<Record<FitPartName, string>>>;
  /** The tilt of the last answer, to start from when it is set by hand. */
  neededDeg: number | null;
  /** Codes of the last answer's reasons: an input that would settle one of them is shown unfolded. */
  reasons: readonly string[];
}
