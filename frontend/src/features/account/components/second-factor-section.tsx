import { type ReactNode, useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { Day } from '../../../components/ui/day.tsx';
import { Failure, Notice, Pending } from '../../../components/ui/states.tsx';
import {
  confirmSecondFactor,
  removeSecondFactor,
  renewRecoveryCodes,
  useBeginSecondFactor,
  useSecondFactor,
  useSecondFactorChange,
} from '../api/second-factor.ts';
import { ProofForm } from './proof-form.tsx';
import { RecoveryCodeList } from './recovery-code-list.tsx';

/** Signing in with a code as well: setting it up, its recovery codes, removing it. */
export function SecondFactorSection() {
  const factor = useSecondFactor();
  const [codes, setCodes] = useState<string[]>();
  if (factor.isPending) return <Pending what="Looking whether a code is needed" />;
  if (factor.isError) return <Failure error={factor.error} what="read the second factor" retry={() => void factor.refetch()} />;
  const { enabled, since, recoveryCodesLeft, demanded } = factor.data;
  return (
    <div className="flex flex-col gap-4">
      {codes && <RecoveryCodeList codes={codes} onSeen={() => setCodes(undefined)} />}
      {enabled ? (
        <>
          <p>
            Signing in asks for a code as well
            {since && (
              <>
                , since <Day iso={since} />
              </>
            )}
            . {recoveryCodesLeft === 0 ? 'No recovery code is left.' : `${recoveryCodesLeft} recovery codes are left.`}
          </p>
          <Renew onCodes={setCodes} />
          <Remove demanded={demanded} />
        </>
      ) : (
        <>
          {demanded && (
            <Notice tone="care" title="This site asks it of its staff.">
              <p className="text-ink-2">Your staff work waits until it is set up.</p>
            </Notice>
          )}
          <p className="max-w-[60ch] text-ink-2">
            With a second factor, a stolen password alone opens nothing: signing in also asks for a code that an authenticator on your phone
            shows.
          </p>
          <SetUp onCodes={setCodes} />
        </>
      )}
    </div>
  );
}

function SetUp({ onCodes }: { onCodes: (codes: string[]) => void }) {
  const begin = useBeginSecondFactor();
  const confirm = useSecondFactorChange(confirmSecondFactor);
  if (!begin.data) {
    return (
      <ProofForm
        proof="password"
        action="Set it up"
        what="begin the second factor"
        pending={begin.isPending}
        error={begin.error}
        onProof={(password) => begin.mutate(password)}
      />
    );
  }
  const { secret, uri } = begin.data;
  return (
    <ol className="flex list-decimal flex-col gap-4 pl-5">
      <li>
        <p>Give this key to your authenticator.</p>
        <p className="my-2 border border-ink bg-sheet p-3 font-firm break-all">{secret.match(/.{1,4}/g)?.join(' ')}</p>
        <p className="text-ink-2">
          Type it in there, or, if the authenticator is on this very device, <a href={uri}>open it with the key filled in</a>.
        </p>
      </li>
      <li>
        <p className="mb-2">Type the code it shows.</p>
        <ProofForm
          proof="code"
          kind="main"
          action="Turn it on"
          what="turn the second factor on"
          pending={confirm.isPending}
          error={confirm.error}
          // This part goes once it is on; a callback of its own would go with it.
          onProof={(code) =>
            void confirm.mutateAsync(code.trim()).then(
              ({ codes }) => onCodes(codes),
              () => undefined,
            )
          }
        />
      </li>
    </ol>
  );
}

function Renew({ onCodes }: { onCodes: (codes: string[]) => void }) {
  const renew = useSecondFactorChange(renewRecoveryCodes);
  return (
    <Folded label="Make new recovery codes">
      <ProofForm
        proof="code"
        action="Make new ones"
        what="make new recovery codes"
        pending={renew.isPending}
        error={renew.error}
        onProof={(code) =>
          void renew.mutateAsync(code.trim()).then(
            ({ codes }) => onCodes(codes),
            () => undefined,
          )
        }
      />
    </Folded>
  );
}

function Remove({ demanded }: { demanded: boolean }) {
  const remove = useSecondFactorChange(removeSecondFactor);
  return (
    <Folded label="Remove the second factor">
      {demanded && <p className="mb-3">This site asks it of its staff: your staff work stops until you set up another.</p>}
      <ProofForm
        proof="password"
        kind="grave"
        action="Remove it"
        what="remove the second factor"
        pending={remove.isPending}
        error={remove.error}
        onProof={(password) => remove.mutate(password)}
      />
    </Folded>
  );
}

function Folded({ label, children }: { label: string; children: ReactNode }) {
  const [open, setOpen] = useState(false);
  return open ? (
    <section className="border-l-[3px] border-rule pl-3" aria-label={label}>
      {children}
    </section>
  ) : (
    <Button kind="bare" onClick={() => setOpen(true)} className="self-start">
      {label}
    </Button>
  );
}
