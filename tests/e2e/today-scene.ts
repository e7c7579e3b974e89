import { expect, type Browser, type BrowserContext, type Locator, type Page } from "@playwright/test";
import { and, asc, eq, gt } from "drizzle-orm";
import { openDatabase } from "@/db/client";
import { sessionLogs, sessions } from "@/db/schema";
import type { DaySession, TodayView } from "@/lib/schemas/today";
import { browserTestServer } from "../setup/e2e";
import { signInBy } from "./session";
import { dateAhead, freshCamp, freshTeam, PASSWORD } from "./team-scene";

export const LIFT = "Lift of today";
export const SPARRING = "Sparring of today";
/** In five days, not moved. */
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

/**
 * Puts the camp's next lift and its next hard sparring on today, begun a minute ago: where the engine would place a lift
 * depends on the day of the week on which the test runs.
 */
const moveToToday = (campId: string): Promise<void> =>
  withDatabase(async (db) => {
    const now = new Date();
    for (const [source, title] of [
      ["lift", LIFT],
      ["sport", SPARRING],
    ] as const) {
      const [next] = await db
        .select({ id: sessions.id })
        .from(sessions)
        .where(and(eq(sessions.campId, campId), eq(sessions.source, source), gt(sessions.startsAt, now)))
        .orderBy(asc(sessions.startsAt))
        .limit(1);
      if (!next) throw new Error(`The camp has no ${source} ahead.`);
      await db
        .update(sessions)
        .set({
          title,
          day: dateAhead(0),
          start: "00:10",
          startsAt: new Date(now.getTime() - 60_000),
          endsAt: now,
        })
        .where(and(eq(sessions.campId, campId), eq(sessions.id, next.id)));
    }
  });

/** How many logs the camp has, and the versions they reached. */
export const storedLogs = (campId: string) =>
  withDatabase((db) =>
    db
      .select({ version: sessionLogs.version, state: sessionLogs.state })
      .from(sessionLogs)
      .where(eq(sessionLogs.campId, campId)),
  );

/** An athlete with a lift and a sparring today; each phone is a session of its own. */
export async function athleteDay(browser: Browser) {
  const team = await freshTeam(browser);
  const head = await team.pageOf("head");
  const campId = await freshCamp(head.context(), team.athlete.id);
  await head.context().close();
  await moveToToday(campId);
  const phone = async (): Promise<{ page: Page; context: BrowserContext }> => {
    const context = await browser.newContext({
      viewport: { width: 390, height: 844 },
      hasTouch: true,
      isMobile: true,
      timezoneId: "Europe/Lisbon",
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
  page.locator("section").filter({ has: page.getByRole("heading", { level: 2, name: heading }) });

export const stateLine = (page: Page): Locator => page.locator("p[role=status]").first();

/** One square of a scale. */
export const rate = (where: Locator | Page, group: string, name: string): Promise<void> =>
  where.getByRole("group", { name: group }).getByRole("radio", { name, exact: true }).check();

/** Opens the page and waits until it would open without a net. */
export async function openForBasement(page: Page): Promise<void> {
  await page.goto("/today");
  await expect(page.locator('[data-opens="true"]')).toBeVisible();
}
