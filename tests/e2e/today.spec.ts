import AxeBuilder from "@axe-core/playwright";
import { expect, test, type Page } from "@playwright/test";
import {
  athleteDay,
  card,
  LIFT,
  openForBasement,
  PADS,
  rate,
  readDay,
  sessionOf,
  SPARRING,
  stateLine,
  storedLogs,
} from "./today-scene";

const daysOut = (page: Page) => page.getByRole("heading", { level: 1 });
const dayHead = (page: Page, name: RegExp) => page.getByRole("heading", { level: 2, name });

/** A finger from right to left, or back, as the browser would report it. */
async function swipe(page: Page, way: "next" | "before"): Promise<void> {
  const client = await page.context().newCDPSession(page);
  const [from, to] = way === "next" ? [330, 60] : [60, 330];
  const touch = (type: "touchStart" | "touchMove" | "touchEnd", x: number) =>
    client.send("Input.dispatchTouchEvent", {
      type,
      touchPoints: type === "touchEnd" ? [] : [{ x, y: 300 }],
    });
  await touch("touchStart", from);
  for (let step = 1; step <= 5; step++) await touch("touchMove", from + ((to - from) * step) / 5);
  await touch("touchEnd", to);
  await client.detach();
}

test("an athlete's sign-in leads to their day, and yesterday and tomorrow are a swipe, a key or a tap away", async ({
  browser,
}) => {
  const { phone } = await athleteDay(browser);
  const { page, context } = await phone();
  await page.goto("/board");
  await expect(page).toHaveURL(/\/today$/);
  await expect(daysOut(page)).toContainText("38");
  await expect(dayHead(page, /^Today, /)).toBeVisible();
  const strip = page.getByRole("navigation", { name: "Days" }).getByRole("button");
  await expect(strip).toHaveCount(7);
  await expect(strip.nth(1)).toHaveAttribute("aria-current", "date");

  await swipe(page, "next");
  await expect(dayHead(page, /^Tomorrow, /)).toBeVisible();
  await expect(daysOut(page)).toContainText("37");
  await swipe(page, "before");
  await expect(dayHead(page, /^Today, /)).toBeVisible();
  await page.keyboard.press("ArrowLeft");
  await expect(dayHead(page, /^Yesterday, /)).toBeVisible();
  await page.keyboard.press("ArrowRight");
  await strip.nth(6).tap();
  await expect(card(page, PADS)).toBeVisible();
  // From the strip itself arrows go on to the end of what the phone holds.
  for (let press = 0; press < 4; press++) await page.keyboard.press("ArrowRight");
  await expect(strip.nth(6)).toHaveAttribute("aria-current", "date");
  await expect(daysOut(page)).toContainText("31");
  await context.close();
});

test("a whole day by thumb: sets, effort, pain, check-in, weight and a request", async ({ browser }) => {
  const { phone } = await athleteDay(browser);
  const { page, context } = await phone();
  await page.goto("/today");

  const lift = card(page, LIFT);
  await lift.getByRole("button", { name: "Start and log" }).tap();
  await lift.getByRole("button", { name: "Set 1 done" }).tap();
  const rest = page.getByRole("group", { name: "Rest" });
  await expect(rest.getByRole("timer")).toHaveText(/^\+?\d+:\d\d$/);
  await expect.poll(async () => (await sessionOf(context, LIFT)).log?.sets.length).toBe(1);
  // A locked screen or a reload loses neither the rest nor the place.
  await page.reload();
  await expect(rest.getByRole("timer")).toHaveText(/^\+?\d+:\d\d$/);
  await rest.getByRole("button", { name: "End" }).tap();
  await expect(rest).toBeHidden();
  await lift.getByRole("button", { name: "The rest as written" }).tap();

  await lift.getByRole("button", { name: "Finish and save" }).tap();
  await expect(lift.getByText("Say how hard it was, 0 to 10.")).toBeVisible();
  await expect(lift.getByText("Say how long it took.")).toBeVisible();
  await rate(lift, "How hard was the session?", "7, very hard");
  await lift.getByLabel("Minutes", { exact: true }).fill("58");
  await lift.getByLabel("Something hurts").check();
  await rate(lift, "How much?", "3");
  await expect(lift.getByText("Say where it hurts.")).toBeVisible();
  await lift.getByLabel("Where does it hurt?").fill("left knee");
  await lift.getByLabel("Note for your coach").fill("Felt fast.");
  await lift.getByRole("button", { name: "Finish and save" }).tap();
  await expect(lift.getByText(/^Done · effort 7, very hard · 58 min · /)).toBeVisible();
  await expect(stateLine(page)).toHaveText(/^Saved/);
  const { log, prescription } = await sessionOf(context, LIFT);
  expect(log).toMatchObject({
    state: "done",
    effort: 7,
    minutes: 58,
    pain: 3,
    painPlace: "left knee",
    note: "Felt fast.",
  });
  expect(log?.sets).toHaveLength((prescription?.lines ?? []).reduce((sum, { sets }) => sum + sets, 0));

  const checkIn = card(page, "How are you this morning?");
  await rate(checkIn, "Sleep", "2");
  await rate(checkIn, "Fatigue", "3");
  await rate(checkIn, "Soreness", "4");
  await rate(checkIn, "Stress", "1, very good");
  await expect(checkIn.getByText("Saved")).toBeVisible();
  await rate(checkIn, "Stress", "2");
  await expect
    .poll(async () => (await readDay(context)).days[1]?.checkIn)
    .toEqual({ sleep: 2, fatigue: 3, soreness: 4, stress: 2 });

  const weight = card(page, "Weight");
  await weight.getByLabel("Weight this morning, kg").fill("62,9");
  await weight.getByRole("button", { name: "Keep" }).tap();
  await expect.poll(async () => (await readDay(context)).days[1]?.kg).toBe(62.9);
  await expect(weight.getByText("Rapid weight loss can injure or kill.", { exact: false })).toBeVisible();

  await page.getByRole("navigation", { name: "Days" }).getByRole("button").nth(6).tap();
  const pads = card(page, PADS);
  await pads.getByRole("button", { name: "I can’t make it" }).tap();
  await pads.getByLabel("Why can’t you make it?").fill("Exam in the evening");
  await pads.getByRole("button", { name: "Ask the coach" }).tap();
  await expect(pads.getByText("You asked your coach to do without you")).toBeVisible();
  await expect.poll(async () => (await sessionOf(context, PADS)).request?.state).toBe("asked");
  await pads.getByRole("button", { name: "Take it back" }).tap();
  await expect.poll(async () => (await sessionOf(context, PADS)).request?.state).toBe("withdrawn");
  await expect(pads.getByRole("button", { name: "I can’t make it" })).toBeVisible();
  await context.close();
});

test("a knock to the head is asked about once more, and contact and lifting then stop being planned", async ({
  browser,
}) => {
  const { phone } = await athleteDay(browser, { lift: false });
  const { page, context } = await phone();
  await page.goto("/today");
  const sparring = card(page, SPARRING);
  await sparring.getByRole("button", { name: "Log it" }).tap();
  await sparring.getByRole("button", { name: "Took a knock to the head" }).tap();
  await expect(sparring.getByText("This is no medical clearance.", { exact: false })).toBeVisible();
  expect((await sessionOf(context, SPARRING)).log).toBeNull();
  await sparring.getByRole("button", { name: "Yes, tell them" }).tap();
  await expect(sparring.getByText("You took a knock to the head")).toBeVisible();
  await rate(sparring, "How hard was the session?", "8");
  await sparring.getByRole("button", { name: "Minutes, more" }).tap();
  await sparring.getByRole("button", { name: "Hard rounds, more" }).tap();
  await sparring.getByRole("button", { name: "Finish and save" }).tap();
  await expect
    .poll(async () => (await sessionOf(context, SPARRING)).log)
    .toMatchObject({ state: "done", knock: true, effort: 8, hardRounds: 1 });
  await page.reload();
  await page.keyboard.press("ArrowRight");
  await expect(page.getByText(/^On a hold since /)).toBeVisible();
  await context.close();
});

test("in a basement: the page opens, logs and finishes without a net, and the log arrives once", async ({
  browser,
}) => {
  const { campId, phone } = await athleteDay(browser);
  const { page, context } = await phone();
  await openForBasement(page);
  const lift = card(page, LIFT);
  await lift.getByRole("button", { name: "Start and log" }).tap();
  await lift.getByRole("button", { name: "Set 1 done" }).tap();
  await expect.poll(async () => (await storedLogs(campId))[0]?.version).toBe(1);
  await expect(stateLine(page)).toHaveText(/^Saved/);

  await context.setOffline(true);
  await page.reload();
  await expect(daysOut(page)).toContainText("38");
  await lift.getByRole("button", { name: "The rest as written" }).tap();
  await rate(lift, "How hard was the session?", "6");
  await lift.getByRole("button", { name: "Minutes, more" }).tap();
  await lift.getByRole("button", { name: "Finish and save" }).tap();
  await expect(lift.getByText("Kept on this phone")).toBeVisible();
  await expect(stateLine(page)).toHaveText("1 entry waits for the net");
  const checkIn = card(page, "How are you this morning?");
  for (const group of ["Sleep", "Fatigue", "Soreness", "Stress"]) await rate(checkIn, group, "3");
  await expect(stateLine(page)).toHaveText("2 entries wait for the net");
  // The next days are readable as well, and nothing is lost by loading the page again.
  await page.getByRole("navigation", { name: "Days" }).getByRole("button").nth(6).tap();
  await expect(card(page, PADS)).toBeVisible();
  await page.reload();
  await expect(lift.getByText(/^Done · effort 6 · /)).toBeVisible();
  await expect(stateLine(page)).toHaveText("2 entries wait for the net");
  expect(await storedLogs(campId)).toEqual([{ version: 1, state: "open" }]);

  const writes: string[] = [];
  page.on("request", (request) => {
    if (request.method() === "PUT") writes.push(new URL(request.url()).pathname);
  });
  await context.setOffline(false);
  await expect(stateLine(page)).toHaveText(/^Saved/);
  expect(writes.map((path) => path.replace(/^.*\/(log|check-ins)(\/.*)?$/, "$1"))).toEqual([
    "log",
    "check-ins",
  ]);
  expect(await storedLogs(campId)).toEqual([{ version: 2, state: "done" }]);
  const { log, prescription } = await sessionOf(context, LIFT);
  expect(log?.sets).toHaveLength((prescription?.lines ?? []).reduce((sum, { sets }) => sum + sets, 0));

  // What the phone kept to read goes with the person.
  await page.getByRole("button", { name: "You", exact: true }).tap();
  await page.getByRole("button", { name: "Sign out" }).tap();
  await expect(page).toHaveURL(/\/$/);
  expect(await page.evaluate(() => caches.has("bellward-pages"))).toBe(false);
  await context.setOffline(true);
  await expect(page.goto("/today")).rejects.toThrow();
  await context.close();
});

test("two devices, one log: both versions are shown, and what one keeps is what stands", async ({
  browser,
}) => {
  const { campId, phone } = await athleteDay(browser);
  const mine = await phone();
  const other = await phone();
  await openForBasement(mine.page);
  await mine.context.setOffline(true);
  const lift = card(mine.page, LIFT);
  await lift.getByRole("button", { name: "Start and log" }).tap();
  await lift.getByRole("button", { name: "Everything as written" }).tap();
  await rate(lift, "How hard was the session?", "5, hard");
  await expect(stateLine(mine.page)).toHaveText("1 entry waits for the net");

  await other.page.goto("/today");
  await card(other.page, LIFT).getByRole("button", { name: "I missed it" }).tap();
  await expect.poll(async () => (await storedLogs(campId))[0]?.state).toBe("missed");

  await mine.context.setOffline(false);
  const conflict = mine.page.getByRole("alert", { name: /^Changed on another device/ });
  await expect(conflict).toContainText("effort 5, hard");
  await expect(conflict).toContainText("Missed");
  expect((await storedLogs(campId))[0]?.state).toBe("missed");
  await conflict.getByRole("button", { name: "Keep mine" }).tap();
  await expect(conflict).toBeHidden();
  await expect
    .poll(async () => (await sessionOf(mine.context, LIFT)).log)
    .toMatchObject({
      state: "open",
      effort: 5,
      version: 2,
    });

  await mine.context.setOffline(true);
  await rate(lift, "How hard was the session?", "4, somewhat hard");
  await expect(stateLine(mine.page)).toHaveText("1 entry waits for the net");
  await other.page.reload();
  const theirs = card(other.page, LIFT);
  await rate(theirs, "How hard was the session?", "9");
  await expect.poll(async () => (await storedLogs(campId))[0]?.version).toBe(3);
  await mine.context.setOffline(false);
  await conflict.getByRole("button", { name: "Take theirs" }).tap();
  await expect(stateLine(mine.page)).toHaveText(/^Saved/);
  await expect(lift.getByRole("radio", { name: "9", exact: true })).toBeChecked();
  expect((await storedLogs(campId))[0]?.version).toBe(3);
  await mine.context.close();
  await other.context.close();
});

test("the page has a manifest to install by, and axe finds nothing in light and dark", async ({
  browser,
}) => {
  const { phone } = await athleteDay(browser);
  const { page, context } = await phone();
  await page.goto("/today");
  const href = await page.locator('link[rel="manifest"]').getAttribute("href");
  const answer = await context.request.get(href ?? "");
  expect(await answer.json()).toMatchObject({ start_url: "/today", display: "standalone" });
  for (const icon of ((await answer.json()) as { icons: { src: string }[] }).icons)
    expect((await context.request.get(icon.src)).headers()["content-type"]).toBe("image/png");

  await card(page, LIFT).getByRole("button", { name: "Start and log" }).tap();
  await card(page, LIFT).getByRole("button", { name: "Set 1 done" }).tap();
  await card(page, SPARRING).getByRole("button", { name: "Log it" }).tap();
  await card(page, SPARRING).getByRole("button", { name: "Took a knock to the head" }).tap();
  for (const colorScheme of ["light", "dark"] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: "reduce" });
    await page.evaluate(() => document.fonts.ready.then(() => null));
    const { violations } = await new AxeBuilder({ page }).setLegacyMode().analyze();
    expect
      .soft(violations.flatMap(({ id, nodes }) => nodes.map(({ html }) => `${colorScheme} ${id}: ${html}`)))
      .toEqual([]);
  }
  await context.close();
});
