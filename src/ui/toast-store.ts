export interface Toast {
  id: number;
  text: string;
  kind: "info" | "stop";
  undo?: () => unknown;
}

type Listener = () => void;

let toasts: readonly Toast[] = [];
let lastId = 0;
const listeners = new Set<Listener>();

function set(next: readonly Toast[]): void {
  toasts = next;
  for (const listener of listeners) listener();
}

/** Long enough to read and reach; what can be undone stays longer. */
const shownForMs = (toast: Toast) => (toast.undo ? 12_000 : 6_000);

/** Says briefly what has happened. `undo` adds a button that takes it back. */
export function showToast(text: string, options: { kind?: Toast["kind"]; undo?: () => unknown } = {}): void {
  const toast: Toast = { id: ++lastId, text, kind: "info", ...options };
  set([...toasts.slice(-2), toast]);
  setTimeout(() => dismissToast(toast.id), shownForMs(toast));
}

export function dismissToast(id: number): void {
  if (toasts.some((toast) => toast.id === id)) set(toasts.filter((toast) => toast.id !== id));
}

export const toastStore = {
  read: () => toasts,
  subscribe(listener: Listener) {
    listeners.add(listener);
    return () => listeners.delete(listener);
  },
};
