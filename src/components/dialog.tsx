import { useEffect, useId, useRef, type ReactNode } from 'react';
import { useT } from '../lib/messages/use-t.ts';
import { IconButton } from './button.tsx';

interface DialogProps {
  open: boolean;
  onClose: () => void;
  title: string;
  children: ReactNode;
}

/** The browser's own dialog: holds the focus, closes on Escape, and gives the focus back. */
export function Dialog({ open, onClose, title, children }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const t = useT();
  const id = useId();
  useEffect(() => {
    if (open && !dialog.current?.open) dialog.current?.showModal();
    if (!open && dialog.current?.open) dialog.current.close();
  }, [open]);
  return (
    <dialog ref={dialog} aria-labelledby={id} onClose={onClose} className="m-auto w-[min(36rem,calc(100%-2rem))] rounded-xl bg-paper-raised p-6 text-ink backdrop:bg-night/60">
      <div className="mb-4 flex items-center justify-between gap-4">
        <h2 id={id}>{title}</h2>
        <IconButton icon="close" label={t('close')} className="-my-2 -mr-2" onClick={onClose} />
      </div>
      {open && children}
    </dialog>
  );
}
