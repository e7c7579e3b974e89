/// <reference lib="webworker" />
import { CacheFirst, ExpirationPlugin, NetworkFirst, Serwist, type SerwistPlugin } from "serwist";
import { CACHES } from "./cache-names";

// Bundled by lib/run/build.mjs into public/sw.js. What has no rule here goes to the network and nowhere else.

/** One bar of signal in a basement counts as none after so many seconds. */
const PATIENCE = 4;

/** Only an answer to the person: no redirect to the sign-in, no refusal. */
const whole: SerwistPlugin = {
  cacheWillUpdate: ({ response }) =>
    Promise.resolve(response.status === 200 && !response.redirected ? response : null),
};

/** One copy, however the address was typed. */
const oneCopy: SerwistPlugin = {
  cacheKeyWillBeUsed: ({ request }) => Promise.resolve(new URL(request.url).pathname),
};

const personal = (cacheName: string) =>
  new NetworkFirst({
    cacheName,
    networkTimeoutSeconds: PATIENCE,
    // Next varies its pages by headers that the page itself never sends for a document.
    matchOptions: { ignoreVary: true },
    plugins: [whole, oneCopy],
  });

const worker = new Serwist({
  skipWaiting: true,
  clientsClaim: true,
  runtimeCaching: [
    {
      // Names hold a hash of the content: what is there is right. Fonts lie among them.
      matcher: ({ url, sameOrigin }) => sameOrigin && url.pathname.startsWith("/_next/static/"),
      handler: new CacheFirst({
        cacheName: CACHES.assets,
        matchOptions: { ignoreVary: true },
        plugins: [whole, new ExpirationPlugin({ maxEntries: 300 })],
      }),
    },
    {
      // The document, not Next's own payload of the same address.
      matcher: ({ url, request, sameOrigin }) =>
        sameOrigin &&
        url.pathname === "/today" &&
        !url.searchParams.has("_rsc") &&
        !request.headers.has("rsc"),
      handler: personal(CACHES.pages),
    },
    {
      matcher: ({ url, sameOrigin }) => sameOrigin && url.pathname === "/api/today",
      handler: personal(CACHES.answers),
    },
  ],
});

worker.addEventListeners();
