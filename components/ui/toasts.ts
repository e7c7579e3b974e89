export interface Toast {
  readonly id: number;
  readonly text: string;
  readonly tone: "done" | "error";
  /** One act that follows from what was said: "Put back". */
  readonly action?: { readonly label: string; readonly run: () => void };
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
export function showToast(
  text: string,
  { tone = "done", action }: { readonly tone?: Toast["tone"]; readonly action?: Toast["action"] } = {},
): void {
  const id = ++last;
  set([...toasts, { id, text, tone, ...(action && { action }) }]);
  // What can be acted on stays twice as long.
  if (tone === "done") setTimeout(() => closeToast(id), action ? 2 * SHOWN_MS : SHOWN_MS);
}
