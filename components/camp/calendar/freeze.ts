const frames = (root: HTMLElement): HTMLElement[] => [
  ...root.querySelectorAll<HTMLElement>(".fc-daygrid-day-frame"),
];

/**
 * Keeps every row as high as it is while a pointer carries a session: FullCalendar measures its cells once, when the drag
 * begins, and rows that grew under the pointer would make it drop a row off.
 */
export function freezeRows(root: HTMLElement): void {
  const heights = frames(root).map((frame) => frame.offsetHeight);
  frames(root).forEach((frame, index) => (frame.style.height = `${heights[index] ?? 0}px`));
}

export function thawRows(root: HTMLElement): void {
  for (const frame of frames(root)) frame.style.removeProperty("height");
}
