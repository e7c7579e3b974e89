/** The calendar is one stop of the Tab key; inside it arrows lead from session to session. */

export const sessionButtons = (root: HTMLElement): HTMLButtonElement[] => [
  ...root.querySelectorAll<HTMLButtonElement>("button[data-session]"),
];

const buttonOf = (root: HTMLElement, sessionId: string): HTMLButtonElement | undefined =>
  sessionButtons(root).find((button) => button.dataset.session === sessionId);

/** Makes one session the calendar's tab stop, the first upcoming one where the wanted one is not there. */
export function setTabStop(root: HTMLElement, wanted: string | null, fallback: string | null): void {
  const stop =
    (wanted ? buttonOf(root, wanted) : undefined) ??
    (fallback ? buttonOf(root, fallback) : undefined) ??
    sessionButtons(root)[0];
  for (const button of sessionButtons(root)) button.tabIndex = button === stop ? 0 : -1;
}

export function focusSession(root: HTMLElement, sessionId: string): void {
  buttonOf(root, sessionId)?.focus();
}

export const sessionOf = (target: EventTarget | null): string | null =>
  target instanceof Element
    ? (target.closest<HTMLElement>("button[data-session]")?.dataset.session ?? null)
    : null;
