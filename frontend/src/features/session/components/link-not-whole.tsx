import { ButtonLink } from '../../../components/ui/button.tsx';
import { Notice } from '../../../components/ui/states.tsx';

interface LinkNotWholeProps {
  /** True where the server said so, false where the address holds no token at all. */
  used: boolean;
  again: { to: string; label: string };
}

/** A mail's link that opens nothing any more, and the way to a new one. */
export function LinkNotWhole({ used, again }: LinkNotWholeProps) {
  return (
    <div className="flex flex-col items-start gap-3">
      <Notice tone="wrong" role="alert" title={used ? 'This link has expired or was used.' : 'This link is not whole.'}>
        <p className="text-ink-2">
          {used ? 'Each link works once and for a limited time.' : 'Open it from the mail itself; a part may have been lost in copying.'}
        </p>
      </Notice>
      <ButtonLink to={again.to}>{again.label}</ButtonLink>
    </div>
  );
}
