import type { ReactNode, Ref, SelectHTMLAttributes } from 'react';
import { controlClass, Field, type FieldProps } from './field.tsx';

interface Choice<T extends string> {
  value: T;
  label: string;
}

type SelectProps<T extends string> = Omit<FieldProps, 'children'> &
  Omit<SelectHTMLAttributes<HTMLSelectElement>, 'id' | 'className' | 'value' | 'onChange'> & {
    choices: readonly Choice<T>[];
    value?: T | '' | undefined;
    onChange?: (value: T) => void;
    /** Shown first and means "nothing chosen", e.g. "don't know". */
    none?: string;
    ref?: Ref<HTMLSelectElement>;
  };

/** The browser's own list: it works with a thumb, a keyboard and a screen reader everywhere. */
export function Select<T extends string>(props: SelectProps<T>) {
  const { label, help, where, error, optional, className, choices, none, onChange, ref, ...select } = props;
  return (
    <Field label={label} help={help} where={where} error={error} optional={optional} className={className}>
      {(control) => (
        <select {...select} {...control} ref={ref} className={controlClass} onChange={(event) => onChange?.(event.target.value as T)}>
          {none !== undefined && <option value="">{none}</option>}
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value}>
              {choice.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}

interface ChoiceRowProps<T extends string> {
  legend: ReactNode;
  choices: readonly Choice<T>[];
  value: T;
  onChange: (value: T) => void;
  name: string;
}

/** Two to five choices side by side, for what is better seen than unfolded. */
export function ChoiceRow<T extends string>({ legend, choices, value, onChange, name }: ChoiceRowProps<T>) {
  return (
    <fieldset className="flex min-w-0 flex-col gap-1">
      <legend className="float-left mb-1 w-full font-firm">{legend}</legend>
      <div className="flex flex-wrap">
        {choices.map((choice) => (
          <label
            key={choice.value}
            className="-ml-px flex min-h-11 min-w-11 flex-auto cursor-pointer items-center justify-center border border-ink bg-sheet px-3 text-center first:ml-0 has-checked:bg-ink has-checked:text-sheet has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-focus"
          >
            <input
              type="radio"
              className="sr-only"
              name={name}
              value={choice.value}
              checked={choice.value === value}
              onChange={() => onChange(choice.value)}
            />
            {choice.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
