import { X } from 'lucide-react';
import {
  createContext,
  useCallback,
  useContext,
  useEffect,
  useMemo,
  useRef,
  useState,
  type JSX,
  type ReactNode,
} from 'react';

import { Button, IconButton } from '#client/components/button.tsx';

export interface ToastRequest {
  message: string;
  /** A way back or onward: `Undo`. */
  action?: { label: string; onAction: () => void };
  /** Failures stay until they are closed. */
  tone?: 'plain' | 'failure';
}

interface ShownToast extends ToastRequest {
  id: number;
}

const plainMs = 5_000;
const actionMs = 12_000;

const ToastContext = createContext<((request: ToastRequest) => void) | null>(null);

function Toast({ toast, onClose }: { toast: ShownToast; onClose: () => void }): JSX.Element {
  const [isHeld, setHeld] = useState(false);
  useEffect(() => {
    if (isHeld || toast.tone === 'failure') {
      return undefined;
    }
    const timer = setTimeout(onClose, toast.action === undefined ? plainMs : actionMs);
    return () => clearTimeout(timer);
  }, [isHeld, toast, onClose]);

  return (
    <li
      onPointerEnter={() => setHeld(true)}
      onPointerLeave={() => setHeld(false)}
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
      className="animate-appear pointer-events-auto flex min-h-11 items-center gap-3 rounded-control border border-line bg-raised py-1.5 pr-1.5 pl-4 shadow-sheet"
    >
      <span className="grow">
        {toast.tone === 'failure' && <strong className="font-medium text-fails">Failed: </strong>}
        {toast.message}
      </span>
      {toast.action !== undefined && (
        <Button
          size="small"
          onClick={() => {
            toast.action?.onAction();
            onClose();
          }}
        >
          {toast.action.label}
        </Button>
      )}
      <IconButton
        label="Close this message"
        icon={<X aria-hidden className="size-4" />}
        onClick={onClose}
      />
    </li>
  );
}

/** Holds the short messages at the foot of the page. */
export function ToastProvider({ children }: { children: ReactNode }): JSX.Element {
  const [toasts, setToasts] = useState<readonly ShownToast[]>([]);
  const nextId = useRef(1);
  const show = useCallback((request: ToastRequest) => {
    const id = nextId.current++;
    setToasts((shown) => [...shown.slice(-2), { ...request, id }]);
  }, []);
  const close = useCallback((id: number) => {
    setToasts((shown) => shown.filter((toast) => toast.id !== id));
  }, []);
  const closers = useMemo(
    () => new Map(toasts.map((toast) => [toast.id, () => close(toast.id)])),
    [toasts, close],
  );
  return (
    <ToastContext value={show}>
      {children}
      <div
        role="status"
        aria-live="polite"
        className="pointer-events-none fixed inset-x-4 bottom-5 z-50 mx-auto max-w-md print:hidden"
      >
        <ul className="grid gap-2">
          {toasts.map((toast) => (
            <Toast
              key={toast.id}
              toast={toast}
              onClose={closers.get(toast.id) ?? (() => undefined)}
            />
          ))}
        </ul>
      </div>
    </ToastContext>
  );
}

/** Shows a short message at the foot of the page, with an undo where there is one. */
export function useToast(): (request: ToastRequest) => void {
  const show = useContext(ToastContext);
  if (show === null) {
    throw new Error('useToast needs a ToastProvider above it.');
  }
  return show;
}
