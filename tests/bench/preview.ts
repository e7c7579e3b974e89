import { build } from "esbuild";
import { figures, round } from "./measure";
import { openBrowser } from "./browser";

/** Times previews of a moved hard sparring day in Chromium: the same code as the camp page, bundled for the browser. */
export async function benchPreview() {
  const bundle = await build({
    entryPoints: ["tests/bench/preview-page.ts"],
    bundle: true,
    write: false,
    format: "iife",
    minify: true,
    logLevel: "error",
  });
  const browser = await openBrowser();
  const page = await browser.newPage();
  await page.addScriptTag({ content: bundle.outputFiles[0]?.text ?? "" });
  const times = await page.evaluate<number[]>("window.benchPreview()");
  await browser.close();
  const { median, p95, runs } = figures(times);
  return { "preview of a move, 8-week camp, ms": { median: round(median), p95: round(p95), runs } };
}
