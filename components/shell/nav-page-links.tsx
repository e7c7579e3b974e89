"use client";

import { usePathname } from "next/navigation";
import { PageLink } from "@/components/ui/page-link";
import type { NavLinksProps } from "./nav-links";
import { currentOf, isHere, navLook } from "./nav-look";

/** The same for a page that leads on by whole pages. */
export function NavPageLinks({ items, place }: NavLinksProps) {
  const path = usePathname();
  return items.map(({ href, label }) => (
    <PageLink
      key={href}
      href={href}
      aria-current={currentOf(path, href)}
      className={navLook(place, isHere(path, href))}
    >
      {label}
    </PageLink>
  ));
}
