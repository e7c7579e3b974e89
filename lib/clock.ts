const startedAt = Date.now();

/**
 * The present instant: the only place that asks the machine's clock.
 * `BELLWARD_NOW` (an ISO instant) moves the start of this process there and time runs on from it, so that the order of
 * events survives. Production ignores it, but for the build under test (`BELLWARD_TEST=1`).
 */
export function now(): Date {
  const { BELLWARD_NOW: from, NODE_ENV, BELLWARD_TEST } = process.env;
  const real = Date.now();
  if (!from || (NODE_ENV === "production" && BELLWARD_TEST !== "1")) return new Date(real);
  const start = Date.parse(from);
  if (Number.isNaN(start)) throw new Error(`BELLWARD_NOW is no ISO instant: ${from}`);
  return new Date(start + (real - startedAt));
}
