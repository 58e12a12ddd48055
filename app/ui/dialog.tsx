import { useEffect, useId, useRef, type ReactNode } from 'react';

interface Props {
  open: boolean;
  title: string;
  children: ReactNode;
  /** The buttons, the one that does it last. */
  actions: ReactNode;
  /** Esc, too. */
  onClose: () => void;
}

/** Asks once before what cannot be taken back. */
export function Dialog({ open, title, children, actions, onClose }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const element = dialog.current;
    if (open && !element?.open) element?.showModal();
    if (!open && element?.open) element.close();
  }, [open]);
  return (
    <dialog ref={dialog} className="dialog" aria-labelledby={titleId} onClose={onClose}>
      <h2 id={titleId} className="mb-3 text-h3">
        {title}
      </h2>
      {children}
      <div className="mt-6 flex flex-wrap justify-end gap-3">{actions}</div>
    </dialog>
  );
}
