import { type FormEvent, useState } from 'react';
import { Button, type ButtonKind } from '../../../components/ui/button.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { hasCode } from '../../../lib/problem.ts';

interface ProofFormProps {
  /** Asked for once more: a device left signed in must not be enough. */
  proof: 'password' | 'code';
  action: string;
  kind?: ButtonKind;
  /** As the end of "could not …". */
  what: string;
  pending: boolean;
  error: unknown;
  onProof: (proof: string) => void;
}

/** One field and one button: the password or a code, and what is done with it. */
export function ProofForm({ proof, action, kind = 'plain', what, pending, error, onProof }: ProofFormProps) {
  const [value, setValue] = useState('');
  const wrong = hasCode(error, 'wrong-credentials') || hasCode(error, 'wrong-code');
  const send = (event: FormEvent) => {
    event.preventDefault();
    if (value !== '') onProof(value);
  };
  const isCode = proof === 'code';
  return (
    <form onSubmit={send} noValidate className="flex max-w-[30rem] flex-col gap-4">
      {Boolean(error) && !wrong && <Failure error={error} what={what} />}
      <TextInput
        label={isCode ? 'Code' : 'Password'}
        help={isCode ? 'The six digits your authenticator shows now.' : undefined}
        type={isCode ? 'text' : 'password'}
        inputMode={isCode ? 'numeric' : undefined}
        autoComplete={isCode ? 'one-time-code' : 'current-password'}
        error={wrong ? (isCode ? 'The code is wrong, or was used already.' : 'This is not your password.') : undefined}
        value={value}
        onChange={(event) => setValue(event.target.value)}
      />
      <Button type="submit" kind={kind} busy={pending && `${action} …`} disabled={value === ''} className="self-start">
        {action}
      </Button>
    </form>
  );
}
