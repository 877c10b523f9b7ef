'use client';

import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';

import { IconButton } from '@/components/ui/button';
import { Icon } from '@/components/ui/icons';

interface Toast {
  /** What was done: "Import undone". */
  text: string;
  /** Takes it back; while it can, the toast stays longer. */
  undo?: () => void | Promise<void>;
}

type ShowToast = (toast: Toast) => void;

const ToastContext = createContext<ShowToast | null>(null);
const stayMs = 7_000;
const stayWithUndoMs = 20_000;

/** Says what was done, at the foot of the page, with the way back where there is one. */
export function useToast(): ShowToast {
  const show = useContext(ToastContext);
  if (!show) throw new Error('useToast needs the ToastProvider of the root layout');
  return show;
}

function ToastLine({ toast, onClose, onUndo }: { toast: Toast; onClose: () => void; onUndo: () => void }) {
  const [held, setHeld] = useState(false);
  const close = useRef(onClose);
  useEffect(() => {
    close.current = onClose;
  });
  // Nobody loses a toast that they are reading or about to press: pointer and focus hold it.
  useEffect(() => {
    if (held) return;
    const timer = setTimeout(() => close.current(), toast.undo ? stayWithUndoMs : stayMs);
    return () => clearTimeout(timer);
  }, [held, toast]);
  return (
    <li
      onPointerEnter={() => setHeld(true)}
      onPointerLeave={() => setHeld(false)}
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
      className="pointer-events-auto flex min-h-11 items-center gap-3 rounded-sm border border-thread-strong bg-paper py-1 pr-1 pl-4 text-[14.5px] shadow-float"
    >
      <span className="min-w-0 flex-1">{toast.text}</span>
      {toast.undo && (
        <button type="button" onClick={onUndo} className="min-h-9 px-2 font-semibold text-indigo underline decoration-1 underline-offset-[3px] hover:text-indigo-strong">
          Undo
        </button>
      )}
      <IconButton label="Dismiss" className="border-transparent bg-transparent" onClick={onClose}>
        <Icon name="close" />
      </IconButton>
    </li>
  );
}

export function ToastProvider({ children }: { children: ReactNode }) {
  const [toasts, setToasts] = useState<(Toast & { key: number })[]>([]);
  const next = useRef(0);
  const show = useCallback<ShowToast>((toast) => {
    next.current += 1;
    const key = next.current;
    setToasts((current) => [...current.slice(-2), { ...toast, key }]);
  }, []);
  const drop = useCallback((key: number) => setToasts((current) => current.filter((one) => one.key !== key)), []);
  const undo = useCallback(
    async (toast: Toast & { key: number }) => {
      drop(toast.key);
      try {
        await toast.undo?.();
      } catch (error) {
        show({ text: `It could not be undone: ${error instanceof Error ? error.message : 'please try again'}` });
      }
    },
    [drop, show],
  );
  const list = useMemo(() => toasts.map((toast) => <ToastLine key={toast.key} toast={toast} onClose={() => drop(toast.key)} onUndo={() => void undo(toast)} />), [toasts, drop, undo]);
  return (
    <ToastContext value={show}>
      {children}
      <section aria-label="Notices" aria-live="polite" className="no-print pointer-events-none fixed inset-x-0 bottom-0 z-50 grid justify-items-center p-4">
        <ul className="grid w-full max-w-[34rem] gap-2">{list}</ul>
      </section>
    </ToastContext>
  );
}
