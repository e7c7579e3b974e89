"use client";

import { Dialog as Radix } from "radix-ui";
import type { ReactNode } from "react";
import { classNames } from "./class-names";
import { Cross } from "./icons";

interface DialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: ReactNode;
  /** One or two sentences under the title. */
  readonly description?: ReactNode;
  readonly children: ReactNode;
  readonly width?: "narrow" | "wide";
}

/** A window over the page: holds focus, closes on Escape, gives focus back. On a phone it stands at the bottom edge. */
export function Dialog({ open, onOpenChange, title, description, children, width = "narrow" }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-[rgb(8_11_14/0.6)]" />
        <Radix.Content
          {...(description ? {} : { "aria-describedby": undefined })}
          className={classNames(
            "fixed z-50 flex max-h-[92dvh] flex-col border border-line bg-paper text-ink",
            "inset-x-0 bottom-0 rounded-md sm:inset-x-auto sm:top-1/2 sm:bottom-auto sm:left-1/2 sm:-translate-x-1/2 sm:-translate-y-1/2",
            width === "wide" ? "sm:w-[min(92vw,820px)]" : "sm:w-[min(92vw,480px)]",
          )}
        >
          <header className="flex items-start gap-4 border-b border-line px-5 py-4">
            <div className="min-w-0 flex-1">
              <Radix.Title className="text-xl font-semibold">{title}</Radix.Title>
              {description ? (
                <Radix.Description className="mt-1 text-sm text-ink-2">{description}</Radix.Description>
              ) : null}
            </div>
            <Radix.Close
              aria-label="Close"
              className="-mr-2 flex min-h-control-small min-w-control-small items-center justify-center rounded hover:bg-line-soft"
            >
              <Cross />
            </Radix.Close>
          </header>
          <div className="overflow-y-auto px-5 py-4">{children}</div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

/** The row of buttons that ends a dialog or a form: the act first, the way out after it. */
export function Actions({
  children,
  className,
}: {
  readonly children: ReactNode;
  readonly className?: string;
}) {
  return <div className={classNames("mt-5 flex flex-wrap gap-2", className)}>{children}</div>;
}
