import { type ReactNode, useId, useLayoutEffect, useRef } from 'react';

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

/**
 * A sheet laid over the page; Escape and the ground close it, the focus stays inside and returns to where it was.
 * The browser's own modal dialog: it needs no style of its own in the page, which the content policy would refuse.
 */
export function Dialog({ open, onOpenChange, title, description, children, actions }: DialogProps) {
  const sheet = useRef<HTMLDialogElement>(null);
  const id = useId();

  // The sheet stays in the page while it is shut: only a closing dialog that is still there gives the focus back.
  useLayoutEffect(() => {
    const dialog = sheet.current;
    if (!open || !dialog) return;
    dialog.showModal();
    return () => dialog.close();
  }, [open]);

  return (
    // biome-ignore lint/a11y/useKeyWithClickEvents: Escape does by key what a click on the ground does
    <dialog
      ref={sheet}
      aria-labelledby={`${id}-title`}
      aria-describedby={`${id}-about`}
      onCancel={(event) => {
        event.preventDefault();
        onOpenChange(false);
      }}
      onClick={(event) => {
        // A click on the ground is one on the dialog itself; one inside is on something in it.
        if (event.target === sheet.current) onOpenChange(false);
      }}
      className="m-auto w-[min(36rem,calc(100vw-2rem))] max-w-none border border-ink bg-sheet p-0 text-ink backdrop:bg-[rgb(0_0_0/0.6)]"
    >
      {open && (
        <div className="flex flex-col gap-4 p-4 tablet:p-6">
          <h2 id={`${id}-title`} className="text-title">
            {title}
          </h2>
          <div id={`${id}-about`} className="text-ink-2">
            {description}
          </div>
          {children}
          <div className="flex flex-wrap justify-end gap-3">{actions}</div>
        </div>
      )}
    </dialog>
  );
}
