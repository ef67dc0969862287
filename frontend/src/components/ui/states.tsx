import type { ReactNode } from 'react';
import { useLocation } from 'react-router';
import { paths } from '../../lib/paths.ts';
import { problemIssues, problemKind } from '../../lib/problem.ts';
import { Button, ButtonLink } from './button.tsx';

/** Something is on its way. Said to a screen reader, and only shown after a moment so that fast answers do not flicker. */
export function Pending({ what }: { what: string }) {
  return (
    <p role="status" className="late py-4 text-ink-2">
      {what} …
    </p>
  );
}

/** Nothing is there, and that is all right: says what would be here and how it comes to be. */
export function Empty({ title, children }: { title: string; children?: ReactNode }) {
  return (
    <div className="border-y border-rule py-6">
      <p className="font-firm">{title}</p>
      {children && <div className="mt-1 text-ink-2">{children}</div>}
    </div>
  );
}

interface NoticeProps {
  tone?: 'plain' | 'care' | 'wrong';
  title?: ReactNode;
  children?: ReactNode;
  role?: 'alert' | 'status';
}
const tones = { plain: 'border-ink', care: 'border-brass', wrong: 'border-rust' };

/** A remark set off by a line at its left. */
export function Notice({ tone = 'plain', title, children, role }: NoticeProps) {
  return (
    <div role={role} className={`border-l-[3px] ${tones[tone]} py-1 pl-3`}>
      {title && <p className="font-firm">{title}</p>}
      {children}
    </div>
  );
}

interface FailureProps {
  error: unknown;
  /** What was asked for, as the end of "could not …": "read this hull's sheet". */
  what: string;
  retry?: (() => void) | undefined;
}

/** An error a person can act on. What was typed elsewhere on the page stays as it is. */
export function Failure({ error, what, retry }: FailureProps) {
  const kind = problemKind(error);
  const again = retry && <Button onClick={retry}>Try again</Button>;
  switch (kind) {
    case 'offline':
      return (
        <Failed title="No connection." action={again}>
          The server did not answer, so we could not {what}. What you have entered is still here.
        </Failed>
      );
    case 'sign-in':
      return <SignInNeeded what={what} />;
    case 'not-allowed':
      return <NoPermission>{messageOf(error)}</NoPermission>;
    case 'not-found':
      return (
        <Failed title="Nothing is kept under this address." action={<ButtonLink to={paths.home}>Look for a boat</ButtonLink>}>
          It may have been withdrawn, or the link may have lost a part on its way.
        </Failed>
      );
    case 'busy':
      return (
        <Failed title="Too many questions at once." action={again}>
          Wait a minute, then try again. Everyone gets a fair share of the server.
        </Failed>
      );
    case 'other':
      return (
        <Failed title={`We could not ${what}.`} action={again}>
          {messageOf(error)}
          <IssueList error={error} />
        </Failed>
      );
    default:
      return kind satisfies never;
  }
}

function Failed({ title, children, action }: { title: string; children: ReactNode; action?: ReactNode }) {
  return (
    <div className="flex flex-col items-start gap-3 py-2">
      <Notice tone="wrong" role="alert" title={title}>
        <div className="text-ink-2">{children}</div>
      </Notice>
      {action}
    </div>
  );
}

function IssueList({ error }: { error: unknown }) {
  const issues = problemIssues(error);
  if (issues.length === 0) return null;
  return (
    <ul className="mt-2 list-disc pl-5">
      {issues.slice(0, 8).map((issue) => (
        <li key={`${issue.path} ${issue.code}`}>
          {issue.path.replace(/^\//, '').replaceAll('/', ', ')}: {issue.message}
        </li>
      ))}
    </ul>
  );
}

function messageOf(error: unknown): string {
  return error instanceof Error ? error.message : 'The reason is not known.';
}

export function SignInNeeded({ what }: { what: string }) {
  const { pathname, search } = useLocation();
  return (
    <div className="flex flex-col items-start gap-3 py-2">
      <Notice title="Sign in first.">
        <p className="text-ink-2">You need an account to {what}.</p>
      </Notice>
      <ButtonLink kind="main" to={`${paths.signIn}?next=${encodeURIComponent(pathname + search)}`}>
        Sign in
      </ButtonLink>
    </div>
  );
}

export function NoPermission({ children }: { children?: ReactNode }) {
  return (
    <div className="flex flex-col items-start gap-3 py-2">
      <Notice tone="care" title="Your account may not do this.">
        <p className="text-ink-2">{children ?? 'It needs another role. Whoever runs this site can give it to you.'}</p>
      </Notice>
      <ButtonLink to={paths.home}>Back to the boats</ButtonLink>
    </div>
  );
}
