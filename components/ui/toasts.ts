export interface Toast {
  readonly id: number;
  readonly text: string;
  readonly tone: "done" | "error";
}

/** Long enough to read two lines twice; an error stays until it is closed. */
const SHOWN_MS = 8000;

let toasts: readonly Toast[] = [];
let last = 0;
const listeners = new Set<() => void>();

function set(next: readonly Toast[]): void {
  toasts = next;
  for (const listener of listeners) listener();
}

export const toastStore = {
  subscribe(listener: () => void): () => void {
    listeners.add(listener);
    return () => listeners.delete(listener);
  },
  read: (): readonly Toast[] => toasts,
};

export function closeToast(id: number): void {
  set(toasts.filter((toast) => toast.id !== id));
}

/** Says in a corner of the page, and to screen readers, that something worked or failed. */
export function showToast(text: string, tone: Toast["tone"] = "done"): void {
  const id = ++last;
  set([...toasts, { id, text, tone }]);
  if (tone === "done") setTimeout(() => closeToast(id), SHOWN_MS);
}
