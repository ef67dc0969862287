import type { InputHTMLAttributes, Ref } from 'react';
import { controlClass, Field, type FieldProps } from './field.tsx';

type TextInputProps = Omit<FieldProps, 'children'> &
  Omit<InputHTMLAttributes<HTMLInputElement>, 'id' | 'className'> & { ref?: Ref<HTMLInputElement> };

export function TextInput({ label, help, where, error, optional, className, type = 'text', ref, ...input }: TextInputProps) {
  return (
    <Field label={label} help={help} where={where} error={error} optional={optional} className={className}>
      {(control) => <input {...input} {...control} ref={ref} type={type} className={controlClass} />}
    </Field>
  );
}
