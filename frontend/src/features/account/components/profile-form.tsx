import { type FormEvent, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Failure } from '../../../components/ui/states.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useChangeAccount } from '../api/change-account.ts';

/** The name as others see it. */
export function ProfileForm({ name: kept }: { name: string }) {
  const change = useChangeAccount();
  const [name, setName] = useState(kept);
  const send = (event: FormEvent) => {
    event.preventDefault();
    change.mutate({ name });
  };
  return (
    <form onSubmit={send} className="flex max-w-[30rem] flex-col gap-4">
      {change.isError && <Failure error={change.error} what="change the name" />}
      <TextInput
        label="Name"
        help="As others see it beside what you share."
        autoComplete="name"
        maxLength={80}
        value={name}
        onChange={(event) => setName(event.target.value)}
      />
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" busy={change.isPending && 'Keeping …'} disabled={name.trim() === '' || name === kept}>
          Keep the name
        </Button>
        <span role="status">{change.isSuccess && name === kept && 'Kept.'}</span>
      </div>
    </form>
  );
}
