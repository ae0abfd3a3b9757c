import { useEffect, useRef, type ReactNode } from 'react';

interface DialogProps {
  title: string;
  open: boolean;
  onClose: () => void;
  children: ReactNode;
  wide?: boolean;
}

/** A modal dialog on the platform's own element: focus is kept in it, Escape closes it. */
export function Dialog({ title, open, onClose, children, wide = false }: DialogProps) {
  const element = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = element.current;
    if (!dialog) return;
    if (open && !dialog.open) dialog.showModal();
    if (!open && dialog.open) dialog.close();
  }, [open]);
  return (
    <dialog
      ref={element}
      onClose={onClose}
      aria-label={title}
      className={`m-auto max-h-[88dvh] w-[calc(100vw-2rem)] overflow-auto rounded-lg border border-pencil bg-paper p-5 text-ink backdrop:bg-ink/40 ${wide ? 'max-w-4xl' : 'max-w-xl'}`}
    >
      {open && (
        <>
          <div className="mb-3 flex items-baseline justify-between gap-4 border-b border-ink pb-2">
            <h2 className="text-xl">{title}</h2>
            <button type="button" onClick={onClose} className="text-sm text-accent-ink hover:underline">
              Close
            </button>
          </div>
          {children}
        </>
      )}
    </dialog>
  );
}
