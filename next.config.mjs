import path from "node:path";

/** The same on every answer; what depends on the request (content policy, transport) is proxy.ts's. */
const HEADERS = [
  { key: "X-Content-Type-Options", value: "nosniff" },
  { key: "X-Frame-Options", value: "DENY" },
  // Addresses hold camp ids and single-use secrets: other sites learn none of them.
  { key: "Referrer-Policy", value: "same-origin" },
  { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
  {
    key: "Permissions-Policy",
    value: "camera=(), microphone=(), geolocation=(), payment=(), usb=(), browsing-topics=()",
  },
];

/** The service worker fetches from this site only; a phone must not sit on an old one. */
const WORKER_HEADERS = [
  { key: "Cache-Control", value: "no-cache" },
  { key: "Content-Security-Policy", value: "default-src 'self'; script-src 'self'; connect-src 'self'" },
];

/** @type {import('next').NextConfig} */
const config = {
  reactStrictMode: true,
  poweredByHeader: false,
  headers: () =>
    Promise.resolve([
      { source: "/:path*", headers: HEADERS },
      { source: "/sw.js", headers: WORKER_HEADERS },
    ]),
  // Modules with native parts or their own worker files stay outside the bundle.
  serverExternalPackages: [
    "graphile-worker",
    "pg",
    "@node-rs/argon2",
    "pino",
    "nodemailer",
    "postgres",
    "rate-limiter-flexible",
  ],
  // `npm run check` and `npm test` check types, tests included: a build need not do it again.
  typescript: { ignoreBuildErrors: true },
  turbopack: { root: path.resolve(import.meta.dirname) },
};
export default config;
