// Plain Node, no dependency: where things lie, and the local settings that are made once.
import { randomBytes } from "node:crypto";
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import path from "node:path";
import { SetupError } from "./command.mjs";

export const ROOT = path.resolve(import.meta.dirname, "..", "..");
export const DATA = path.join(ROOT, ".data");
export const inRoot = (...parts) => path.join(ROOT, ...parts);
export const inData = (...parts) => path.join(DATA, ...parts);

const OLDEST_NODE = [20, 19];

/** Refuses an old Node in one line instead of failing somewhere inside a package. */
export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split(".").map(Number);
  if (major > OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor >= OLDEST_NODE[1])) return;
  throw new SetupError(`Node ${OLDEST_NODE.join(".")} or newer is needed; this is ${process.versions.node}`);
}

/** Makes `.data`. Others may pass through it (PostgreSQL runs as its own user), but each secret in it is 0600. */
export function makeDataFolder() {
  mkdirSync(DATA, { recursive: true, mode: 0o755 });
}

/** Settings in `.env` count where the environment has none. */
export function readDotEnv() {
  if (existsSync(inRoot(".env"))) process.loadEnvFile(inRoot(".env"));
}

/** Writes a whole file or none of it: beside, then renamed. */
export function writeWhole(file, text, mode = 0o644) {
  const fresh = `${file}.${process.pid}.new`;
  writeFileSync(fresh, text, { mode });
  renameSync(fresh, file);
}

/** The signing secret of this checkout: made once, readable by its owner alone. */
export function localSecret() {
  const file = inData("secrets.json");
  if (existsSync(file)) {
    try {
      const { nextAuthSecret } = JSON.parse(readFileSync(file, "utf8"));
      if (typeof nextAuthSecret === "string" && nextAuthSecret.length >= 32) return nextAuthSecret;
    } catch (error) {
      if (!(error instanceof SyntaxError)) throw error;
    }
  }
  const nextAuthSecret = randomBytes(32).toString("base64url");
  writeWhole(file, `${JSON.stringify({ nextAuthSecret })}\n`, 0o600);
  return nextAuthSecret;
}
