"use client";

import Link from "next/link";
import { DropdownMenu as Radix } from "radix-ui";
import type { ReactNode } from "react";
import { classNames } from "./class-names";

interface MenuProps {
  /** One button; it opens the menu. */
  readonly trigger: ReactNode;
  readonly children: ReactNode;
  readonly align?: "start" | "end";
}

/** A menu of acts and links under a button. */
export function Menu({ trigger, children, align = "end" }: MenuProps) {
  return (
    <Radix.Root>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          align={align}
          sideOffset={6}
          collisionPadding={8}
          className="z-50 min-w-44 rounded border border-edge bg-paper py-1 text-ink"
        >
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

const ROW =
  "min-h-control-small flex cursor-pointer items-center gap-2 px-3 py-1.5 text-sm outline-none data-highlighted:bg-line-soft data-disabled:opacity-50";

interface MenuItemProps {
  readonly onSelect: () => void;
  readonly children: ReactNode;
  readonly disabled?: boolean;
  readonly danger?: boolean;
}

export function MenuItem({ onSelect, children, disabled, danger }: MenuItemProps) {
  return (
    <Radix.Item
      onSelect={onSelect}
      disabled={disabled}
      className={classNames(ROW, danger && "text-red-text")}
    >
      {children}
    </Radix.Item>
  );
}

export function MenuLink({ href, children }: { readonly href: string; readonly children: ReactNode }) {
  return (
    <Radix.Item asChild>
      <Link href={href} className={ROW}>
        {children}
      </Link>
    </Radix.Item>
  );
}

export const MenuLine = () => <Radix.Separator className="my-1 h-px bg-line" />;

/** A line that cannot be pressed: who is signed in, what the acts below are about. */
export const MenuLabel = ({ children }: { readonly children: ReactNode }) => (
  <Radix.Label className="px-3 py-1.5 text-xs text-ink-2">{children}</Radix.Label>
);
