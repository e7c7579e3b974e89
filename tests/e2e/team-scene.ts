import { randomUUID } from "node:crypto";
import { hash } from "@node-rs/argon2";
import { expect, type Browser, type BrowserContext, type Page } from "@playwright/test";
import { openDatabase } from "@/db/client";
import { athletes, memberships, teams, users } from "@/db/schema";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { ROLES, type Role } from "@/lib/policy/roles";
import type { CampForm, CampView, SaveAnswer } from "@/lib/schemas/camp";
import type { Change } from "@/lib/schemas/change";
import { browserTestServer } from "../setup/e2e";
import { signInBy } from "./session";

export const PASSWORD = "a password for tests";
export const ZONE = "Europe/Lisbon";

const first = <T>(rows: readonly T[]): T => {
  const [row] = rows;
  if (row === undefined) throw new Error("Nothing was inserted.");
  return row;
};

const FACTS = {
  trainingAge: "intermediate",
  strikingBase: "whipping-round-kicks",
  liftsPerWeek: 3,
  freeHours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({ weekday, from: "09:00", to: "21:00" })),
} as const satisfies CampForm["facts"];

async function insertTeam(key: string) {
  const { db, sql } = openDatabase(browserTestServer().databaseUrl, { max: 1 });
  try {
    return await db.transaction(async (tx) => {
      const { id: teamId } = first(
        await tx
          .insert(teams)
          .values({ name: `Gym ${key}`, timeZone: ZONE })
          .returning(),
      );
      const athlete = first(
        await tx
          .insert(athletes)
          .values({ teamId, name: `Fighter ${key}`, ...FACTS })
          .returning(),
      );
      // Cheap on purpose: the test is not about the cost of a guess, and the server reads it from the string.
      const passwordHash = await hash(PASSWORD, { memoryCost: 1024, timeCost: 1, parallelism: 1 });
      const people = await tx
        .insert(users)
        .values(
          ROLES.map((role) => ({
            name: `${role} of ${key}`,
            email: `${role}-${key}@gym.example`,
            passwordHash,
            timeZone: ZONE,
            currentTeamId: teamId,
          })),
        )
        .returning();
      await tx.insert(memberships).values(
        people.map(({ id: userId, email }) => {
          const role = ROLES.find((candidate) => email.startsWith(`${candidate}-`)) ?? "guest";
          const tied = role === "athlete" || role === "guest";
          return { teamId, userId, role, athleteId: tied ? athlete.id : null };
        }),
      );
      return { athlete: { id: athlete.id, name: athlete.name } };
    });
  } finally {
    await sql.end();
  }
}

/** A team of its own for one test, one person a role; athlete and guest follow its one athlete. */
export async function freshTeam(browser: Browser) {
  const key = randomUUID().slice(0, 8);
  const { athlete } = await insertTeam(key);
  const email = (role: Role): string => `${role}-${key}@gym.example`;
  return {
    name: `Gym ${key}`,
    athlete,
    email,
    /** A page with a session of its own; the caller closes its context. */
    pageOf: async (role: Role): Promise<Page> => {
      const context = await browser.newContext();
      await signInBy(context.request, email(role), PASSWORD);
      return context.newPage();
    },
  };
}

/** So many days from today in the team's zone. */
export function dayAhead(days: number): Day {
  const today = new Intl.DateTimeFormat("en-CA", { timeZone: ZONE }).format(new Date());
  return (dayFromIso(today) + days) as Day;
}
export const dateAhead = (days: number): string => isoFromDay(dayAhead(days));

const session = (title: string, kind: CampForm["sport"][number]["kind"], days: number) => ({
  kind,
  title,
  start: `${dateAhead(days)}T18:00`,
  minutes: 60,
  effort: kind === "hard-sparring" ? 8 : 4,
  place: "Mat room",
  rrule: null,
  exdate: [],
});

/**
 * A camp of 6 weeks, its bout in 38 days: hard sparring tomorrow (within 48 h), another in 9 days and a third in 16, all
 * single sessions.
 */
export async function freshCamp(head: BrowserContext, athleteId: string): Promise<string> {
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
    facts: FACTS,
    sport: [
      session("Sparring of tomorrow", "hard-sparring", 1),
      session("Sparring of next week", "hard-sparring", 9),
      session("Sparring after that", "hard-sparring", 16),
      session("Pads", "skill", 5),
    ],
  };
  const answer = await head.request.post("/api/camps", { data: form });
  expect(answer.status()).toBe(201);
  return ((await answer.json()) as { id: string }).id;
}

/** Moves the sport session of that title and saves it, by the API from inside the page. */
export async function saveMove(
  page: Page,
  campId: string,
  title: string,
  to: { readonly date: string; readonly start: string },
): Promise<SaveAnswer> {
  const url = `/api/camps/${campId}`;
  const view = (await (await page.request.get(url)).json()) as CampView;
  const moved = view.sport.find((candidate) => candidate.title === title);
  if (!moved) throw new Error(`No session is called ${title}.`);
  const change: Change = { kind: "sport.edit", sportId: moved.id, scope: "this", values: to };
  const saved = await page.evaluate(
    async ([where, body]) => {
      const answer = await fetch(where, {
        method: "POST",
        headers: { "content-type": "application/json" },
        body,
      });
      return { status: answer.status, text: await answer.text() };
    },
    [
      `${url}/changes`,
      JSON.stringify({ change, baseRevision: view.revision, idempotencyKey: randomUUID() }),
    ] as const,
  );
  expect(saved.status, saved.text).toBe(200);
  return JSON.parse(saved.text) as SaveAnswer;
}
