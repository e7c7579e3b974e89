// The static checks: each is one test of `npm test`, all of them are `npm run check`.
import { cpSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { run } from "./command.mjs";
import { inData, inRoot, ROOT } from "./project.mjs";

const TIMEOUT_MS = 240_000;
const work = (...parts) => inData("check", ...parts);
const inProject = (command, args, options = {}) =>
  run(command, args, { cwd: ROOT, timeoutMs: TIMEOUT_MS, ...options });
const node = (script, args, options) =>
  inProject(process.execPath, [`node_modules/${script}`, ...args], options);

/** A check's outcome: passed, or what a person has to read. */
const outcome = ({ code, output, timedOut }) => ({
  passed: code === 0,
  output: timedOut ? `${output}\nIt took too long.` : output,
});

async function types() {
  // Writes the types of the routes and next-env.d.ts, without which `tsc` knows no style sheet.
  const generated = await node("next/dist/bin/next", ["typegen"], {
    env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1" },
  });
  if (generated.code !== 0) return outcome(generated);
  // A config of its own: a running `npm run dev` leaves types of routes that are gone.
  const config = {
    extends: "../../tsconfig.json",
    compilerOptions: { tsBuildInfoFile: "./types.tsbuildinfo" },
    include: ["../../next-env.d.ts", "../../**/*.ts", "../../**/*.tsx", "../../.next/types/**/*.ts"],
    exclude: ["../../node_modules", "../../.data", "../../.next/dev"],
  };
  writeFileSync(work("tsconfig.json"), JSON.stringify(config));
  return outcome(
    await node("typescript/bin/tsc", ["--noEmit", "--pretty", "false", "-p", work("tsconfig.json")]),
  );
}

const lint = async () =>
  outcome(
    await node("eslint/bin/eslint.js", [
      ".",
      "--max-warnings=0",
      "--cache",
      "--cache-location",
      work("eslint"),
    ]),
  );

const format = async () =>
  outcome(
    await node("prettier/bin/prettier.cjs", [
      ".",
      "--check",
      "--log-level=warn",
      "--cache",
      "--cache-location",
      work("prettier"),
    ]),
  );

async function arrows() {
  const result = await node("dependency-cruiser/bin/dependency-cruise.mjs", [
    "--config",
    ".dependency-cruiser.cjs",
    "--output-type",
    "json",
    "app",
    "components",
    "db",
    "lib",
    "tests",
  ]);
  let summary;
  let seen = [];
  try {
    const report = JSON.parse(result.stdout);
    summary = report.summary;
    seen = report.modules.map(({ source }) => source);
  } catch {
    return { passed: false, output: result.output };
  }
  const told = summary.violations.map(({ rule, from, to }) => `${rule.name}: ${from} -> ${to}`);
  // With a TypeScript it does not know, the tool sees no file and finds no fault.
  if (!seen.includes("db/client.ts") || !seen.includes("lib/env.ts"))
    told.push("The tool saw none of our files.");
  return { passed: told.length === 0, output: told.join("\n") };
}

/** Generates what a migration of the present schema would add to a copy of drizzle/: it must be nothing. */
async function migrations() {
  const copy = work("drizzle");
  const config = work("drizzle.config.ts");
  rmSync(copy, { recursive: true, force: true });
  cpSync(inRoot("drizzle"), copy, { recursive: true });
  writeFileSync(
    config,
    `import config from "../../drizzle.config";\nexport default { ...config, out: "./.data/check/drizzle" };\n`,
  );
  const kit = (command) =>
    node("drizzle-kit/bin.cjs", [command, "--config", ".data/check/drizzle.config.ts"], {
      timeoutMs: 60_000,
    });
  const sound = await kit("check");
  if (sound.code !== 0) return outcome(sound);
  const before = new Set(readdirSync(inRoot("drizzle")));
  const generated = await kit("generate");
  const added = readdirSync(copy).filter((file) => !before.has(file));
  const passed = generated.code === 0 && added.length === 0 && /No schema changes/.test(generated.output);
  const missing = added.map((file) => readFileSync(work("drizzle", file), "utf8"));
  const told = [
    "The schema and drizzle/ differ: `npx drizzle-kit generate` writes the migration.",
    ...missing,
  ];
  return { passed, output: passed ? "" : [...told, generated.output].join("\n") };
}

const CHECKS = [
  ["types", types],
  ["import arrows", arrows],
  ["lint", lint],
  ["formatting", format],
  ["schema equals migrations", migrations],
];

/**
 * Runs every check, two at a time: the longest first, and a failing one hides none of the others.
 * @param {(result: { name: string; passed: boolean; output: string; ms: number }) => void} onResult
 */
export async function runChecks(onResult) {
  mkdirSync(work(), { recursive: true });
  const queue = [...CHECKS];
  const worker = async () => {
    for (let next = queue.shift(); next; next = queue.shift()) {
      const [name, check] = next;
      const begun = Date.now();
      const result = await check().catch((error) => ({
        passed: false,
        output: String(error?.stack ?? error),
      }));
      onResult({ name, ...result, ms: Date.now() - begun });
    }
  };
  await Promise.all([worker(), worker()]);
}
