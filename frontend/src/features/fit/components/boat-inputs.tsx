import { Select } from '../../../components/ui/select.tsx';
import { hullFormWords } from '../../../lib/form-words.ts';
import { formatQuantity } from '../../../lib/format-units.ts';
import { paths } from '../../../lib/paths.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { hullForms, isSet } from '../fit-state.ts';
import { FitNumber } from './fit-number.tsx';
import { InputSheet, MoreInputs } from './input-sheet.tsx';
import type { InputsProps } from './inputs-props.ts';
import { PartPicker } from './part-picker.tsx';

export function BoatInputs({ state, change, names }: InputsProps) {
  const units = useUnits();
  const described = `${hullFormWords(state.form)}, ${formatQuantity(state.lengthM, 'lengthM', units)}`;
  const number = { state, change };
  return (
    <InputSheet title="Boat" summary={state.hull === null ? described : (names.hull ?? 'from the catalog')}>
      <PartPicker
        kind="hull"
        label="Boat"
        id={state.hull}
        name={names.hull}
        sheet={paths.hull}
        onChange={(hull) => change({ hull })}
        without="Describe it instead"
      >
        <Select
          label="Shape of the bottom"
          choices={hullForms.map((form) => ({ value: form, label: hullFormWords(form) }))}
          value={state.form}
          onChange={(form) => change({ form })}
        />
        <FitNumber name="lengthM" {...number} />
      </PartPicker>
      <MoreInputs title="What you know of it" set={isSet(state, ['deadriseDeg', 'transomAngleDeg', 'transomHeightMm', 'loadedMassKg'])}>
        {state.hull === null && (
          <>
            <FitNumber name="deadriseDeg" {...number} />
            <FitNumber name="transomAngleDeg" {...number} />
            <FitNumber name="transomHeightMm" {...number} />
          </>
        )}
        <FitNumber name="loadedMassKg" {...number} />
      </MoreInputs>
    </InputSheet>
  );
}
