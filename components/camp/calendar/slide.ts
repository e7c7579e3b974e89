const SLIDE_MS = 150;

type Places = ReadonlyMap<string, DOMRect>;

const chips = (root: HTMLElement): HTMLElement[] => [
  ...root.querySelectorAll<HTMLElement>(".fc-event[data-entry]"),
];

const still = (): boolean => window.matchMedia("(prefers-reduced-motion: reduce)").matches;

/** Where every chip stands on screen now. */
export const chipPlaces = (root: HTMLElement): Places =>
  still()
    ? new Map()
    : new Map(chips(root).map((chip) => [chip.dataset.entry ?? "", chip.getBoundingClientRect()]));

/** Lets the chips of `moved` slide from where they stood; nothing moves for readers who asked for no motion. */
export function slideFrom(root: HTMLElement, before: Places, moved: ReadonlySet<string>): void {
  for (const chip of chips(root)) {
    const id = chip.dataset.entry ?? "";
    const old = moved.has(id) ? before.get(id) : undefined;
    if (!old) continue;
    const now = chip.getBoundingClientRect();
    const from = `translate(${old.left - now.left}px, ${old.top - now.top}px)`;
    chip.animate([{ transform: from }, { transform: "none" }], {
      duration: SLIDE_MS,
      easing: "ease-out",
    });
  }
}
