import { randomUUID } from "node:crypto";
import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { camps, mails, requests } from "@/db/schema";
import { LIMITS, rateLimit } from "@/lib/auth/limits";
import { readToday } from "@/lib/services/today/read-today";
import { answerRequest, askRequest, withdrawRequest } from "@/lib/services/requests/requests";
import { testDatabase } from "../setup/database";
import { dayScene, refusal, type DayScene } from "./day-scene";

const { db } = await testDatabase();

const ask = (scene: DayScene, sid: string, key = randomUUID(), reason = "Exam until seven.") =>
  askRequest(scene.as("athlete"), { params: { id: scene.campId, sid }, body: { key, reason } });
const answer = (scene: DayScene, id: string, state: "accepted" | "declined", words = "") =>
  answerRequest(scene.as("strength"), { params: { id }, body: { state, answer: words } });
const mailsOf = async ({ team }: DayScene) => db.select().from(mails).where(eq(mails.teamId, team.id));
const rolesOf = (scene: DayScene, rows: { recipient: string }[]) =>
  rows
    .map(({ recipient }) => scene.people.find(({ email }) => email === recipient)?.name.split(" ")[0])
    .sort();

describe("I can't make it", () => {
  it("mails head and S&C coaches at once, shows in the day and changes no plan", async () => {
    const scene = await dayScene(db);
    const { id } = await scene.sessionOn("2026-12-01");
    const view = await ask(scene, id);
    expect(view).toMatchObject({ state: "asked", reason: "Exam until seven.", answer: "" });
    const sent = await mailsOf(scene);
    expect(rolesOf(scene, sent)).toEqual(["head", "strength"]);
    for (const { subject, text } of sent) {
      expect(subject).toContain("Hard sparring on Tue 1 Dec 18:00");
      expect(text).toContain("Exam until seven.");
      expect(text).toContain(`/camps/${scene.campId}`);
    }
    const today = await readToday(scene.as("athlete"));
    const session = today.days.flatMap(({ sessions }) => sessions).find((one) => one.id === id);
    expect(session?.request).toEqual(view);
    const [camp] = await db.select().from(camps).where(eq(camps.id, scene.campId));
    expect(camp?.revision).toBe(1);
  });

  it("a retry with the same key is the same request and the same mail; a second question waits for the first", async () => {
    const scene = await dayScene(db);
    const { id } = await scene.sessionOn("2026-12-01");
    const key = randomUUID();
    const first = await ask(scene, id, key);
    expect(await ask(scene, id, key)).toEqual(first);
    expect(await mailsOf(scene)).toHaveLength(2);
    expect((await refusal(ask(scene, id))).code).toBe("conflict");
    const other = await dayScene(db);
    const taken = await refusal(ask(other, (await other.sessionOn("2026-12-01")).id, key));
    expect(taken.code).toBe("conflict");
  });

  it.each([
    ["a session that has begun", "2026-11-30", "sport"],
    ["the bout", "2027-01-09", "bout"],
    ["the weigh-in", "2027-01-08", "weigh-in"],
  ] as const)("%s is refused in words", async (_, day, source) => {
    const scene = await dayScene(db);
    const { id } = await scene.sessionOn(day, source);
    expect((await refusal(ask(scene, id))).code).toBe("conflict");
  });

  it("is answered by staff, mailed to the athlete, and the same answer again changes nothing", async () => {
    const scene = await dayScene(db);
    const { id } = await ask(scene, (await scene.sessionOn("2026-12-01")).id);
    const view = await answer(scene, id, "declined", "Come for the first half.");
    expect(view).toMatchObject({ state: "declined", answer: "Come for the first half." });
    expect(await answer(scene, id, "declined", "Come for the first half.")).toEqual(view);
    const sent = (await mailsOf(scene)).filter(({ kind }) => kind === "request-answer");
    expect(rolesOf(scene, sent)).toEqual(["athlete"]);
    expect(sent[0]?.text).toContain("Come for the first half.");
    expect((await refusal(answer(scene, id, "accepted"))).code).toBe("conflict");
    const [row] = await db.select().from(requests).where(eq(requests.id, id));
    expect(row).toMatchObject({ answeredBy: scene.as("strength").userId, state: "declined" });
  });

  it("is taken back while nobody answered; then the session can be asked about again", async () => {
    const scene = await dayScene(db);
    const session = await scene.sessionOn("2026-12-01");
    const { id } = await ask(scene, session.id);
    const back = () => withdrawRequest(scene.as("athlete"), { params: { id } });
    expect(await back()).toMatchObject({ state: "withdrawn" });
    expect(await back()).toMatchObject({ state: "withdrawn" });
    expect((await refusal(answer(scene, id, "accepted"))).code).toBe("conflict");
    const again = await ask(scene, session.id);
    await answer(scene, again.id, "accepted");
    const late = withdrawRequest(scene.as("athlete"), { params: { id: again.id } });
    expect((await refusal(late)).code).toBe("conflict");
  });

  it("cannot be used to flood the coaches with mail", async () => {
    const scene = await dayScene(db);
    const { id: sid } = await scene.sessionOn("2026-12-01");
    const { points } = LIMITS["request-ask-account"];
    for (let tried = 0; tried < points; tried++)
      await rateLimit(db, "request-ask-account", scene.as("athlete").userId);
    expect((await refusal(ask(scene, sid))).code).toBe("too-many");
    expect(await mailsOf(scene)).toEqual([]);
  });

  it("only the athlete asks and takes back, only coaches answer, and a foreign request is missing", async () => {
    const [scene, other] = [await dayScene(db), await dayScene(db)];
    const { id: sid } = await scene.sessionOn("2026-12-01");
    for (const role of ["head", "medic", "guest"] as const) {
      const asked = askRequest(scene.as(role), {
        params: { id: scene.campId, sid },
        body: { key: randomUUID(), reason: "No." },
      });
      expect((await refusal(asked)).code).toBe("forbidden");
    }
    const { id } = await ask(scene, sid);
    const body = { state: "accepted", answer: "" } as const;
    for (const role of ["skills", "athlete", "guest"] as const)
      expect((await refusal(answerRequest(scene.as(role), { params: { id }, body }))).code).toBe("forbidden");
    expect((await refusal(answerRequest(other.as("head"), { params: { id }, body }))).code).toBe("not-found");
    const stranger = withdrawRequest(other.as("athlete"), { params: { id } });
    expect((await refusal(stranger)).code).toBe("not-found");
  });
});
