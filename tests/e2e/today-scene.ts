import { expect, type Browser, type BrowserContext, type Locator, type Page } from "@playwright/test";
import { and, asc, eq, gt } from "drizzle-orm";
import { openDatabase } from "@/db/client";
import { sessionLogs, sessions } from "@/db/schema";
import type { CampForm } from "@/lib/schemas/camp";
import type { DaySession, TodayView } from "@/lib/schemas/today";
import { browserTestServer } from "../setup/e2e";
import { signInBy } from "./session";
import { dateAhead, freshTeam, PASSWORD, ZONE } from "./team-scene";

export const LIFT = "Lift of today";
export const SPARRING = "Sparring of today";
/** In five days. */
export const PADS = "Pads";

const withDatabase = async <T>(
  work: (db: ReturnType<typeof openDatabase>["db"]) => Promise<T>,
): Promise<T> => {
  const { db, sql } = openDatabase(browserTestServer().databaseUrl, { max: 1 });
  try {
    return await work(db);
  } finally {
    await sql.end();
  }
};

const single = (title: string, kind: CampForm["sport"][number]["kind"], start: string) => ({
  kind,
  title,
  start,
  minutes: 60,
  effort: kind === "hard-sparring" ? 8 : 4,
  place: "Mat room",
  rrule: null,
  exdate: [],
});

/** A camp of 6 weeks with its bout in 38 days, a hard sparring that began just after midnight, and pads in five days. */
async function campWithToday(head: BrowserContext, athleteId: string): Promise<string> {
  const form: CampForm = {
    athlete: { id: athleteId },
    homeZone: ZONE,
    bout: {
      date: dateAhead(38),
      time: "20:30",
      timeZone: ZONE,
      place: "Ellery Hall",
      opponent: "Petra Holm-Aziz",
      ruleset: "Kickboxing",
      rounds: 3,
      roundMinutes: 3,
      limitKg: 60,
    },
    weeks: 6,
    weighIn: { date: dateAhead(37), time: "11:00" },
    facts: {
      trainingAge: "intermediate",
      strikingBase: "whipping-round-kicks",
      liftsPerWeek: 3,
      freeHours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({ weekday, from: "09:00", to: "21:00" })),
    },
    sport: [
      single(SPARRING, "hard-sparring", `${dateAhead(0)}T00:05`),
      single(PADS, "skill", `${dateAhead(5)}T18:00`),
    ],
  };
  const answer = await head.request.post("/api/camps", { data: form });
  expect(answer.status(), await answer.text()).toBe(201);
  return ((await answer.json()) as { id: string }).id;
}

/**
 * Puts the camp's next lift on today, begun a minute ago: whether the engine places one on this day depends on the hour at
 * which the test runs.
 */
const liftToday = (campId: string): Promise<void> =>
  withDatabase(async (db) => {
    const now = new Date();
    const [next] = await db
      .select({ id: sessions.id })
      .from(sessions)
      .where(and(eq(sessions.campId, campId), eq(sessions.source, "lift"), gt(sessions.startsAt, now)))
      .orderBy(asc(sessions.startsAt))
      .limit(1);
    if (!next) throw new Error("The camp has no lift ahead.");
    await db
      .update(sessions)
      .set({
        title: LIFT,
        day: dateAhead(0),
        start: "00:10",
        startsAt: new Date(now.getTime() - 60_000),
        endsAt: now,
      })
      .where(and(eq(sessions.campId, campId), eq(sessions.id, next.id)));
  });

/** How many logs the camp has, and the versions they reached. */
export const storedLogs = (campId: string) =>
  withDatabase((db) =>
    db
      .select({ version: sessionLogs.version, state: sessionLogs.state })
      .from(sessionLogs)
      .where(eq(sessionLogs.campId, campId)),
  );

/**
 * An athlete with a sparring and, where wanted, a lift today; each phone is a session of its own. The lift lies where no plan
 * has it, so leave it out where the camp is planned again.
 */
export async function athleteDay(browser: Browser, { lift = true } = {}) {
  const team = await freshTeam(browser);
  const head = await team.pageOf("head");
  const campId = await campWithToday(head.context(), team.athlete.id);
  await head.context().close();
  if (lift) await liftToday(campId);
  const phone = async (): Promise<{ page: Page; context: BrowserContext }> => {
    const context = await browser.newContext({
      viewport: { width: 390, height: 844 },
      hasTouch: true,
      isMobile: true,
      timezoneId: ZONE,
    });
    await signInBy(context.request, team.email("athlete"), PASSWORD);
    return { page: await context.newPage(), context };
  };
  return { campId, phone };
}

export const readDay = async (context: BrowserContext): Promise<TodayView> =>
  (await (await context.request.get("/api/today")).json()) as TodayView;

export async function sessionOf(context: BrowserContext, title: string): Promise<DaySession> {
  const found = (await readDay(context)).days
    .flatMap((day) => day.sessions)
    .find((session) => session.title === title);
  if (!found) throw new Error(`There is no ${title}.`);
  return found;
}

/** The sheet of the column under this heading. */
export const card = (page: Page, heading: string): Locator =>
  page
    .locator("section")
    .filter({ has: page.getByRole("heading", { level: 2, name: heading, exact: true }) });

export const stateLine = (page: Page): Locator => page.locator("p[role=status]").first();

/** One square of a scale. */
export const rate = (where: Locator | Page, group: string, name: string): Promise<void> =>
  where.getByRole("group", { name: group }).getByRole("radio", { name, exact: true }).check();

/** Opens the page and waits until it would open without a net. */
export async function openForBasement(page: Page): Promise<void> {
  await page.goto("/today");
  await expect(page.locator('[data-opens="true"]')).toBeVisible();
}
