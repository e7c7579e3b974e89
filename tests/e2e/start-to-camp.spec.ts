import { randomUUID } from "node:crypto";
import { expect, test, type Page } from "@playwright/test";
import type { CampView } from "@/lib/schemas/camp";
import { dateAhead, freshTeam } from "./team-scene";

// Two weeks' room before the camp starts, so that nothing of it is past.
const BOUT = dateAhead(70);

const summary = (page: Page) => page.getByRole("heading", { level: 2, name: /lifts, .* working sets$/ });
const grid = (page: Page) => page.getByRole("table", { name: "The camp, week by week" });

async function openStart(page: Page, query = `bout=${BOUT}&weeks=8`): Promise<void> {
  await page.goto(`/?${query}`);
  await expect(summary(page)).toHaveText(/^\d+ weeks?, \d+ lifts, \d+ working sets$/);
  // Filled in by the browser alone: once it is there, the fields answer.
  await expect(page.getByLabel("Time zone")).toHaveValue("Europe/London");
  await page.waitForLoadState("networkidle");
}

const inAddress = (page: Page, name: string) => expect.poll(() => new URL(page.url()).searchParams.get(name));

/** Inputs other than the defaults, by the form's own fields. */
async function fillIn(page: Page): Promise<void> {
  await page.getByLabel("Camp length").selectOption("5");
  await page.getByRole("checkbox", { name: "Saturday" }).uncheck();
  await page.getByRole("checkbox", { name: "Thursday" }).check();
  await page.getByLabel("Lifts a week").selectOption("2");
  await page.getByLabel("Striking base").selectOption("boxing");
  await page.getByLabel("First bell").fill("21:15");
  await page.getByText("More: weigh-in, free hours, other sessions").click();
  await page.getByLabel("Weigh-in", { exact: true }).selectOption("day-before");
}

test("every change of a field lays the camp out again in the browser, without a request", async ({
  page,
}) => {
  await openStart(page);
  const requests: string[] = [];
  page.on("request", (request) => {
    // Of its own accord the browser asks for the icon again when the address changes, and Next for pages that links lead to.
    const own = request.url().includes("/icon.svg") || "next-router-prefetch" in request.headers();
    if (!own) requests.push(`${request.method()} ${request.url()}`);
  });
  // Whatever the page would have to fetch, it could not.
  await page.context().setOffline(true);

  await expect(summary(page)).toHaveText(/^8 weeks, /);
  await expect(grid(page).getByRole("rowheader")).toHaveCount(8);
  await expect(
    grid(page)
      .getByRole("button", { name: /^Hard sparring, Sat/ })
      .first(),
  ).toBeVisible();
  await page.getByLabel("Camp length").selectOption("5");
  await expect(summary(page)).toHaveText(/^5 weeks, /);
  await expect(grid(page).getByRole("rowheader")).toHaveCount(5);

  const before = await summary(page).innerText();
  await page.getByRole("checkbox", { name: "Saturday" }).uncheck();
  await page.getByRole("checkbox", { name: "Thursday" }).check();
  await expect(
    grid(page)
      .getByRole("button", { name: /^Hard sparring, Thu/ })
      .first(),
  ).toBeVisible();
  await expect(grid(page).getByRole("button", { name: /^Hard sparring, Sat/ })).toHaveCount(0);
  await page.getByLabel("Lifts a week").selectOption("1");
  await expect(summary(page)).not.toHaveText(before);
  await page.getByLabel("Bout date").fill(dateAhead(63));
  await inAddress(page, "bout").toBe(dateAhead(63));
  await inAddress(page, "lifts").toBe("1");

  expect(requests).toEqual([]);
});

test("a field that is wrong says so, and the camp that stood there stays", async ({ page }) => {
  await openStart(page);
  const before = await summary(page).innerText();
  await page.getByLabel("Bout date").fill("");
  await expect(page.getByText("Give the date of the bout.")).toBeVisible();
  await expect(page.getByText("Shown as it was: one of the fields is wrong.")).toBeVisible();
  await expect(summary(page)).toHaveText(before);
  await page.getByRole("button", { name: "Keep this camp" }).click();
  await expect(page.getByLabel("Bout date")).toBeFocused();
});

test("a session says why it stands where it stands", async ({ page }) => {
  await openStart(page);
  const lift = grid(page)
    .getByRole("button", { name: /, \d+ sets$/ })
    .first();
  await lift.click();
  await expect(lift).toHaveAttribute("aria-expanded", "true");
  await expect(page.getByText(/^Why/).first()).toBeVisible();
});

test("the address keeps every input, and who opens it as a link sees the same camp", async ({
  page,
  browser,
}) => {
  await openStart(page);
  await fillIn(page);
  await inAddress(page, "weigh-in").toBe("day-before");
  await inAddress(page, "hard").toBe("24");
  await expect(summary(page)).toHaveText(/^5 weeks, /);
  const laidOut = await grid(page).innerText();

  // Elsewhere in the world, without anything that this browser keeps.
  const context = await browser.newContext({ timezoneId: "Asia/Kolkata" });
  const other = await context.newPage();
  await other.goto(page.url());
  await expect(summary(other)).toHaveText(await summary(page).innerText());
  await expect(other.getByLabel("Bout date")).toHaveValue(BOUT);
  await expect(other.getByLabel("First bell")).toHaveValue("21:15");
  await expect(other.getByLabel("Camp length")).toHaveValue("5");
  await expect(other.getByLabel("Time zone")).toHaveValue("Europe/London");
  await expect(other.getByLabel("Striking base")).toHaveValue("boxing");
  await expect(other.getByRole("checkbox", { name: "Thursday" })).toBeChecked();
  await expect(other.getByRole("checkbox", { name: "Saturday" })).not.toBeChecked();
  expect(await grid(other).innerText()).toBe(laidOut);
  await context.close();
});

const campOf = async (page: Page): Promise<CampView> =>
  (await (await page.request.get(`/api${new URL(page.url()).pathname}`)).json()) as CampView;

test("Keep this camp leads through sign-up to the saved camp: same bout, length, lifts and sets", async ({
  page,
}) => {
  await openStart(page);
  await fillIn(page);
  await expect(summary(page)).toHaveText(/^5 weeks, /);
  const shown = await summary(page).innerText();
  await inAddress(page, "weigh-in").toBe("day-before");
  await page.getByRole("link", { name: "Keep this camp" }).click();

  await expect(page.getByRole("heading", { level: 1, name: "Keep this camp" })).toBeVisible();
  await page.getByLabel("Your name").fill("Nadia Ferreira-Okafor");
  await page.getByLabel("E-mail").fill(`${randomUUID()}@signup.example`);
  await page.getByLabel("Password").fill("a few words in a row");
  await page.getByLabel("Team or gym").fill("Lighthouse Boxing");
  await page.getByRole("button", { name: "Make the team and keep the camp" }).click();

  await page.waitForURL(/\/camps\/[0-9a-f-]{36}$/);
  await expect(page.getByRole("heading", { level: 1, name: "My first athlete" })).toBeVisible();
  await expect(page.getByText("5-week camp")).toBeVisible();
  const { book, plan } = await campOf(page);
  expect(book.bout).toMatchObject({ date: BOUT, time: "21:15", timeZone: "Europe/London" });
  expect(book.weeks).toBe(5);
  expect(book.weighIn?.date).toBe(dateAhead(69));
  expect(book.athlete).toMatchObject({ liftsPerWeek: 2, strikingBase: "boxing" });
  const sets = plan.weeks.reduce((sum, week) => sum + week.sets, 0);
  expect(`${plan.weeks.length} weeks, ${plan.lifts.length} lifts, ${sets} working sets`).toBe(shown);
});

test("who has an account already keeps the camp in the team there is", async ({ browser }) => {
  const team = await freshTeam(browser);
  const page = await team.pageOf("head");
  await openStart(page);
  await page.getByLabel("Camp length").selectOption("6");
  await inAddress(page, "weeks").toBe("6");
  await page.getByRole("link", { name: "Keep this camp" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "A new camp" })).toBeVisible();
  await page.getByRole("button", { name: "Keep this camp" }).click();
  await expect(page.getByText("Give the athlete’s name.")).toBeVisible();
  await page.getByLabel("Athlete", { exact: true }).selectOption({ label: team.athlete.name });
  await page.getByRole("button", { name: "Keep this camp" }).click();
  await page.waitForURL(/\/camps\/[0-9a-f-]{36}$/);
  const { book, athlete } = await campOf(page);
  expect(athlete.name).toBe(team.athlete.name);
  expect(book).toMatchObject({ weeks: 6, bout: { date: BOUT } });
  await page.context().close();
});
