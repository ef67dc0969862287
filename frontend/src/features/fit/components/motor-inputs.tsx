import { ChoiceRow } from '../../../components/ui/select.tsx';
import { formatQuantity } from '../../../lib/format-units.ts';
import { paths } from '../../../lib/paths.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { isSet, type MotorCount, motorCounts } from '../fit-state.ts';
import { FitNumber } from './fit-number.tsx';
import { InputSheet, MoreInputs } from './input-sheet.tsx';
import type { InputsProps } from './inputs-props.ts';
import { PartPicker } from './part-picker.tsx';

const countWords: Record<MotorCount, string> = { one: 'one', two: 'two', none: 'none' };

export function MotorInputs({ state, change, names }: InputsProps) {
  const units = useUnits();
  const number = { state, change };
  const what = state.motor === null ? formatQuantity(state.powerHp, 'powerHp', units) : (names.motor ?? 'from the catalog');
  const summary =
    state.motors === 'none'
      ? 'none'
      : `${state.motors === 'two' ? 'two × ' : ''}${what}, trim ${formatQuantity(state.motorTrimDeg, 'angleDeg', units)}`;
  return (
    <InputSheet title="Motor" summary={summary}>
      <ChoiceRow
        legend="How many, side by side"
        name="motors"
        choices={motorCounts.map((value) => ({ value, label: countWords[value] }))}
        value={state.motors}
        onChange={(motors) => change({ motors })}
      />
      {state.motors !== 'none' && (
        <>
          <FitNumber name="motorTrimDeg" slider {...number} />
          <PartPicker
            kind="motor"
            label="Lower unit"
            id={state.motor}
            name={names.motor}
            sheet={paths.lowerUnit}
            onChange={(motor) => change({ motor })}
            without="Describe it instead"
          >
            <FitNumber name="powerHp" {...number} />
          </PartPicker>
          {state.motors === 'two' && <FitNumber name="motorOffsetMm" {...number} />}
          <MoreInputs title="How it is hung and steered" set={isSet(state, ['shaftLengthMm', 'steerDeg', 'setbackMm', 'raiseMm'])}>
            {state.motor === null && <FitNumber name="shaftLengthMm" {...number} />}
            <FitNumber name="steerDeg" {...number} />
            <FitNumber name="setbackMm" {...number} />
            <FitNumber name="raiseMm" {...number} />
          </MoreInputs>
        </>
      )}
    </InputSheet>
  );
}
