import { type KeyboardEvent, type Ref, useEffect, useRef, useState } from 'react';
import { formatQuantity, fromShown, type Quantity, toShown, unitWord } from '../../lib/format-units.ts';
import { parseQuantity } from '../../lib/parse-quantity.ts';
import { type UnitChoice, useUnits } from '../../lib/unit-choice.ts';
import { controlClass, Field, type FieldProps } from './field.tsx';

interface UnitInputProps extends Omit<FieldProps, 'children'> {
  /** Names the stored unit of value, min, max and step. */
  quantity: Quantity;
  /** Null where nothing is known. */
  value: number | null;
  onChange: (value: number | null) => void;
  min?: number;
  max?: number;
  /** With it, a minus and a plus button stand beside the number. */
  step?: number;
  /** What an empty field means, e.g. "the needed tilt". */
  placeholder?: string;
  /** False where the field may not stay empty. */
  blank?: boolean;
  name?: string;
  ref?: Ref<HTMLInputElement>;
}

/**
 * A number with its unit. Takes what the table reader takes (`16' 8"`, `50.8 cm`), keeps what was typed until the field is left,
 * and says in words what does not read or lies outside the range; the last good value stands meanwhile.
 */
export function UnitInput(props: UnitInputProps) {
  const { quantity, value, onChange, min, max, step, placeholder, blank = true, name, ref, error, ...field } = props;
  const units = useUnits();
  const [typed, setTyped] = useState<string | null>(null);
  const [wrong, setWrong] = useState<string | null>(null);

  // A value set from outside (another field, the address) or another choice of units replaces what was typed.
  const sent = useRef<number | null>(value);
  // biome-ignore lint/correctness/useExhaustiveDependencies: another choice of units asks for the number anew
  useEffect(() => {
    setWrong(null);
    if (value !== sent.current) setTyped(null);
    sent.current = value;
  }, [value, units]);
  const send = (next: number | null) => {
    sent.current = next;
    onChange(next);
  };

  const read = (text: string) => {
    const parsed = parseQuantity(text, quantity, units);
    if (!parsed.ok) return setWrong(parsed.message);
    if (parsed.value === null) {
      if (!blank) return setWrong('A number is needed here.');
      setWrong(null);
      return send(null);
    }
    const range = outOfRange(parsed.value, min, max, quantity, units);
    if (range) return setWrong(range);
    setWrong(null);
    send(parsed.value);
  };

  const move = (direction: 1 | -1) => {
    if (!step) return;
    const shownStep = roundStep(toShown(step, quantity, units), units.length === 'in' && quantity === 'lengthMm');
    const shown = toShown(value ?? 0, quantity, units);
    const next = fromShown((Math.round(shown / shownStep) + direction) * shownStep, quantity, units);
    setTyped(null);
    send(clamp(next, min, max));
  };

  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      if (!step) return;
      event.preventDefault();
      move(event.key === 'ArrowUp' ? 1 : -1);
    }
  };

  const shown = value === null ? '' : formatQuantity(value, quantity, units);
  const text = typed ?? shown;
  const said = typeof field.label === 'string' ? field.label : '';
  return (
    <Field {...field} error={wrong ?? error}>
      {(control) => (
        <div className="flex">
          {step !== undefined && (
            <StepButton
              word="−"
              label={`Less: ${said}`}
              onClick={() => move(-1)}
              disabled={value !== null && value <= (min ?? -Infinity)}
            />
          )}
          <input
            {...control}
            ref={ref}
            name={name}
            type="text"
            inputMode={quantity === 'lengthM' || min === undefined || min < 0 ? 'text' : 'decimal'}
            autoComplete="off"
            className={`${controlClass} ${step === undefined ? '' : '-mx-px text-center'}`}
            placeholder={placeholder ?? unitWord(quantity, units)}
            value={text}
            onFocus={(event) => event.target.select()}
            onChange={(event) => {
              setTyped(event.target.value);
              read(event.target.value);
            }}
            onBlur={() => {
              // What does not read stays, so that it can be mended.
              if (wrong === null) setTyped(null);
            }}
            onKeyDown={onKeyDown}
          />
          {step !== undefined && (
            <StepButton word="+" label={`More: ${said}`} onClick={() => move(1)} disabled={value !== null && value >= (max ?? Infinity)} />
          )}
        </div>
      )}
    </Field>
  );
}

function StepButton({ word, label, onClick, disabled }: { word: string; label: string; onClick: () => void; disabled: boolean }) {
  return (
    <button
      type="button"
      aria-label={label}
      onClick={onClick}
      disabled={disabled}
      className="min-h-11 w-11 flex-none border border-ink bg-sheet text-lead hover:bg-slate-wash disabled:border-rule disabled:text-ink-2"
    >
      {word}
    </button>
  );
}

function clamp(value: number, min = -Infinity, max = Infinity): number {
  return Math.min(max, Math.max(min, value));
}

/** A step of 5 mm is a quarter of an inch for those who read inches, not 0.1969; rules in inches are cut in halves. */
function roundStep(step: number, halves: boolean): number {
  if (halves) return 2 ** Math.round(Math.log2(step));
  const power = 10 ** Math.floor(Math.log10(step));
  const size = step / power;
  return (size < 1.5 ? 1 : size < 2.25 ? 2 : size < 3.5 ? 2.5 : size < 7.5 ? 5 : 10) * power;
}

function outOfRange(value: number, min: number | undefined, max: number | undefined, quantity: Quantity, units: UnitChoice): string | null {
  // A bound typed in inches may miss the stored bound by rounding.
  const slack = 1e-6 * Math.max(1, Math.abs(value));
  if (min !== undefined && value < min - slack) return `At least ${formatQuantity(min, quantity, units)}.`;
  if (max !== undefined && value > max + slack) return `At most ${formatQuantity(max, quantity, units)}.`;
  return null;
}
