import { isPreview, planBook, previewChange } from "@/lib/book";
import { isoFromDay } from "@/lib/engine";
import type { Day, Instant } from "@/lib/engine/types";
import { WARM_RUNS } from "@/components/camp/warm";
import { campBook } from "../factories/camp-book";

const NOW = (Date.parse("2026-11-20T12:00:00Z") / 60_000) as Instant;

/** Milliseconds of each preview: every sparring day of the camp, moved one and two days on. */
function benchPreview(): number[] {
  const book = campBook();
  const standing = { book, plan: planBook(book, NOW).plan };
  const sparring = planBook(book, NOW).input.sport.filter(
    (session) => session.kind === "hard-sparring" && session.day > NOW / 1440 + 1,
  );
  const times: number[] = [];
  const move = (id: string, day: number): void => {
    const start = performance.now();
    const result = previewChange(
      standing,
      { kind: "sport.edit", sportId: id, scope: "this", values: { date: isoFromDay(day as Day) } },
      NOW,
    );
    times.push(performance.now() - start);
    if (!isPreview(result)) throw new Error(result.problems[0]?.message);
  };
  // What the camp page does in idle moments before anybody drags.
  const lift = standing.plan.lifts.at(-1);
  for (let run = 0; run < WARM_RUNS && lift; run++)
    previewChange(standing, { kind: "lift.factor", liftId: lift.id, factor: 1 }, NOW);
  for (let round = 0; round < 12; round++) {
    for (const session of sparring) for (const ahead of [1, 2]) move(session.id, session.day + ahead);
  }
  return times;
}

Object.assign(globalThis, { benchPreview });
