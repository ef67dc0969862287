import { useEffect, useRef } from 'react';
import { Button } from '../../../components/ui/button.tsx';

/** Shown once, right after they were made. */
export function RecoveryCodeList({ codes, onSeen }: { codes: readonly string[]; onSeen: () => void }) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  return (
    <section className="flex flex-col items-start gap-3 border border-ink bg-sheet p-4">
      <h3 ref={heading} tabIndex={-1} className="focus:outline-none">
        Write these recovery codes down now
      </h3>
      <p className="max-w-[60ch] text-ink-2">
        Each signs you in once if the authenticator is lost. They are not shown again; keep them where the phone is not.
      </p>
      <ul className="grid w-full grid-cols-1 gap-x-6 gap-y-1 tablet:grid-cols-2">
        {codes.map((code) => (
          <li key={code} className="font-firm">
            {code}
          </li>
        ))}
      </ul>
      <Button onClick={onSeen}>I have written them down</Button>
    </section>
  );
}
