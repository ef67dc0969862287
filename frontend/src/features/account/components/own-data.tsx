import { useState } from 'react';
import { Button, buttonClass } from '../../../components/ui/button.tsx';
import { apiBase } from '../../../lib/api-client.ts';
import { useDeleteAccount } from '../api/delete-account.ts';
import { ProofForm } from './proof-form.tsx';

/** Taking one's data along, and leaving. */
export function OwnData({ onDeleted }: { onDeleted: () => void }) {
  const remove = useDeleteAccount();
  const [leaving, setLeaving] = useState(false);
  return (
    <div className="flex flex-col items-start gap-4">
      <p className="max-w-[60ch] text-ink-2">Everything kept about you, as one file; passwords and keys are left out.</p>
      <a href={`${apiBase}/me/export`} download="tiltwright-account.json" className={buttonClass()}>
        Download my data
      </a>
      {leaving ? (
        <section aria-label="Delete the account" className="flex flex-col gap-3 border-l-[3px] border-rust pl-3">
          <p className="max-w-[60ch]">
            Your boats, checks, trials and keys are deleted at once, for good. What was published from them stays in the catalog’s history,
            under an id that names nobody any more.
          </p>
          <ProofForm
            proof="password"
            kind="grave"
            action="Delete my account"
            what="delete the account"
            pending={remove.isPending}
            error={remove.error}
            onProof={(password) => remove.mutate(password, { onSuccess: onDeleted })}
          />
          <Button onClick={() => setLeaving(false)} className="self-start">
            Keep it
          </Button>
        </section>
      ) : (
        <Button kind="grave" onClick={() => setLeaving(true)}>
          Delete my account
        </Button>
      )}
    </div>
  );
}
