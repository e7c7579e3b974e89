import path from "node:path";

/** @type {import('next').NextConfig} */
const config = {
  reactStrictMode: true,
  poweredByHeader: false,
  // Modules with native parts or their own worker files stay outside the bundle.
  serverExternalPackages: ["graphile-worker", "pg", "@node-rs/argon2", "pino", "nodemailer", "postgres"],
  // `npm run check` and `npm test` check types, tests included: a build need not do it again.
  typescript: { ignoreBuildErrors: true },
  turbopack: { root: path.resolve(import.meta.dirname) },
};
export default config;
