import { createContext, use, useCallback, useEffect, useState, type ReactNode } from 'react';
import { useT } from '../lib/messages/use-t.ts';
import { Button } from './button.tsx';

interface ToastOptions {
  /** What takes the act back; offered as a button. */
  undo?: () => void;
}
type Say = (text: string, options?: ToastOptions) => void;

const ToastContext = createContext<Say>(() => undefined);
const shownMs = 7000;
/** Longer when there is something to press. */
const shownWithUndoMs = 12_000;

/** Says a short word at the edge of the page. */
export const useToast = (): Say => use(ToastContext);

export function ToastProvider({ children }: { children: ReactNode }) {
  const t = useT();
  const [toast, setToast] = useState<{ text: string; undo: (() => void) | undefined; key: number } | null>(null);
  const say = useCallback<Say>((text, options) => setToast((before) => ({ text, undo: options?.undo, key: (before?.key ?? 0) + 1 })), []);
  useEffect(() => {
    if (!toast) return undefined;
    const timer = setTimeout(() => setToast(null), toast.undo ? shownWithUndoMs : shownMs);
    return () => clearTimeout(timer);
  }, [toast]);

  return (
    <ToastContext value={say}>
      {children}
      <div role="status" aria-live="polite" className="pointer-events-none fixed inset-x-0 bottom-20 z-20 flex justify-center px-4 md:bottom-6">
        {toast && (
          <div key={toast.key} className="pointer-events-auto flex items-center gap-3 rounded-lg bg-ink py-1 pr-2 pl-4 text-paper shadow-lg">
            <span>{toast.text}</span>
            {toast.undo && (
              <Button
                variant="link"
                onClick={() => {
                  // First: what is undone may say a word of its own.
                  setToast(null);
                  toast.undo?.();
                }}
              >
                {t('undo')}
              </Button>
            )}
          </div>
        )}
      </div>
    </ToastContext>
  );
}
