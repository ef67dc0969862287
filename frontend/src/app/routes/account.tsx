import { useQueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useNavigate } from 'react-router';
import { PageTitle } from '../../components/ui/page-title.tsx';
import { Failure, Pending, SignInNeeded } from '../../components/ui/states.tsx';
import { OwnData } from '../../features/account/components/own-data.tsx';
import { PasswordForm } from '../../features/account/components/password-form.tsx';
import { ProfileForm } from '../../features/account/components/profile-form.tsx';
import { SecondFactorSection } from '../../features/account/components/second-factor-section.tsx';
import { become } from '../../features/session/api/become.ts';
import { useSession } from '../../features/session/api/get-session.ts';
import { paths } from '../../lib/paths.ts';
import { roleListWords } from '../../lib/role-words.ts';

export default function AccountPage() {
  const session = useSession();
  const client = useQueryClient();
  const navigate = useNavigate();
  const leave = () => {
    become(client, { account: null, expiresAt: null });
    void navigate(paths.home);
  };
  const account = session.data?.account;
  return (
    <div className="flex flex-col gap-8 px-4 py-8 desk:px-6">
      <PageTitle title="Your account" />
      {session.isPending ? (
        <Pending what="Looking who is signed in" />
      ) : session.isError ? (
        <Failure error={session.error} what="find out who is signed in" retry={() => void session.refetch()} />
      ) : account ? (
        <>
          <p className="text-ink-2">
            {account.email}, {roleListWords(account.roles)}. Units are chosen at the top of every page and kept with the account.
          </p>
          <Part title="Name">
            <ProfileForm name={account.name} key={account.name} />
          </Part>
          <Part title="Password">
            <PasswordForm />
          </Part>
          <Part title="Second factor">
            <SecondFactorSection />
          </Part>
          <Part title="Your data">
            <OwnData onDeleted={leave} />
          </Part>
        </>
      ) : (
        <SignInNeeded what="see it" />
      )}
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="flex flex-col gap-4">
      <h2 className="border-b border-ink pb-2 text-title">{title}</h2>
      {children}
    </section>
  );
}
