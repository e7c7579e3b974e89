import path from "node:path";

/** @type {import('next').NextConfig} */
const config = {
  reactStrictMode: true,
  poweredByHeader: false,
  // Modules with native parts or their own worker files stay outside the bundle.
  serverExternalPackages: ["graphile-worker", "pg", "@node-rs/argon2", "pino", "nodemailer", "postgres"],
  turbopack: { root: path.resolve(import.meta.dirname) },
};
export default config;
