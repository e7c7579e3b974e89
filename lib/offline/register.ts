import { CACHES } from "./cache-names";

/** What this page has loaded of the application itself. */
const assetsOf = (): string[] => [
  ...new Set(
    performance
      .getEntriesByType("resource")
      .map(({ name }) => name)
      .filter((name) => name.startsWith(`${location.origin}/_next/static/`)),
  ),
];

const isKept = async (url: string, cacheName: string): Promise<boolean> =>
  (await caches.match(url, { cacheName, ignoreVary: true })) !== undefined;

const missing = async (): Promise<string[]> => {
  const wanted = [
    ...assetsOf().map((url) => ({ url, cacheName: CACHES.assets })),
    { url: "/today", cacheName: CACHES.pages },
  ];
  const kept = await Promise.all(wanted.map(({ url, cacheName }) => isKept(url, cacheName)));
  return wanted.flatMap(({ url }, index) => (kept[index] ? [] : [url]));
};

/** How often, and how many times, the caches are asked whether all has arrived: 15 s in all. */
const LOOK_MS = 300;
const LOOKS = 50;

async function untilKept(): Promise<boolean> {
  for (let look = 0; look < LOOKS; look++) {
    if ((await missing()).length === 0) return true;
    await new Promise((resolve) => setTimeout(resolve, LOOK_MS));
  }
  return false;
}

/**
 * Starts the service worker and hands it what the page fetched before it took over. Resolves to true once the page opens
 * without a net; false where the browser has no workers, or none is built (development).
 */
export async function openWithoutNet(): Promise<boolean> {
  if (!("serviceWorker" in navigator) || process.env.NODE_ENV !== "production") return false;
  try {
    // Already under a worker and without a net: what is there is there.
    await navigator.serviceWorker.register("/sw.js").catch((error: unknown) => {
      if (!navigator.serviceWorker.controller) throw error;
    });
    const { active } = await navigator.serviceWorker.ready;
    const urlsToCache = await missing();
    // The worker's library knows this message.
    if (urlsToCache.length > 0) active?.postMessage({ type: "CACHE_URLS", payload: { urlsToCache } });
    return await untilKept();
  } catch {
    // Refused by the browser's settings: the page works, only not without a net.
    return false;
  }
}
