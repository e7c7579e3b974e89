import { afterEach, beforeEach } from "vitest";

// Output nobody asked for is a warning nobody reads: it fails the test that made it.
const METHODS = ["log", "info", "warn", "error", "debug", "trace"] as const;
const real = Object.fromEntries(METHODS.map((method) => [method, console[method]]));
let said: string[] = [];

beforeEach(() => {
  said = [];
  for (const method of METHODS) {
    console[method] = (...args: unknown[]) => {
      said.push(
        `console.${method}: ${args.map((arg) => (arg instanceof Error ? arg.stack : String(arg))).join(" ")}`,
      );
    };
  }
});

afterEach(() => {
  Object.assign(console, real);
  const unexpected = said;
  said = [];
  if (unexpected.length > 0) throw new Error(`Unexpected console output:\n${unexpected.join("\n")}`);
});

/** Takes what was printed so far in this test and allows it: assert on the lines given back. */
export function takeConsole(): readonly string[] {
  const taken = said;
  said = [];
  return taken;
}
