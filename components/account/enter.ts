/** Goes on as someone else than before: with a full load, because what the browser kept of pages was made for a stranger. */
export const enter = (path: string): void => window.location.assign(path);
