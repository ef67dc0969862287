import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { Link, type LinkProps } from 'react-router';

export type ButtonKind = 'main' | 'plain' | 'grave' | 'bare';

const shape =
  'inline-flex min-h-11 min-w-11 items-center justify-center gap-2 text-center font-firm no-underline disabled:cursor-not-allowed';
const looks: Record<ButtonKind, string> = {
  /** The one thing this page is for. */
  main: 'px-4 border border-ink bg-ink text-sheet hover:bg-slate hover:border-slate disabled:border-ink-2 disabled:bg-ink-2',
  plain: 'px-4 border border-ink bg-sheet text-ink hover:bg-slate-wash disabled:border-rule disabled:text-ink-2',
  /** What cannot be taken back. */
  grave: 'px-4 border border-rust bg-sheet text-rust hover:bg-rust-wash disabled:border-rule disabled:text-ink-2',
  bare: 'px-2 text-ink underline decoration-1 underline-offset-4 hover:decoration-2 disabled:text-ink-2',
};

export function buttonClass(kind: ButtonKind = 'plain', extra = ''): string {
  return `${shape} ${looks[kind]} ${extra}`;
}

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  kind?: ButtonKind;
  /** Words to show while the thing it started is under way; the button is held meanwhile. */
  busy?: string | false | undefined;
  children: ReactNode;
}

export function Button({ kind = 'plain', busy, className = '', type = 'button', children, disabled, ...rest }: ButtonProps) {
  return (
    <button
      type={type}
      className={buttonClass(kind, className)}
      disabled={disabled || Boolean(busy)}
      aria-busy={busy ? true : undefined}
      {...rest}
    >
      {busy || children}
    </button>
  );
}

/** A link that stands where a button would: it leads somewhere and changes nothing. */
export function ButtonLink({ kind = 'plain', className = '', ...rest }: LinkProps & { kind?: ButtonKind; className?: string }) {
  return <Link className={buttonClass(kind, className)} {...rest} />;
}
