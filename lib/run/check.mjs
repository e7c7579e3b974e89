// `npm run check`: types, lint, formatting, import arrows, and that schema and migrations agree.
import { runMain } from "./command.mjs";
import { ensurePackages } from "./packages.mjs";
import { say } from "./progress.mjs";
import { checkNode, makeDataFolder } from "./project.mjs";

await runMain(async () => {
  checkNode();
  makeDataFolder();
  await ensurePackages();
  const { runChecks } = await import("./checks.mjs");
  let passed = 0;
  let failed = 0;
  await runChecks((check) => {
    if (check.passed) passed += 1;
    else failed += 1;
    say(`${check.passed ? "passed" : "FAILED"}  ${check.name} (${(check.ms / 1000).toFixed(1)} s)`);
    if (!check.passed) say(check.output.trim().replace(/^/gm, "  "));
  });
  say(`${passed} passed, ${failed} failed`);
  return failed === 0 ? 0 : 1;
});
