import { useEffect, useId, useRef, type ReactNode } from "react";
import { CloseIcon } from "./icons.tsx";

interface Props {
  title: string;
  onClose: () => void;
  children: ReactNode;
}

/**
 * Something short that covers the screen until it is done: at the bottom of a phone, in the middle
 * of a wide screen. The browser's own dialog keeps the focus inside; it starts at the first field. Mount it to open it.
 */
export function Sheet({ title, onClose, children }: Props) {
  const dialog = useRef<HTMLDialogElement>(null);
  const id = useId();
  useEffect(() => {
    const element = dialog.current;
    element?.showModal();
    element?.querySelector<HTMLElement>("input, textarea, select")?.focus();
    return () => element?.close();
  }, []);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={id}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      className="m-0 mt-auto max-h-[92dvh] w-full max-w-none overflow-y-auto rounded-t-card border-t border-rule bg-paper p-4 pb-[max(1rem,env(safe-area-inset-bottom))] text-ink sm:m-auto sm:max-w-md sm:rounded-card sm:border"
    >
      <div className="mb-3 flex items-start justify-between gap-2">
        <h2 id={id} className="pt-2 text-2xl">
          {title}
        </h2>
        <button
          type="button"
          aria-label="Close"
          onClick={onClose}
          className="-mt-1 -mr-2 flex min-h-target min-w-target shrink-0 items-center justify-center rounded-card"
        >
          <CloseIcon />
        </button>
      </div>
      {children}
    </dialog>
  );
}
