"use client";

import Link from "next/link";
import { usePathname } from "next/navigation";
import type { NavItem } from "./nav";
import { currentOf, isHere, navLook, type NavPlace } from "./nav-look";

export interface NavLinksProps {
  readonly items: readonly NavItem[];
  /** In the bar, or under one another in the phone's menu. */
  readonly place: NavPlace;
}

/** The page shell outlives a navigation, so an open menu is closed by the link that was pressed. */
const closeMenu = (link: HTMLElement): void => link.closest<HTMLElement>("[popover]")?.hidePopover();

/** Links with the present page marked, for the page itself and for everything below it. */
export function NavLinks({ items, place }: NavLinksProps) {
  const path = usePathname();
  return items.map(({ href, label }) => (
    <Link
      key={href}
      href={href}
      aria-current={currentOf(path, href)}
      onClick={(event) => closeMenu(event.currentTarget)}
      className={navLook(place, isHere(path, href))}
    >
      {label}
    </Link>
  ));
}
