import { holdTestCluster } from "./template";

/** Vitest's global set-up: what it gives back runs after the last test. */
export default function setup(): () => Promise<void> {
  return holdTestCluster();
}
