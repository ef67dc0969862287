import { ChoiceRow } from '../../../components/ui/select.tsx';
import { formatQuantity } from '../../../lib/format-units.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { isSet, waterKinds } from '../fit-state.ts';
import { FitNumber } from './fit-number.tsx';
import { InputSheet, MoreInputs } from './input-sheet.tsx';
import type { InputsProps } from './inputs-props.ts';

export function SpeedInputs({ state, change }: InputsProps) {
  const units = useUnits();
  const number = { state, change };
  const cruising = state.cruiseKn === null ? '' : `, cruising ${formatQuantity(state.cruiseKn, 'speedKn', units)}`;
  return (
    <InputSheet title="Speeds and target" summary={`scanning ${formatQuantity(state.scanKn, 'speedKn', units)}${cruising}`}>
      <FitNumber name="scanKn" {...number} />
      <FitNumber name="cruiseKn" placeholder="not asked" {...number} />
      {state.cruiseKn !== null && state.motors !== 'none' && (
        <FitNumber name="cruiseMotorTrimDeg" placeholder="as while scanning" {...number} />
      )}
      <MoreInputs title="Measured angle, target, water" set={isSet(state, ['measuredTrimDeg', 'targetDeg', 'water'])}>
        <FitNumber name="measuredTrimDeg" placeholder="not measured" {...number} />
        <p className="text-note text-ink-2">
          To measure under way, have a competent person at the helm and sit low with a lifejacket on; never lean over the transom.
        </p>
        <FitNumber name="targetDeg" {...number} />
        <ChoiceRow
          legend="Water"
          name="water"
          choices={waterKinds.map((value) => ({ value, label: value }))}
          value={state.water}
          onChange={(water) => change({ water })}
        />
      </MoreInputs>
    </InputSheet>
  );
}
