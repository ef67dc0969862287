import { useId } from 'react';
import { UnitInput } from '../../../components/ui/unit-input.tsx';
import { type FitFieldName, fitFields } from '../fit-fields.ts';
import type { FitState } from '../fit-state.ts';

interface FitNumberProps {
  name: FitFieldName;
  state: FitState;
  change: (changes: Partial<FitState>) => void;
  /** What an empty field means, e.g. "don't know". */
  placeholder?: string;
  /** A slider under the number, for what is moved to and fro. */
  slider?: boolean;
}

/** One number of the check with its plus and minus, its range and its "where do I measure this?". */
export function FitNumber({ name, state, change, placeholder, slider = false }: FitNumberProps) {
  const { quantity, min, max, step, standard, label, ...rest } = fitFields[name];
  const { help, where }: { help?: string; where?: string } = rest;
  const value = state[name];
  const blank = standard === null;
  const set = (next: number | null) => change({ [name]: next ?? standard } as Partial<FitState>);
  return (
    <div className="flex flex-col gap-1">
      <UnitInput
        label={label}
        help={help}
        where={where}
        quantity={quantity}
        value={value}
        onChange={set}
        min={min}
        max={max}
        step={step}
        blank={blank}
        {...(blank && { placeholder: placeholder ?? 'don’t know' })}
        name={name}
      />
      {slider && <Slider label={label} value={value ?? standard ?? 0} min={min} max={max} step={step} onChange={set} />}
    </div>
  );
}

interface SliderProps {
  label: string;
  value: number;
  min: number;
  max: number;
  step: number;
  onChange: (value: number) => void;
}

/** The browser's own slider, so that a thumb, a mouse and the arrow keys all move it. */
function Slider({ label, value, min, max, step, onChange }: SliderProps) {
  const id = useId();
  return (
    <>
      <label htmlFor={id} className="sr-only">
        {label}, slider
      </label>
      <input
        id={id}
        type="range"
        min={min}
        max={max}
        step={step}
        value={value}
        onChange={(event) => onChange(event.target.valueAsNumber)}
        className="h-11 w-full cursor-ew-resize accent-ink"
      />
    </>
  );
}
