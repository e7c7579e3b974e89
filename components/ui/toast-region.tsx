"use client";

import { useSyncExternalStore } from "react";
import { classNames } from "./class-names";
import { Cross } from "./icons";
import { closeToast, toastStore, type Toast } from "./toasts";

const NONE: readonly Toast[] = [];

/** Where `showToast` writes; once per page shell. */
export function ToastRegion() {
  const toasts = useSyncExternalStore(toastStore.subscribe, toastStore.read, () => NONE);
  return (
    <div
      role="status"
      aria-live="polite"
      className="pointer-events-none fixed inset-x-3 bottom-3 z-50 flex flex-col items-end gap-2 print:hidden"
    >
      {toasts.map((toast) => (
        <div
          key={toast.id}
          className={classNames(
            "on-bar pointer-events-auto flex max-w-md items-start gap-3 rounded border-l-4 bg-bar py-2.5 pr-2 pl-3.5 text-sm text-bar-text",
            toast.tone === "error" ? "border-red" : "border-brass-bell",
          )}
        >
          <p className="py-1">{toast.text}</p>
          {toast.action ? (
            <button
              type="button"
              onClick={() => {
                closeToast(toast.id);
                toast.action?.run();
              }}
              className="min-h-control-small rounded px-2 font-semibold underline underline-offset-4"
            >
              {toast.action.label}
            </button>
          ) : null}
          <button
            type="button"
            aria-label="Close this message"
            onClick={() => closeToast(toast.id)}
            className="flex min-h-control-small min-w-control-small items-center justify-center rounded"
          >
            <Cross />
          </button>
        </div>
      ))}
    </div>
  );
}
