import AxeBuilder from "@axe-core/playwright";
import { expect, test, type Page } from "@playwright/test";
import type { CampSummary } from "@/lib/schemas/camp";
import { demoPage } from "./session";

// axe-core finds what a machine can find of WCAG 2.2 A and AA and of good practice; what it cannot is tested by keyboard elsewhere.

test.describe.configure({ mode: "parallel" });

const WIDTHS = [
  { width: 1440, height: 900 },
  { width: 390, height: 844 },
] as const;
const SCHEMES = ["light", "dark"] as const;

/** Fonts drawn, nothing moving: contrast is measured on what stays. */
async function settled(page: Page): Promise<void> {
  await page.waitForLoadState("load");
  await page.evaluate(async () => {
    // What is skipped because it is far from the window keeps the colours of the scheme before.
    for (const element of document.querySelectorAll<HTMLElement>("*"))
      if (getComputedStyle(element).contentVisibility === "auto") element.style.contentVisibility = "visible";
    await document.fonts.ready;
    // At their end at once: a browser without a window may draw no frame in which they would end by themselves.
    for (const animation of document.getAnimations()) animation.finish();
  });
}

/**
 * What axe finds, as "rule: element". All rules in the light scheme; of the dark one what may differ there, which is colour.
 * The mail in its frame runs no script, so axe cannot look into it.
 */
async function findings(page: Page, scheme: (typeof SCHEMES)[number]): Promise<string[]> {
  await settled(page);
  const axe = new AxeBuilder({ page }).exclude("iframe").options({ resultTypes: ["violations"] });
  // Without frames to look into there is no need for the page of its own that gathers their results.
  axe.setLegacyMode();
  if (scheme === "dark") axe.withRules(["color-contrast", "link-in-text-block"]);
  const { violations } = await axe.analyze();
  return violations.flatMap(({ id, nodes }) =>
    nodes.map(
      ({ target, failureSummary, html }) => `${id}: ${target.join(" ")}\n${html}\n${failureSummary ?? ""}`,
    ),
  );
}

/** Both widths and both schemes of a page that is loaded once. */
async function findNothing(page: Page, what: string): Promise<void> {
  for (const viewport of WIDTHS) {
    await page.setViewportSize(viewport);
    for (const colorScheme of SCHEMES) {
      await page.emulateMedia({ colorScheme, reducedMotion: "reduce" });
      const place = `${what}, ${colorScheme}, ${viewport.width} px`;
      expect.soft(await findings(page, colorScheme), place).toEqual([]);
    }
  }
}

let camp: CampSummary;
test.beforeAll(async ({ browser }) => {
  const page = await demoPage(browser, "head");
  const { camps } = (await (await page.request.get("/api/camps")).json()) as { camps: CampSummary[] };
  const own = camps.find(({ athlete }) => athlete.name === "Tamsin Velloso");
  if (!own) throw new Error("The demo has no camp of Tamsin Velloso.");
  camp = own;
  await page.context().close();
});

const pathOf = (path: string): string => path.replace("CAMP", camp.id).replace("ATHLETE", camp.athlete.id);

const PUBLIC = [
  "/",
  "/how",
  "/sign-in",
  "/sign-up",
  "/reset",
  "/outbox",
  "/no-such-page",
  "/reset/no-such-token",
];
const OF_THE_TEAM = [
  "/board",
  "/camps",
  "/camps/new",
  "/camps/CAMP",
  "/camps/CAMP/changes",
  "/camps/CAMP/report",
  "/camps/CAMP/sheet",
  "/camps/no-such-camp",
  "/athletes",
  "/athletes/new",
  "/athletes/ATHLETE",
  "/exercises",
  "/timetable",
  "/house-rules",
  "/settings",
];

for (const path of PUBLIC) {
  test(`axe finds nothing on ${path} on a desk and a phone, light and dark`, async ({ page }) => {
    await page.goto(path);
    await findNothing(page, path);
  });
}

for (const path of OF_THE_TEAM) {
  test(`axe finds nothing on ${path} on a desk and a phone, light and dark`, async ({ browser }) => {
    const page = await demoPage(browser, "head");
    await page.goto(pathOf(path));
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    await findNothing(page, path);
    await page.context().close();
  });
}

const WINDOWS = [
  ["/settings", "Invite someone"],
  ["/settings", "Subscribe"],
  ["/timetable", "Add a session"],
  ["/camps/CAMP", "Change the bout"],
  ["/camps/CAMP", "Add a session"],
  ["/athletes/ATHLETE", "Add a best"],
  ["/athletes/ATHLETE", "Import a file"],
] as const;

for (const [path, button] of WINDOWS) {
  test(`axe finds nothing in the window "${button}" of ${path} on a desk and a phone, light and dark`, async ({
    browser,
  }) => {
    const page = await demoPage(browser, "head");
    await page.goto(pathOf(path));
    await page.getByRole("button", { name: button }).first().click();
    await expect(page.getByRole("dialog")).toBeVisible();
    await findNothing(page, `${path}: ${button}`);
    await page.context().close();
  });
}

test(`axe finds nothing while a session is open on a desk and a phone, light and dark`, async ({
  browser,
  page: start,
}) => {
  await start.goto("/");
  await start.getByText("More: weigh-in, free hours, other sessions").click();
  await start
    .getByRole("button", { name: /, \d+ sets$/ })
    .first()
    .click();
  await findNothing(start, "start page, a session open");

  const page = await demoPage(browser, "head");
  await page.goto(pathOf("/camps/CAMP"));
  await page
    .locator("button[data-session]")
    .and(page.getByRole("button", { name: /, \d+ sets$/ }))
    .last()
    .click();
  await expect(page.getByRole("region", { name: "Details" }).getByText("Working sets")).toBeVisible();
  await findNothing(page, "camp, a session open");
  await page.context().close();
});
