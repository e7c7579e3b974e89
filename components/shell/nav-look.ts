import { classNames } from "@/components/ui/class-names";

export type NavPlace = "bar" | "menu";

/** `here`: the page itself or something below it. */
export const navLook = (place: NavPlace, here: boolean): string =>
  classNames(
    place === "bar" ? "border-b-2 py-1" : "flex min-h-control items-center border-l-4 px-5",
    here
      ? "border-brass-bell font-semibold text-bar-text"
      : "border-transparent font-medium text-bar-quiet hover:text-bar-text",
  );

export const isHere = (path: string, href: string): boolean => path === href || path.startsWith(`${href}/`);

export const currentOf = (path: string, href: string): "page" | "true" | undefined =>
  path === href ? "page" : isHere(path, href) ? "true" : undefined;
