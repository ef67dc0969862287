import { type ReactNode, useId } from 'react';

/** What a control needs to belong to its field; spread it on the input. */
interface ControlProps {
  id: string;
  'aria-describedby'?: string | undefined;
  'aria-invalid'?: true | undefined;
}

export interface FieldProps {
  label: ReactNode;
  /** One line under the label: what the value is. */
  help?: ReactNode;
  /** "Where do I measure this?", folded away until asked for. */
  where?: ReactNode;
  /** What is wrong with the value, in words. */
  error?: string | null | undefined;
  optional?: boolean;
  className?: string;
  children: (control: ControlProps) => ReactNode;
}

/** Label above, help under it, the control, its error beside it. */
export function Field({ label, help, where, error, optional, className = '', children }: FieldProps) {
  const id = useId();
  const described = [help ? `${id}-help` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ') || undefined;
  return (
    <div className={`flex flex-col gap-1 ${className}`}>
      <label htmlFor={id} className="font-firm">
        {label}
        {optional && <span className="font-normal text-ink-2"> (may stay empty)</span>}
      </label>
      {help && (
        <p id={`${id}-help`} className="text-note text-ink-2">
          {help}
        </p>
      )}
      {children({ id, 'aria-describedby': described, 'aria-invalid': error ? true : undefined })}
      {error && (
        <p id={`${id}-error`} className="border-l-[3px] border-rust pl-2 text-note text-rust">
          {error}
        </p>
      )}
      {where && <Where>{where}</Where>}
    </div>
  );
}

function Where({ children }: { children: ReactNode }) {
  return (
    <details className="text-note">
      <summary className="flex min-h-11 w-fit items-center text-ink-2 underline underline-offset-4">Where do I measure this?</summary>
      <div className="border-l border-rule pb-2 pl-3">{children}</div>
    </details>
  );
}

export const controlClass =
  'min-h-11 w-full min-w-0 border border-ink bg-sheet px-3 text-ink placeholder:text-ink-2 aria-invalid:border-2 aria-invalid:border-rust disabled:border-rule disabled:text-ink-2';
