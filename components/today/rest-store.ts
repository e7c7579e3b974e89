import { readRest, startRest, stretchRest, type Rest } from "@/lib/offline/rest";

// In the browser's own storage, by its end: a page that slept or was loaded again reads how much is left.
const KEY = "bellward-rest";

const listeners = new Set<() => void>();
let text: string | null = null;
let rest: Rest | null = null;

function stored(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    // Storage is refused: the timer lives as long as the page.
    return text;
  }
}

function write(next: Rest | null): void {
  rest = next;
  text = next && JSON.stringify(next);
  try {
    if (text === null) localStorage.removeItem(KEY);
    else localStorage.setItem(KEY, text);
  } catch {
    // As above.
  }
  for (const listener of listeners) listener();
}

/** The one rest that runs on this phone. */
export const restStore = {
  subscribe(listener: () => void): () => void {
    listeners.add(listener);
    window.addEventListener("storage", listener);
    return () => {
      listeners.delete(listener);
      window.removeEventListener("storage", listener);
    };
  },
  read(): Rest | null {
    const now = stored();
    if (now !== text) {
      text = now;
      rest = readRest(now);
    }
    return rest;
  },
  start: (seconds: number, next: string): void => write(startRest(Date.now(), seconds, next)),
  stretch: (seconds: number): void => {
    const running = restStore.read();
    if (running) write(stretchRest(running, seconds, Date.now()));
  },
  /** Its end was told. */
  told: (): void => {
    const running = restStore.read();
    if (running && !running.told) write({ ...running, told: true });
  },
  stop: (): void => write(null),
};
