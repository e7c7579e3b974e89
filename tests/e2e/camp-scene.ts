import {
  expect,
  type APIRequestContext,
  type BrowserContext,
  type Locator,
  type Page,
} from "@playwright/test";
import { isoFromDay, weekdayOf } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { Role } from "@/lib/policy";
import type { CampForm, CampView } from "@/lib/schemas/camp";
import type { Change } from "@/lib/schemas/change";
import demo from "../../db/seed/accounts.json" with { type: "json" };

/** Signs a demo account in without the form; the context's pages then hold its session. */
export async function signInAs(context: BrowserContext, role: Role): Promise<void> {
  const account = demo.accounts.find((candidate) => candidate.role === role);
  if (!account) throw new Error(`There is no demo account for ${role}.`);
  const { csrfToken } = (await (await context.request.get("/api/auth/csrf")).json()) as { csrfToken: string };
  const answer = await context.request.post("/api/auth/callback/credentials", {
    form: { csrfToken, email: account.email, password: demo.password, json: "true" },
  });
  expect(answer.ok()).toBe(true);
}

const SATURDAY = 6;
const today = (): Day => Math.floor(Date.now() / 86_400_000) as Day;

/** A camp of 8 weeks to a Saturday, its first day ahead of today: nothing in it is past. */
export interface TestCamp {
  readonly id: string;
  readonly boutDay: Day;
  /** Date of the hard sparring so many weeks before the bout, a Saturday. */
  readonly saturday: (weeksBefore: number) => Day;
}

const EVERY_DAY = [1, 2, 3, 4, 5, 6, 7];

function formFor(boutDay: Day, name: string): CampForm {
  const on = (weekday: number): string => {
    const first = (boutDay - 55) as Day;
    return isoFromDay((first + ((weekday - weekdayOf(first) + 7) % 7)) as Day);
  };
  const until = isoFromDay((boutDay - 10) as Day).replaceAll("-", "");
  const hard = {
    kind: "hard-sparring",
    title: "Hard sparring",
    minutes: 60,
    effort: 8,
    place: "",
    rrule: `FREQ=WEEKLY;UNTIL=${until}T235900Z`,
  } as const;
  return {
    athlete: { name },
    homeZone: "Europe/Lisbon",
    bout: {
      date: isoFromDay(boutDay),
      time: "20:30",
      timeZone: "Europe/Lisbon",
      place: "Ellery Hall",
      opponent: "Petra Holm-Aziz",
      ruleset: "Kickboxing",
      rounds: 3,
      roundMinutes: 3,
      limitKg: 60,
    },
    weeks: 8,
    weighIn: { date: isoFromDay((boutDay - 1) as Day), time: "11:00" },
    facts: {
      trainingAge: "intermediate",
      liftsPerWeek: 3,
      strikingBase: "whipping-round-kicks",
      freeHours: EVERY_DAY.map((weekday) => ({ weekday, from: "10:00", to: "20:00" })),
    },
    sport: [
      { ...hard, start: `${on(2)}T18:00`, exdate: [] },
      { ...hard, start: `${on(6)}T11:00`, exdate: [] },
      { ...hard, kind: "skill", title: "Pads", effort: 4, start: `${on(1)}T18:00`, exdate: [] },
    ],
  };
}

/** Lays out a camp of its own for a test, so that tests do not meet in one. The context must be the head coach's. */
export async function makeCamp(request: APIRequestContext, name: string): Promise<TestCamp> {
  const soonest = (today() + 57) as Day;
  const boutDay = (soonest + ((SATURDAY - weekdayOf(soonest) + 7) % 7)) as Day;
  const answer = await request.post("/api/camps", { data: formFor(boutDay, name) });
  expect(answer.status()).toBe(201);
  const { id } = (await answer.json()) as { id: string };
  return { id, boutDay, saturday: (weeks) => (boutDay - 7 * weeks) as Day };
}

export const readCamp = async (request: APIRequestContext, id: string): Promise<CampView> =>
  (await (await request.get(`/api/camps/${id}`)).json()) as CampView;

/** Saves a change as another coach would, without a page. */
export async function saveElsewhere(request: APIRequestContext, id: string, change: Change): Promise<void> {
  const { revision } = await readCamp(request, id);
  const answer = await request.post(`/api/camps/${id}/changes`, {
    data: { change, baseRevision: revision, idempotencyKey: crypto.randomUUID() },
  });
  expect(answer.ok()).toBe(true);
}

export async function openCamp(page: Page, id: string): Promise<void> {
  await page.goto(`/camps/${id}`);
  await expect(page.getByRole("button", { name: /^Hard sparring/ }).first()).toBeVisible();
}

export const cellOf = (page: Page, day: Day): Locator => page.locator(`td[data-date="${isoFromDay(day)}"]`);
export const sessionOn = (page: Page, day: Day, title: string): Locator =>
  cellOf(page, day).getByRole("button", { name: new RegExp(`^${title}`) });
export const ghostOn = (page: Page, day: Day, title: string): Locator =>
  cellOf(page, day).getByText(`${title}, stood here before`);
export const rail = (page: Page): Locator => page.getByRole("region", { name: "Knock-on" });

/** Drags a session to another day by mouse and lets it go there. */
export async function dragTo(page: Page, session: Locator, day: Day): Promise<void> {
  await session.scrollIntoViewIfNeeded();
  const target = cellOf(page, day);
  const [from, to] = [await session.boundingBox(), await target.boundingBox()];
  if (!from || !to) throw new Error("Nothing to drag, or nowhere to drag it.");
  await page.mouse.move(from.x + 20, from.y + from.height / 2);
  await page.mouse.down();
  await page.mouse.move(from.x + 32, from.y + from.height / 2 + 8, { steps: 4 });
  await page.mouse.move(to.x + to.width / 2, to.y + to.height / 2, { steps: 10 });
}

const longDay = new Intl.DateTimeFormat("en-GB", { weekday: "long", day: "numeric", timeZone: "UTC" });
/** "Saturday 5". */
export const dayName = (day: Day): string => longDay.format(new Date(day * 86_400_000));
