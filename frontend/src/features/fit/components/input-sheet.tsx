import { type ReactNode, useState } from 'react';

interface InputSheetProps {
  title: string;
  /** What stands in it now, in a few words, read while it is closed. */
  summary: string;
  children: ReactNode;
}

/** Desk width and up: the inputs lie open beside the drawing. */
const isDesk = () => typeof window.matchMedia === 'function' && window.matchMedia('(min-width: 64rem)').matches;

/** A fold of inputs: closed on a phone, so that verdict and drawing come first; open on a desk. */
export function InputSheet({ title, summary, children }: InputSheetProps) {
  const [open, setOpen] = useState(isDesk);
  return (
    <details open={open} onToggle={(event) => setOpen(event.currentTarget.open)} className="group border-b border-rule">
      <summary className="flex min-h-14 list-none items-center gap-x-4 px-4 py-2 hover:bg-slate-wash desk:px-6 [&::-webkit-details-marker]:hidden">
        <span className="flex flex-1 flex-wrap items-baseline gap-x-3">
          <span className="font-strong">{title}</span>
          <span className="text-note text-ink-2">{summary}</span>
        </span>
        <span aria-hidden="true" className="text-lead after:content-['+'] group-open:after:content-['−']" />
      </summary>
      <div className="flex flex-col gap-4 px-4 pt-1 pb-6 desk:px-6">{children}</div>
    </details>
  );
}

/** What is set more seldom, folded inside a sheet. It is open where something in it has been set. */
export function MoreInputs({ title, set, children }: { title: string; set: boolean; children: ReactNode }) {
  const [open, setOpen] = useState(set);
  return (
    <details open={open} onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="flex min-h-11 w-fit items-center underline underline-offset-4">{title}</summary>
      <div className="flex flex-col gap-4 pt-2">{children}</div>
    </details>
  );
}
