// `npm test`: from nothing to one line `N passed, N failed`. A step that fails hides none of those after it.
import { existsSync } from "node:fs";
import { startCluster, stopCluster } from "../../db/server.mjs";
import { CHROMIUM, CHROMIUM_PACKAGES } from "./chromium.mjs";
import { endRunning, run, runMain, SetupError } from "./command.mjs";
import { installPackages } from "./debian.mjs";
import { ensurePackages } from "./packages.mjs";
import { say } from "./progress.mjs";
import { checkNode, inData, makeDataFolder } from "./project.mjs";

const MINUTE = 60_000;
/** Two west and east of Greenwich with changes of clock, one half an hour off: the engine must not notice. */
const OTHER_ZONES = ["America/Sao_Paulo", "Pacific/Apia", "Asia/Kolkata"];
const TEST_CLUSTER = inData("test-pg");

/** Chromium for the browser tests, a PDF reader for what it prints, and Python's iCalendar reader as a second opinion on the feed. */
async function ensureDebianPackages() {
  if (!existsSync(CHROMIUM)) await installPackages(CHROMIUM_PACKAGES, "Chromium", say);
  if (!existsSync("/usr/bin/pdfinfo")) await installPackages(["poppler-utils"], "poppler-utils", say);
  const reader = await run("/usr/bin/python3", ["-c", "import icalendar"]);
  if (reader.code !== 0) await installPackages(["python3-icalendar"], "python3-icalendar", say);
}

const total = { passed: 0, failed: 0, skipped: 0, failures: [] };

/** Adds a step's tally; a step that cannot even run is one failure. */
async function section(title, work) {
  say(`\n== ${title}`);
  const begun = Date.now();
  try {
    const tally = await work();
    total.passed += tally.passed;
    total.failed += tally.failed;
    total.skipped += tally.skipped ?? 0;
    total.failures.push(...tally.failures);
    say(`   ${tally.passed} passed, ${tally.failed} failed in ${((Date.now() - begun) / 1000).toFixed(0)} s`);
  } catch (error) {
    total.failed += 1;
    total.failures.push(
      `${title}: ${error instanceof SetupError ? error.message : String(error?.stack ?? error)}`,
    );
    say(`   ${error instanceof SetupError ? error.message : String(error?.stack ?? error)}`);
  }
}

async function staticChecks() {
  const { runChecks } = await import("./checks.mjs");
  const tally = { passed: 0, failed: 0, failures: [] };
  await runChecks(({ name, passed, output, ms }) => {
    say(`   ${passed ? "passed" : "FAILED"}  ${name} (${(ms / 1000).toFixed(1)} s)`);
    if (!passed) say(output.trim().replace(/^/gm, "     "));
    tally[passed ? "passed" : "failed"] += 1;
    if (!passed) tally.failures.push(`check: ${name}`);
  });
  return tally;
}

let built = false;
async function build() {
  const { ensureBuild } = await import("./build.mjs");
  await ensureBuild();
  built = true;
  return { passed: 1, failed: 0, failures: [] };
}

async function main() {
  checkNode();
  makeDataFolder();
  await ensurePackages();
  await ensureDebianPackages();
  // Installs PostgreSQL where it is missing and holds the cluster for all suites; apart from the one of `npm start`.
  await startCluster({ dir: TEST_CLUSTER, fast: true, log: say });
  const { runPlaywright, runVitest } = await import("./suites.mjs");
  await section("Static checks", staticChecks);
  await section("Unit, reference, service and API tests", () =>
    runVitest("tests", [], { timeoutMs: 12 * MINUTE }),
  );
  for (const zone of OTHER_ZONES) {
    await section(`Engine tests under TZ=${zone}`, () =>
      runVitest(zone, ["tests/engine"], { zone, isolate: false, timeoutMs: 6 * MINUTE }),
    );
  }
  await section("Production build", build);
  await section("Browser tests", () => {
    if (!built) throw new SetupError("not run: there is no build to test");
    return runPlaywright({ timeoutMs: 25 * MINUTE });
  });
}

function summary() {
  if (total.passed === 0) {
    total.failed += 1;
    total.failures.push("No test ran.");
  }
  if (total.failures.length > 0)
    say(`\nFailed:\n${total.failures.map((failure) => `  ${failure}`).join("\n")}`);
  if (total.skipped > 0) say(`\n${total.skipped} skipped`);
  say(`\n${total.passed} passed, ${total.failed} failed`);
}

let interrupted = false;
for (const signal of ["SIGINT", "SIGTERM"]) {
  process.on(signal, () => {
    if (interrupted) return;
    interrupted = true;
    void endRunning();
  });
}

await runMain(async () => {
  try {
    await main();
  } catch (error) {
    if (!(error instanceof SetupError)) throw error;
    total.failed += 1;
    total.failures.push(error.message);
  } finally {
    await stopCluster({ dir: TEST_CLUSTER }).catch((error) => say(error.message));
  }
  summary();
  return total.failed === 0 && !interrupted ? 0 : 1;
});
