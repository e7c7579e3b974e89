"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import { classNames } from "@/components/ui/class-names";
import type { NavItem } from "./nav";

interface NavLinksProps {
  readonly items: readonly NavItem[];
  /** In the bar, or under one another in the phone's menu. */
  readonly place: "bar" | "menu";
}

/** The page shell outlives a navigation, so an open menu is closed by the link that was pressed. */
const closeMenu = (link: HTMLElement): void => link.closest<HTMLElement>("[popover]")?.hidePopover();

/** Links with the present page marked, for the page itself and for everything below it. */
export function NavLinks({ items, place }: NavLinksProps) {
  const path = usePathname();
  return items.map(({ href, label }) => {
    const here = path === href || path.startsWith(`${href}/`);
    return (
      <Link
        key={href}
        href={href}
        aria-current={here ? (path === href ? "page" : "true") : undefined}
        onClick={(event) => closeMenu(event.currentTarget)}
        className={classNames(
          place === "bar" ? "border-b-2 py-1" : "flex min-h-control items-center border-l-4 px-5",
          here
            ? "border-brass-bell font-semibold text-bar-text"
            : "border-transparent font-medium text-bar-quiet hover:text-bar-text",
        )}
      >
        {label}
      </Link>
    );
  });
}
