import AxeBuilder from "@axe-core/playwright";
import { expect, test, type Page } from "@playwright/test";
import { isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { CampForm } from "@/lib/schemas/camp";
import type { BoardView } from "@/lib/schemas/board";
import { readCamp, signInAs } from "./camp-scene";

const TODAY = Math.floor(Date.now() / 86_400_000) as Day;
const date = (offset: number): string => isoFromDay((TODAY + offset) as Day);

/** A camp of 6 weeks that is half over, for an athlete of its own; invented. */
const form = (name: string, out: number): CampForm => ({
  athlete: { name },
  homeZone: "Europe/Lisbon",
  bout: {
    date: date(out),
    time: "20:30",
    timeZone: "Europe/Lisbon",
    place: "Ellery Hall",
    opponent: "Petra Holm-Aziz",
    ruleset: "Kickboxing",
    rounds: 3,
    roundMinutes: 3,
    limitKg: null,
  },
  weeks: 6,
  weighIn: null,
  facts: {
    trainingAge: "intermediate",
    liftsPerWeek: 3,
    strikingBase: "whipping-round-kicks",
    freeHours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({ weekday, from: "10:00", to: "20:00" })),
  },
  sport: [
    {
      kind: "skill",
      title: "Pads",
      start: `${date(-14)}T07:00`,
      minutes: 60,
      effort: 4,
      place: "",
      rrule: "FREQ=DAILY;COUNT=14",
      exdate: [],
    },
  ],
});

async function makeCamp(page: Page, name: string, out: number): Promise<string> {
  const answer = await page.request.post("/api/camps", { data: form(name, out) });
  expect(answer.status()).toBe(201);
  return ((await answer.json()) as { id: string }).id;
}

/** Two sessions that felt four points harder than planned: a change is on offer. */
async function hardTwice(page: Page, campId: string): Promise<void> {
  const { sport } = await readCamp(page.request, campId);
  for (const back of [2, 1]) {
    const session = sport.find(({ day, title }) => day === TODAY - back && title === "Pads");
    const answer = await page.request.put(
      `/api/camps/${campId}/sessions/${encodeURIComponent(session?.id ?? "")}/log`,
      {
        data: {
          key: crypto.randomUUID(),
          baseVersion: 0,
          log: {
            state: "done",
            effort: 9,
            minutes: 60,
            hardRounds: null,
            knock: false,
            painPlace: "",
            pain: null,
            note: "",
            sets: [],
          },
        },
      },
    );
    expect(answer.ok()).toBe(true);
  }
}

const list = (page: Page) => page.getByRole("list", { name: "Athletes in camp" });
const link = (page: Page, name: string) => list(page).getByRole("link", { name, exact: true });
const rowOf = (page: Page, name: string) =>
  list(page)
    .locator(":scope > li")
    .filter({ has: page.getByRole("link", { name, exact: true }) });
const inAddress = (page: Page, name: string) => expect.poll(() => new URL(page.url()).searchParams.get(name));
const unique = (name: string): string => `${name} ${crypto.randomUUID().slice(0, 8)}`;

test.beforeEach(async ({ context }) => {
  await signInAs(context, "head");
});

test("search, filters and order narrow the board and stand in the address bar", async ({ page }) => {
  const mark = crypto.randomUUID().slice(0, 8);
  await makeCamp(page, `Anouk ${mark}`, 20);
  await makeCamp(page, `Birger ${mark}`, 4);
  await page.goto(`/board?find=${mark}`);
  await expect(page.getByLabel("Find")).toHaveValue(mark);
  await expect(list(page).getByRole("heading", { level: 2 })).toHaveText([/^Birger/, /^Anouk/]);

  await page.getByLabel("Order").selectOption("name");
  await inAddress(page, "sort").toBe("name");
  await expect(list(page).getByRole("heading", { level: 2 })).toHaveText([/^Anouk/, /^Birger/]);

  await page.getByRole("checkbox", { name: "In fight week" }).check();
  await inAddress(page, "only").toBe("fight-week");
  await expect(list(page).getByRole("heading", { level: 2 })).toHaveText([/^Birger/]);
  await page.reload();
  await expect(page.getByRole("checkbox", { name: "In fight week" })).toBeChecked();
  await expect(list(page).getByRole("heading", { level: 2 })).toHaveText([/^Birger/]);

  await page.getByRole("checkbox", { name: "On a hold" }).check();
  await expect(page.getByText("Nobody is left")).toBeVisible();
  await page.getByRole("button", { name: "Show everyone" }).click();
  await expect(list(page)).toBeVisible();
  await inAddress(page, "only").toBeNull();
});

test("arrow keys walk the rows and Enter opens the camp", async ({ page }) => {
  const mark = crypto.randomUUID().slice(0, 8);
  await makeCamp(page, `Anouk ${mark}`, 20);
  const near = await makeCamp(page, `Birger ${mark}`, 4);
  await page.goto(`/board?find=${mark}`);
  await expect(list(page).getByRole("heading", { level: 2 })).toHaveCount(2);
  await page.getByLabel("Find").focus();
  await page.keyboard.press("ArrowDown");
  await expect(link(page, `Birger ${mark}`)).toBeFocused();
  await page.keyboard.press("ArrowDown");
  await expect(link(page, `Anouk ${mark}`)).toBeFocused();
  await page.keyboard.press("ArrowDown");
  await expect(link(page, `Anouk ${mark}`)).toBeFocused();
  await page.keyboard.press("Home");
  await expect(link(page, `Birger ${mark}`)).toBeFocused();
  await page.keyboard.press("Enter");
  await page.waitForURL(`**/camps/${near}`);
});

test("a suggestion is shown with its effect, accepted, and put back", async ({ page }) => {
  const name = unique("Cato");
  const id = await makeCamp(page, name, 21);
  await hardTwice(page, id);
  const before = await readCamp(page.request, id);
  await page.goto(`/board?find=${encodeURIComponent(name)}`);
  await rowOf(page, name)
    .getByRole("link", { name: /suggestion/ })
    .click();
  await page.waitForURL(`**/camps/${id}#waiting`);
  const card = page
    .getByRole("region", { name: "Waiting for you" })
    .getByRole("listitem")
    .filter({ has: page.getByRole("heading", { name: "Sport felt harder than planned, twice running" }) });
  await expect(card).toContainText("Foster et al. 2001");
  await expect(card).toContainText(/Lowers \d+ sessions? by 20 %: \d+ to \d+ sets until/);
  expect((await readCamp(page.request, id)).revision).toBe(before.revision);

  await card.getByLabel("Reason or note").fill("Rough week at work.");
  await card.getByRole("button", { name: "Accept" }).click();
  await expect(page.getByText(/^Accepted\./)).toBeVisible();
  await expect(card).toHaveCount(0);
  await expect.poll(async () => (await readCamp(page.request, id)).book.responses.length).toBe(1);
  await page.getByText("Decided before").click();
  await expect(page.getByText(/accepted by .* “Rough week at work\.”/)).toBeVisible();

  await page.getByRole("button", { name: "Put back" }).first().click();
  await expect.poll(async () => (await readCamp(page.request, id)).book.responses.length).toBe(0);
});

test("dismissing asks for a reason and leaves the plan as it is", async ({ page }) => {
  const name = unique("Dagny");
  const id = await makeCamp(page, name, 21);
  await hardTwice(page, id);
  const { revision } = await readCamp(page.request, id);
  await page.goto(`/camps/${id}#waiting`);
  const card = page
    .getByRole("region", { name: "Waiting for you" })
    .getByRole("listitem")
    .filter({ has: page.getByRole("heading", { name: "Sport felt harder than planned, twice running" }) });
  await card.getByRole("button", { name: "Dismiss" }).click();
  await expect(card.getByText("Say why, in a few words.")).toBeVisible();
  await card.getByLabel("Reason or note").fill("Knew it beforehand.");
  await card.getByRole("button", { name: "Dismiss" }).click();
  await expect(page.getByText("Dismissed. The plan stays as it is.")).toBeVisible();
  await expect(card).toHaveCount(0);
  expect((await readCamp(page.request, id)).revision).toBe(revision);
});

test("on a phone the board is one column without sideways scrolling, and clean for assistive technology", async ({
  page,
}) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto("/board");
  await expect(list(page)).toBeVisible();
  const wide = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  expect(wide).toBeLessThanOrEqual(0);
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html ?? ""}`)).toEqual([]);
});

test("skills coach and medic see the board without what is not theirs", async ({ browser }) => {
  for (const role of ["skills", "medic"] as const) {
    const context = await browser.newContext();
    await signInAs(context, role);
    const { rows } = (await (await context.request.get("/api/board")).json()) as BoardView;
    expect(rows.length).toBeGreaterThan(0);
    const kinds = new Set(rows.flatMap(({ flags }) => flags.map(({ kind }) => kind)));
    for (const kind of ["weight", "load", "missed", "request", "suggestions"] as const)
      expect([...kinds]).not.toContain(kind);
    if (role === "skills") expect([...kinds]).not.toContain("check-in");
    const page = await context.newPage();
    await page.goto("/board");
    await expect(list(page)).toBeVisible();
    await context.close();
  }
});
