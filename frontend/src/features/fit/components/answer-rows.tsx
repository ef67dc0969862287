import type { ReactNode } from 'react';

/** A ruled list of names and figures: the figure stands right, its remark under the name. */
export function AnswerRows({ children }: { children: ReactNode }) {
  return <dl className="flex flex-col">{children}</dl>;
}

interface AnswerRowProps {
  name: ReactNode;
  /** Where the figure comes from or what it means. */
  remark?: ReactNode;
  children: ReactNode;
}

export function AnswerRow({ name, remark, children }: AnswerRowProps) {
  return (
    <div className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-rule py-2">
      <dt>{name}</dt>
      <dd className="ml-auto text-right font-firm">{children}</dd>
      {remark && <dd className="w-full text-note text-ink-2">{remark}</dd>}
    </div>
  );
}

export function AnswerSection({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="flex flex-col gap-2">
      <h2 className="text-body">{title}</h2>
      {children}
    </section>
  );
}
