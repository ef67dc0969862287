import { Dialog as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** One or two sentences on what this is about. */
  description: ReactNode;
  children?: ReactNode;
  /** Buttons, the main one last. */
  actions: ReactNode;
}

/** A sheet laid over the page; Escape and the ground close it, the focus returns to where it was. */
export function Dialog({ open, onOpenChange, title, description, children, actions }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-20 bg-ink/60" />
        <Radix.Content className="fixed top-1/2 left-1/2 z-20 flex max-h-[90dvh] w-[min(36rem,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2 flex-col gap-4 overflow-y-auto border border-ink bg-sheet p-4 text-ink tablet:p-6">
          <Radix.Title className="text-title">{title}</Radix.Title>
          <Radix.Description asChild>
            <div className="text-ink-2">{description}</div>
          </Radix.Description>
          {children}
          <div className="flex flex-wrap justify-end gap-3">{actions}</div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
