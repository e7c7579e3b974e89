import { execFileSync } from "node:child_process";
import { writeFileSync } from "node:fs";
import { expect, test, type Page, type TestInfo } from "@playwright/test";
import type { SessionPageView } from "@/lib/schemas/prescription";
import { makeCamp, readCamp, signInAs } from "./camp-scene";

// A name as long as forms take it, in narrow and in wide letters, invented.
const LONG_NAME = `Maximiliana-Konstantina Wigglesworth-Featherstonehaugh ${"of the Lower Harbour Ward ".repeat(2)}`;
// As long as a coach may write it.
const LONG_NOTE = "Stop the set when the bar slows, rack it, and walk a round of the room. "
  .repeat(4)
  .slice(0, 300);

/** Prints as a person would and asks poppler, a PDF reader that is none of Chromium's, what came out. */
async function printed(page: Page, info: TestInfo, name: string) {
  // The page sets its type size once script and fonts are there.
  await expect(page.locator("article[data-fitted]")).toBeVisible();
  const file = info.outputPath(`${name}.pdf`);
  writeFileSync(file, await page.pdf({ preferCSSPageSize: true, printBackground: true }));
  const facts = execFileSync("/usr/bin/pdfinfo", [file], { encoding: "utf8" });
  const text = execFileSync("/usr/bin/pdftotext", ["-layout", file, "-"], { encoding: "utf8" });
  return {
    pages: Number(/^Pages:\s+(\d+)$/m.exec(facts)?.[1]),
    size: /^Page size:\s+(.+)$/m.exec(facts)?.[1] ?? "",
    text,
  };
}

test.beforeEach(async ({ context }) => {
  await signInAs(context, "head");
});

test("every week of a camp prints on one page of A4, to its last line, whatever the screen's scheme", async ({
  page,
  context,
}, info) => {
  const camp = await makeCamp(context.request, LONG_NAME);
  const { plan } = await readCamp(context.request, camp.id);
  for (const { weeksOut } of plan.weeks) {
    await page.emulateMedia({ colorScheme: weeksOut % 2 === 0 ? "dark" : "light" });
    await page.goto(`/camps/${camp.id}/sheet?week=${weeksOut}`);
    await expect(page.getByRole("article")).toBeVisible();
    const { pages, size, text } = await printed(page, info, `week-${weeksOut}`);
    expect(pages, `week ${weeksOut}`).toBe(1);
    expect(size).toContain("A4");
    // The last words of the page: nothing was cut off above them.
    expect(text).toContain("commission’s rules");
    expect(text).not.toContain("Print this week");
  }
});

test("a week with long notes on every line still fits, and every line is on it", async ({
  page,
  context,
}, info) => {
  const camp = await makeCamp(context.request, `Notes ${LONG_NAME}`.slice(0, 110));
  const { plan } = await readCamp(context.request, camp.id);
  const week = Math.max(...plan.lifts.map((lift) => lift.week));
  const names: string[] = [];
  for (const lift of plan.lifts.filter((one) => one.week === week)) {
    const url = `/api/camps/${camp.id}/sessions/${encodeURIComponent(lift.id)}`;
    const view = (await (await context.request.get(url)).json()) as SessionPageView;
    const lines = view.lift?.lines ?? [];
    names.push(...lines.map((line) => line.name));
    const edit = {
      lines: Object.fromEntries(lines.map(({ slot }) => [slot, { note: LONG_NOTE.slice(0, 120), sets: 8 }])),
      note: LONG_NOTE,
    };
    const saved = await context.request.put(`${url}/edit`, { data: { base: null, edit } });
    expect(saved.status()).toBe(200);
  }
  await page.goto(`/camps/${camp.id}/sheet?week=${week}`);
  const { pages, text } = await printed(page, info, "notes");
  expect(pages).toBe(1);
  expect(text).toContain("commission’s rules");
  // Columns break names: the first word of each is enough to know that its line is there.
  for (const name of names) expect(text).toContain(name.split(" ")[0] ?? name);
});

test("is black on white on a dark screen, weeks are chosen, and the button prints", async ({
  page,
  context,
}) => {
  const camp = await makeCamp(context.request, "Sheet on a screen");
  await page.emulateMedia({ colorScheme: "dark" });
  await page.goto(`/camps/${camp.id}/sheet?week=5`);
  const sheet = page.getByRole("article", { name: "Sheet of Sheet on a screen" });
  await expect(sheet).toHaveCSS("color", "rgb(0, 0, 0)");
  await expect(sheet).toHaveCSS("background-color", "rgb(255, 255, 255)");
  await page.getByRole("link", { name: "4 wk out" }).click();
  await expect(page).toHaveURL(/week=4$/);
  await expect(page.getByRole("link", { name: "4 wk out" })).toHaveAttribute("aria-current", "page");
  await expect(sheet).toContainText("4 wk out");
  await page.evaluate(() => {
    window.print = () => document.body.setAttribute("data-printed", "yes");
  });
  await page.getByRole("button", { name: "Print this week" }).click();
  await expect(page.locator("body")).toHaveAttribute("data-printed", "yes");
});
