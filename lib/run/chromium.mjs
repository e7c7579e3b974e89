// Debian's Chromium without a window: draws and scripts as the whole browser does, and starts and runs in half the time.
export const CHROMIUM = "/usr/bin/chromium-headless-shell";
export const CHROMIUM_PACKAGES = ["chromium-headless-shell", "fonts-liberation"];

/** @type {string[]} */
export const CHROMIUM_FLAGS = [
  // Chromium's sandbox refuses root, as in a container.
  ...(process.getuid?.() === 0 ? ["--no-sandbox"] : []),
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
  // Containers have little /dev/shm.
  "--disable-dev-shm-usage",
];
