import type { Role } from '@tiltwright/shared/schemas/account.ts';
import type { Person } from '@tiltwright/shared/schemas/desk.ts';
import { useState } from 'react';
import { Link } from 'react-router';
import { Button } from '../../../components/ui/button.tsx';
import { Day } from '../../../components/ui/day.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { RoleBoxes } from '../../../components/ui/role-boxes.tsx';
import { Failure, Notice } from '../../../components/ui/states.tsx';
import { formatMoment } from '../../../lib/format-date.ts';
import { paths } from '../../../lib/paths.ts';
import { type PersonOrder, useChangePerson, usePersonSessions } from '../api/people.ts';

type Grave = 'disable' | 'end-sessions' | 'remove-factor';
const graveWords: Record<Grave, { title: string; about: string; action: string }> = {
  disable: {
    title: 'Disable this account?',
    about: 'The person is signed out at once and their API keys stop. Nothing is deleted, and you can enable it again.',
    action: 'Disable',
  },
  'end-sessions': {
    title: 'Sign this person out everywhere?',
    about: 'Every device has to sign in again. The password stays as it is.',
    action: 'Sign out everywhere',
  },
  'remove-factor': {
    title: 'Remove the second factor?',
    about:
      'Make sure by another way that it is really the person who asks: from then on the password alone signs in. They are told by mail.',
    action: 'Remove it',
  },
};

/** One account: its roles, where it is signed in, and what an admin may do to it. */
export function PersonSheet({ person }: { person: Person }) {
  const change = useChangePerson(person.id);
  const [asked, setAsked] = useState<Grave>();
  const [roles, setRoles] = useState<Role[]>(person.roles);
  const order = (given: PersonOrder) => change.mutate(given, { onSuccess: () => setAsked(undefined) });
  const changed = [...roles].sort().join() !== [...person.roles].sort().join();
  return (
    <div className="flex max-w-[48rem] flex-col gap-6">
      {person.disabledAt && (
        <Notice tone="care" title="This account is disabled.">
          <p className="text-ink-2">
            Since <Day iso={person.disabledAt} />.
          </p>
        </Notice>
      )}
      <p className="text-ink-2">
        <span className="break-all">{person.email}</span>, since <Day iso={person.createdAt} />,{' '}
        {person.secondFactor ? 'with a second factor' : 'without a second factor'}.{' '}
        <Link to={paths.auditBy(person.id)} className="inline-flex min-h-6 items-center">
          What this account did
        </Link>
      </p>
      {change.isError && !asked && <Failure error={change.error} what="change the account" />}
      <form
        className="flex flex-col items-start gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          order({ kind: 'roles', roles });
        }}
      >
        <RoleBoxes value={roles} onChange={setRoles} error={roles.length === 0 ? 'At least one role.' : undefined} />
        <Button type="submit" disabled={!changed || roles.length === 0} busy={change.isPending && !asked && 'Changing …'}>
          Change the roles
        </Button>
      </form>
      <Sessions id={person.id} />
      <div className="flex flex-wrap gap-3">
        {person.sessions > 0 && <Button onClick={() => setAsked('end-sessions')}>Sign out everywhere</Button>}
        {person.secondFactor && <Button onClick={() => setAsked('remove-factor')}>Remove the second factor</Button>}
        {person.disabledAt ? (
          <Button onClick={() => order({ kind: 'enable' })}>Enable the account</Button>
        ) : (
          <Button kind="grave" onClick={() => setAsked('disable')}>
            Disable the account
          </Button>
        )}
      </div>
      <Dialog
        open={asked !== undefined}
        onOpenChange={() => setAsked(undefined)}
        title={asked ? graveWords[asked].title : ''}
        description={asked ? graveWords[asked].about : ''}
        actions={
          <>
            <Button onClick={() => setAsked(undefined)}>Leave it as it is</Button>
            {asked && (
              <Button kind="grave" onClick={() => order({ kind: asked })} busy={change.isPending && 'At work …'}>
                {graveWords[asked].action}
              </Button>
            )}
          </>
        }
      >
        {change.isError && <Failure error={change.error} what="do that" />}
      </Dialog>
    </div>
  );
}

function Sessions({ id }: { id: string }) {
  const sessions = usePersonSessions(id);
  if (!sessions.data) return null;
  const { data } = sessions.data;
  return (
    <section>
      <h2 className="mb-2 border-b border-ink pb-2 text-title">Signed in</h2>
      {data.length === 0 ? (
        <p className="text-ink-2">Nowhere.</p>
      ) : (
        <ul>
          {data.map((session) => (
            <li key={session.id} className="border-b border-rule py-2">
              {session.startedAt ? `since ${formatMoment(session.startedAt)}` : 'a device'}, ends by itself <Day iso={session.expiresAt} />
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
