import { expect, test, type Page } from "@playwright/test";
import type { Role } from "@/lib/policy";
import type { CampSummary } from "@/lib/schemas/camp";
import { apiStatus, demoPage } from "./session";
import { freshTeam } from "./team-scene";

// What product.md says of the six roles, written out a second time on purpose: not read from the policy table.

// Nothing here changes what others see.
test.describe.configure({ mode: "parallel" });

/** Of the demo team: Tamsin's camp is the athlete's own and the one that the guest follows. */
interface Demo {
  readonly own: CampSummary;
  readonly other: CampSummary;
  /** On a hold, whose reason is the medic's. */
  readonly held: CampSummary;
}
let demo: Demo;

test.beforeAll(async ({ browser }) => {
  const page = await demoPage(browser, "medic");
  const { camps } = (await (await page.request.get("/api/camps")).json()) as { camps: CampSummary[] };
  const of = (name: string): CampSummary => {
    const camp = camps.find((candidate) => candidate.athlete.name === name);
    if (!camp) throw new Error(`The demo has no camp of ${name}.`);
    return camp;
  };
  demo = { own: of("Tamsin Velloso"), other: of("Idris Calloway"), held: of("Bram Achterberg") };
  await page.context().close();
});

interface Sees {
  readonly nav: readonly string[];
  readonly pages: readonly string[];
  readonly missing: readonly string[];
}
const NAV = ["Board", "Camps", "Athletes", "Timetable", "Exercises", "House rules"];
const COACH = [
  "/board",
  "/camps",
  "/camps/new",
  "/athletes",
  "/athletes/new",
  "/timetable",
  "/exercises/new",
  "/house-rules",
];
const STAFF_PAGES = [
  "/board",
  "/camps",
  "/athletes",
  "/timetable",
  "/exercises",
  "/settings",
  "OWN",
  "OTHER",
  "OWN/changes",
];
const PLANNING = ["/camps/new", "/athletes/new", "/exercises/new", "/house-rules"];

const SEES: Record<Role, Sees> = {
  head: { nav: NAV, pages: [...COACH, ...STAFF_PAGES], missing: [] },
  strength: { nav: NAV, pages: [...COACH, ...STAFF_PAGES], missing: [] },
  skills: { nav: NAV.slice(0, 5), pages: STAFF_PAGES, missing: PLANNING },
  medic: { nav: NAV.slice(0, 5), pages: STAFF_PAGES, missing: PLANNING },
  athlete: {
    nav: ["Today", "Camps", "My page"],
    pages: ["/today", "OWN", "OWN-ATHLETE", "/settings"],
    missing: [
      ...PLANNING,
      "/timetable",
      "/exercises",
      "OTHER",
      "OTHER-ATHLETE",
      "OWN/changes",
      "OTHER/changes",
    ],
  },
  guest: {
    nav: ["Camps"],
    pages: ["OWN", "/settings"],
    missing: [
      ...PLANNING,
      "/timetable",
      "/exercises",
      "/athletes",
      "OTHER",
      "OWN-ATHLETE",
      "OTHER-ATHLETE",
      "OWN/changes",
    ],
  },
};

const pathOf = (path: string): string =>
  path
    .replace("OWN-ATHLETE", `/athletes/${demo.own.athlete.id}`)
    .replace("OTHER-ATHLETE", `/athletes/${demo.other.athlete.id}`)
    .replace("OWN", `/camps/${demo.own.id}`)
    .replace("OTHER", `/camps/${demo.other.id}`);

const NOTHING = /^There is (nothing at this address|no such camp|no such athlete)$/;
const heading = (page: Page) => page.getByRole("heading", { level: 1 });

for (const [role, { nav, pages, missing }] of Object.entries(SEES) as [Role, Sees][]) {
  test(`${role}: the bar leads to what the role has; what it has not is as missing as what does not exist`, async ({
    browser,
  }) => {
    const page = await demoPage(browser, role);
    await page.goto("/settings");
    const bar = page.getByRole("navigation", { name: "Main", exact: true });
    expect(await bar.getByRole("link").allInnerTexts()).toEqual(nav);
    // As the server answers them: six roles times every page need no drawing.
    for (const path of pages.map(pathOf)) {
      const answer = await page.request.get(path);
      expect(answer.status(), path).toBe(200);
      expect(new URL(answer.url()).pathname, path).toBe(path);
    }
    for (const path of missing.map(pathOf)) expect((await page.request.get(path)).status(), path).toBe(404);
    const [absent] = missing.map(pathOf);
    if (absent) {
      await page.goto(absent);
      await expect(heading(page), absent).toHaveText(NOTHING);
    }
    await page.context().close();
  });
}

test("the first page of an athlete is their day, that of a guest the one camp they follow", async ({
  browser,
}) => {
  const guest = await demoPage(browser, "guest");
  await guest.goto("/board");
  await expect(heading(guest)).toContainText("Tamsin Velloso");
  expect(new URL(guest.url()).pathname).toBe(`/camps/${demo.own.id}`);
  await guest.context().close();
  const athlete = await demoPage(browser, "athlete");
  await athlete.goto("/board");
  expect(new URL(athlete.url()).pathname).toBe("/today");
  await athlete.goto("/camps");
  expect(new URL(athlete.url()).pathname).toBe(`/camps/${demo.own.id}`);
  await athlete.goto("/athletes");
  expect(new URL(athlete.url()).pathname).toBe(`/athletes/${demo.own.athlete.id}`);
  await athlete.context().close();
});

/** What stands on the camp page, by what it is for. */
const CONTROLS = {
  bout: (page: Page) => page.getByRole("button", { name: "Change the bout" }),
  add: (page: Page) => page.getByRole("button", { name: "Add a session", exact: true }),
  changes: (page: Page) => page.getByRole("link", { name: "Changes", exact: true }),
  weight: (page: Page) => page.getByRole("region", { name: "Ropes" }).getByText(/kg to 60\.0/),
  weeks: (page: Page) => page.getByText("The weeks in numbers"),
} as const;
type Control = keyof typeof CONTROLS;

const HAS: Record<Role, readonly Control[]> = {
  head: ["bout", "add", "changes", "weight", "weeks"],
  strength: ["add", "changes", "weight", "weeks"],
  skills: ["add", "changes", "weeks"],
  medic: ["changes", "weeks"],
  athlete: ["weight", "weeks"],
  guest: [],
};

for (const [role, has] of Object.entries(HAS) as [Role, readonly Control[]][]) {
  test(`${role}: the camp page has the controls of the role and no others`, async ({ browser }) => {
    const page = await demoPage(browser, role);
    await page.goto(`/camps/${demo.own.id}`);
    await expect(page.getByRole("button", { name: /^Hard sparring/ }).first()).toBeVisible();
    for (const control of Object.keys(CONTROLS) as Control[])
      await expect(CONTROLS[control](page), control).toHaveCount(has.includes(control) ? 1 : 0);

    // A lifting session ahead: its sets for all but the guest, its pin for those who place lifting.
    const lift = page
      .locator("button[data-session]")
      .filter({ hasText: /strength|power/i })
      .last();
    await lift.click();
    const details = page.getByRole("article");
    await expect(details).toBeVisible();
    const places = role === "head" || role === "strength";
    await expect(details.getByRole("heading", { name: /^Why it has \d+ sets?$/ })).toHaveCount(
      role === "guest" ? 0 : 1,
    );
    await expect(details.getByRole("button", { name: /Pin it here|Let it go/ })).toHaveCount(places ? 1 : 0);
    await expect(details.getByLabel("Coach’s factor on the sets")).toHaveCount(places ? 1 : 0);
    await page.context().close();
  });
}

test("a guest is told no number: no sets, no effort, no load, no weight limit, on the page or in the answer", async ({
  browser,
}) => {
  const page = await demoPage(browser, "guest");
  await page.goto(`/camps/${demo.own.id}`);
  await expect(page.getByRole("button", { name: /^Hard sparring/ }).first()).toBeVisible();
  await expect(page.getByText(/\d+ (working )?sets?\b/)).toHaveCount(0);
  await expect(page.getByText(/\d AU\b/)).toHaveCount(0);
  await expect(page.getByText(/\bkg\b/)).toHaveCount(0);
  const text = await (await page.request.get(`/api/camps/${demo.own.id}`)).text();
  const { book, plan, sport } = JSON.parse(text) as {
    book: { bout: { limitKg: number | null } };
    plan: { lifts: { sets: number; reasons: unknown[] }[] };
    sport: { effort: number }[];
  };
  expect(book.bout.limitKg).toBeNull();
  expect(plan.lifts.some((lift) => lift.sets > 0 || lift.reasons.length > 0)).toBe(false);
  expect(sport.some((session) => session.effort > 0)).toBe(false);
  await page.context().close();
});

test("the reason of a hold is the medic's: coaches see the hold without it, and only the medic lifts it", async ({
  browser,
}) => {
  const path = `/athletes/${demo.held.athlete.id}`;
  for (const role of ["medic", "head", "strength", "skills"] as const) {
    const page = await demoPage(browser, role);
    await page.goto(path);
    await expect(page.getByText(/until a medic lifts it$/).first()).toBeVisible();
    const medic = role === "medic" ? 1 : 0;
    await expect(page.getByText(/Headache after sparring/)).toHaveCount(medic);
    await expect(page.getByRole("button", { name: "Set a hold" })).toHaveCount(medic);
    await expect(page.getByRole("button", { name: "Lift it" })).toHaveCount(medic);
    await expect(page.getByRole("button", { name: "Save the profile" })).toHaveCount(
      role === "head" || role === "strength" ? 1 : 0,
    );
    expect((await page.content()).includes("Headache")).toBe(role === "medic");
    await page.context().close();
  }
});

test("people are seen by staff and managed by the head coach alone; only who may writes the timetable", async ({
  browser,
}) => {
  for (const role of Object.keys(SEES) as Role[]) {
    const page = await demoPage(browser, role);
    await page.goto("/settings");
    await expect(heading(page)).toHaveText("Settings");
    const staff = role !== "athlete" && role !== "guest";
    await expect(page.getByRole("heading", { name: "People" })).toHaveCount(staff ? 1 : 0);
    await expect(page.getByRole("button", { name: "Invite someone" })).toHaveCount(role === "head" ? 1 : 0);
    if (staff) {
      await page.goto("/timetable");
      await expect(page.getByText("Clinch drills").first()).toBeVisible();
      // One a weekday.
      await expect(page.getByRole("button", { name: /^Add a session on / })).toHaveCount(
        role === "head" || role === "skills" ? 7 : 0,
      );
    }
    await page.context().close();
  }
});

const ORDER: readonly Role[] = ["head", "strength", "skills", "medic", "athlete", "guest"];
const KEY = "6f6f6f6f-1111-4222-8333-444444444444";
/** A change on a revision that never was: who may make it is told that it is stale (409), everyone else is refused. */
const stale = (change: unknown) => ({ change, baseRevision: 999_999, idempotencyKey: KEY });
const lift = { liftId: "strength-a.3" };
const sport = { sportId: "tamsin-2", scope: "this" };

/** Method, path, body, and the answer to head, strength, skills, medic, athlete, guest. An empty body is a 422 to who may. */
const CALLS: readonly [string, string, unknown, readonly number[]][] = [
  ["GET", "/api/camps/OWN-ID", undefined, [200, 200, 200, 200, 200, 200]],
  ["GET", "/api/camps/OTHER-ID", undefined, [200, 200, 200, 200, 404, 404]],
  ["GET", "/api/camps/OWN-ID/changes", undefined, [200, 200, 200, 200, 403, 403]],
  ["GET", "/api/athletes/OWN-WHO", undefined, [200, 200, 200, 200, 200, 403]],
  ["GET", "/api/athletes/OTHER-WHO", undefined, [200, 200, 200, 200, 404, 403]],
  ["GET", "/api/people", undefined, [200, 200, 200, 200, 403, 403]],
  ["GET", "/api/timetable", undefined, [200, 200, 200, 200, 403, 403]],
  ["GET", "/api/house-rules", undefined, [200, 200, 403, 403, 403, 403]],
  ["POST", "/api/camps", {}, [422, 422, 403, 403, 403, 403]],
  ["POST", "/api/athletes", {}, [422, 422, 403, 403, 403, 403]],
  ["POST", "/api/timetable", {}, [422, 403, 422, 403, 403, 403]],
  ["PUT", "/api/house-rules", {}, [422, 422, 403, 403, 403, 403]],
  ["POST", "/api/invites", {}, [422, 403, 403, 403, 403, 403]],
  ["PUT", "/api/team", {}, [422, 403, 403, 403, 403, 403]],
  ["POST", "/api/athletes/OWN-WHO/holds", {}, [403, 403, 403, 422, 403, 403]],
  ["POST", "/api/feeds", { scope: "team", discreet: true }, [201, 201, 201, 201, 403, 403]],
  ["POST", "CHANGES", stale({ kind: "bout.off" }), [409, 403, 403, 403, 403, 403]],
  ["POST", "CHANGES", stale({ kind: "sport.drop", ...sport }), [409, 409, 409, 403, 403, 403]],
  ["POST", "CHANGES", stale({ kind: "lift.factor", ...lift, factor: 1 }), [409, 409, 403, 403, 403, 403]],
  ["POST", "CHANGES", stale({ kind: "lift.release", ...lift }), [409, 409, 403, 403, 403, 403]],
  ["POST", "CHANGES", stale({ kind: "put-back", revision: 2 }), [409, 409, 403, 403, 403, 403]],
];

const apiPath = (path: string): string =>
  path
    .replace("CHANGES", `/api/camps/${demo.own.id}/changes`)
    .replace("OWN-ID", demo.own.id)
    .replace("OTHER-ID", demo.other.id)
    .replace("OWN-WHO", demo.own.athlete.id)
    .replace("OTHER-WHO", demo.other.athlete.id);

for (const [index, role] of ORDER.entries()) {
  test(`${role}: the API refuses what the role may not, whatever the page shows`, async ({ browser }) => {
    const page = await demoPage(browser, role);
    const answers: string[] = [];
    for (const [method, path, body] of CALLS)
      answers.push(`${method} ${path} ${await apiStatus(page.request, method, apiPath(path), body)}`);
    expect(answers).toEqual(CALLS.map(([method, path, , wanted]) => `${method} ${path} ${wanted[index]}`));
    await page.context().close();
  });
}

test("what belongs to another team is answered exactly as what does not exist", async ({ browser }) => {
  const team = await freshTeam(browser);
  const page = await team.pageOf("head");
  const nobody = "00000000-0000-4000-8000-000000000000";
  for (const [foreign, missing] of [
    [`/api/camps/${demo.own.id}`, `/api/camps/${nobody}`],
    [`/api/camps/${demo.own.id}/changes`, `/api/camps/${nobody}/changes`],
    [`/api/athletes/${demo.own.athlete.id}`, `/api/athletes/${nobody}`],
  ] as const) {
    const [theirs, none] = [await page.request.get(foreign), await page.request.get(missing)];
    expect([theirs.status(), await theirs.text()]).toEqual([404, await none.text()]);
    expect(none.status()).toBe(404);
  }
  for (const path of ["OWN", "OWN/changes", "OWN-ATHLETE"].map(pathOf)) {
    const answer = await page.goto(path);
    await expect(heading(page), path).toHaveText(NOTHING);
    expect(answer?.status(), path).toBe(404);
  }
  await page.context().close();
});

test("without a session every page of a team leads to the sign-in, and the API answers 401", async ({
  page,
}) => {
  for (const path of [...COACH, "/settings", pathOf("OWN"), pathOf("OWN/changes"), pathOf("OWN-ATHLETE")]) {
    const answer = await page.request.get(path);
    const { pathname, searchParams } = new URL(answer.url());
    expect([pathname, searchParams.get("next")], path).toEqual(["/sign-in", path]);
  }
  for (const [method, path, body] of CALLS)
    expect(await apiStatus(page.request, method, apiPath(path), body), path).toBe(401);
});
