import { Button } from '../../../components/ui/button.tsx';
import { ChoiceRow } from '../../../components/ui/select.tsx';
import { formatQuantity } from '../../../lib/format-units.ts';
import { paths } from '../../../lib/paths.ts';
import { useUnits } from '../../../lib/unit-choice.ts';
import { isSet, sidesWanted } from '../fit-state.ts';
import { FitNumber } from './fit-number.tsx';
import { InputSheet, MoreInputs } from './input-sheet.tsx';
import type { InputsProps } from './inputs-props.ts';
import { PartPicker } from './part-picker.tsx';

export function PlaceInputs({ state, change, neededDeg, reasons }: InputsProps) {
  const units = useUnits();
  const number = { state, change };
  const side = state.offsetMm < 0 ? 'to port' : 'to starboard';
  const tilt = state.tiltDeg === null ? 'tilt as needed' : `tilt ${formatQuantity(state.tiltDeg, 'angleDeg', units)}`;
  return (
    <InputSheet title="Place and tilt" summary={`${formatQuantity(Math.abs(state.offsetMm), 'lengthMm', units)} ${side}, ${tilt}`}>
      <FitNumber name="offsetMm" slider {...number} />
      <Button onClick={() => change({ offsetMm: -state.offsetMm })}>Move to the other side</Button>
      <FitNumber name="dropMm" {...number} />
      {(state.localBottomMm !== null || reasons.includes('local-bottom-unknown')) && <FitNumber name="localBottomMm" {...number} />}
      <ChoiceRow
        legend="Tilt"
        name="tilt"
        choices={[
          { value: 'needed', label: 'as needed' },
          { value: 'set', label: 'set by hand' },
        ]}
        value={state.tiltDeg === null ? 'needed' : 'set'}
        // Starts from the needed tilt, to half a degree, as far as the field reaches.
        onChange={(how) => change({ tiltDeg: how === 'needed' ? null : Math.round(Math.min(30, Math.max(-30, neededDeg ?? 0)) * 2) / 2 })}
      />
      {state.tiltDeg !== null && <FitNumber name="tiltDeg" slider {...number} />}
      <MoreInputs title="Standoff and board" set={isSet(state, ['standoffMm', 'boardMm'])}>
        <FitNumber name="standoffMm" placeholder="the mount’s own" {...number} />
        <FitNumber name="boardMm" {...number} />
      </MoreInputs>
    </InputSheet>
  );
}

export function SensorInputs({ state, change, names }: InputsProps) {
  const units = useUnits();
  const number = { state, change };
  const housing = `${formatQuantity(state.housingLengthMm, 'lengthMm', units)} housing`;
  return (
    <InputSheet title="Sensor and mount" summary={state.sensor === null ? housing : (names.sensor ?? 'from the catalog')}>
      <PartPicker
        kind="sensor"
        label="Transducer"
        id={state.sensor}
        name={names.sensor}
        sheet={paths.transducer}
        onChange={(sensor) => change({ sensor })}
        without="Describe it instead"
      >
        <FitNumber name="housingLengthMm" {...number} />
      </PartPicker>
      <PartPicker
        kind="mount"
        label="Mount"
        id={state.mount}
        name={names.mount}
        sheet={paths.mount}
        onChange={(mount) => change({ mount })}
        without="None"
      >
        <p>
          <span className="block font-firm">Mount</span>
          <span className="text-note text-ink-2">None chosen: the tilt cannot be given on a bracket’s scale.</span>
        </p>
      </PartPicker>
      <ChoiceRow
        legend="Side wanted"
        name="wanted"
        choices={sidesWanted.map((value) => ({ value, label: value }))}
        value={state.wanted}
        onChange={(wanted) => change({ wanted })}
      />
    </InputSheet>
  );
}
