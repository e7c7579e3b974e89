// Runs vitest and Playwright and counts by their own reports, so that a run that died early is not taken for a good one.
import { spawn } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync } from "node:fs";
import path from "node:path";
import { killGroup } from "./command.mjs";
import { inData, ROOT } from "./project.mjs";

/** @typedef {{ passed: number; failed: number; skipped: number; failures: string[] }} Tally */

const REPORTS = inData("test");

/** Shows what the suite prints and gives its exit code; a suite that hangs is ended. */
function shown(args, env, timeoutMs) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, args, {
      cwd: ROOT,
      env: { ...process.env, ...env },
      detached: true,
      stdio: ["ignore", "inherit", "inherit"],
    });
    const onSignal = () => killGroup(child.pid, "SIGTERM");
    let timedOut = false;
    const timer = setTimeout(() => {
      timedOut = true;
      killGroup(child.pid, "SIGTERM");
      setTimeout(() => killGroup(child.pid, "SIGKILL"), 20_000).unref();
    }, timeoutMs);
    process.on("SIGINT", onSignal).on("SIGTERM", onSignal);
    child.once("exit", (code) => {
      clearTimeout(timer);
      process.off("SIGINT", onSignal).off("SIGTERM", onSignal);
      resolve({ code: code ?? 128, timedOut });
    });
  });
}

function report(name) {
  mkdirSync(REPORTS, { recursive: true });
  const file = path.join(REPORTS, `${name}.json`);
  rmSync(file, { force: true });
  return { file, read: () => (existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : null) };
}

/** A suite that failed without a failed test (it crashed, hung, or found nothing) counts as one failure. */
function close(name, tally, { code, timedOut }) {
  if (code !== 0 && tally.failed === 0) {
    tally.failed = 1;
    tally.failures.push(
      `${name}: ${timedOut ? "took too long and was ended" : `ended with exit code ${code}; see its output above`}`,
    );
  }
  return tally;
}

/**
 * @param {string} name as it is shown
 * @param {readonly string[]} paths
 * @param {{ zone?: string; isolate?: boolean; timeoutMs: number }} options `zone`: TZ of the run; without `isolate` files share
 * their modules, which pure code may
 * @returns {Promise<Tally>}
 */
export async function runVitest(name, paths, { zone = "UTC", isolate = true, timeoutMs }) {
  const { file, read } = report(`vitest-${name.replace(/\W+/g, "-")}`);
  const args = [
    "node_modules/vitest/vitest.mjs",
    "run",
    ...paths,
    ...(isolate ? [] : ["--no-isolate"]),
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${file}`,
  ];
  const ended = await shown(args, { TZ: zone }, timeoutMs);
  const tally = { passed: 0, failed: 0, skipped: 0, failures: [] };
  for (const { name: testFile, status, assertionResults, message } of read()?.testResults ?? []) {
    const place = path.relative(ROOT, testFile);
    const before = tally.failed;
    for (const { status: result, fullName } of assertionResults) {
      if (result === "passed") tally.passed += 1;
      else if (result === "failed") {
        tally.failed += 1;
        tally.failures.push(`${name}: ${place}: ${fullName}`);
      } else tally.skipped += 1;
    }
    // A file that cannot be loaded, or whose set-up fails, has no failed test to show for it.
    if (status === "failed" && tally.failed === before) {
      tally.failed += 1;
      tally.failures.push(`${name}: ${place}: ${String(message).split("\n")[0]}`);
    }
  }
  return close(name, tally, ended);
}

function* specsOf(suite) {
  for (const spec of suite.specs ?? []) yield spec;
  for (const inner of suite.suites ?? []) yield* specsOf(inner);
}

/**
 * @param {{ timeoutMs: number }} options
 * @returns {Promise<Tally>}
 */
export async function runPlaywright({ timeoutMs }) {
  const { file, read } = report("playwright");
  const args = ["node_modules/@playwright/test/cli.js", "test", "--reporter=list,json"];
  const ended = await shown(args, { PLAYWRIGHT_JSON_OUTPUT_FILE: file }, timeoutMs);
  const tally = { passed: 0, failed: 0, skipped: 0, failures: [] };
  const seen = read();
  for (const suite of seen?.suites ?? []) {
    for (const spec of specsOf(suite)) {
      for (const test of spec.tests) {
        if (test.status === "expected") tally.passed += 1;
        else if (test.status === "skipped") tally.skipped += 1;
        else {
          tally.failed += 1;
          tally.failures.push(`browser: ${spec.file}: ${spec.title}`);
        }
      }
    }
  }
  for (const error of seen?.errors ?? []) {
    tally.failed += 1;
    tally.failures.push(`browser: ${String(error.message).split("\n")[0]}`);
  }
  return close("browser", tally, ended);
}
