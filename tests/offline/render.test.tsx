import { renderToString } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { TodayPage } from "@/components/today/today-page";
import { queueOf } from "@/lib/offline/queue-store";
import { QueryProvider } from "@/lib/query/query-provider";
import type { DaySession, TodayView } from "@/lib/schemas/today";

const session = (over: Partial<DaySession>): DaySession => ({
  campId: "camp",
  id: "s1",
  source: "sport",
  kind: "hard-sparring",
  title: "Sparring",
  place: "Mat room",
  date: "2026-12-02",
  start: "18:00",
  minutes: 75,
  effort: 8,
  item: null,
  sets: null,
  prescription: null,
  lastTime: {},
  log: null,
  request: null,
  editableUntil: "2026-12-03",
  ...over,
});

const DATES = ["01", "02", "03", "04", "05", "06", "07", "08", "09"].map((day) => `2026-12-${day}`);

const view = (over: Partial<TodayView> = {}, sessions: readonly DaySession[] = []): TodayView => ({
  athlete: { id: "athlete", name: "Tamsin Velloso", minor: false },
  unit: "kg",
  today: "2026-12-02",
  madeAt: "2026-12-02T08:00:00.000Z",
  bout: { campId: "camp", date: "2027-01-09", time: "20:30", place: "Ellery Hall", limitKg: 60 },
  days: DATES.map((date) => ({
    date,
    daysOut: null,
    sessions: date === "2026-12-02" ? sessions : [],
    checkIn: null,
    kg: null,
  })),
  weight: { off: "no-limit" },
  hold: null,
  ...over,
});

const html = (given: TodayView): string =>
  renderToString(
    <QueryProvider>
      <TodayPage initial={given} userId="user" />
    </QueryProvider>,
  ).replaceAll("<!-- -->", "");

describe("the athlete's page as the server renders it", () => {
  it("needs no browser: no database is opened and nobody's queue is kept", () => {
    expect(html(view())).toContain("Nothing is planned.");
    expect(queueOf("user")).not.toBe(queueOf("user"));
  });

  it("shows days out, the bout and what there is to do", () => {
    const page = html(view({}, [session({})]));
    for (const text of ["38", "Sat 9 Jan, 20:30", "60 kg · Ellery Hall", "18:00 to 19:15", "Log it"])
      expect(page).toContain(text);
  });

  it("shows a minor the reason and neither line nor input", () => {
    const minor = html(view({ weight: { off: "minor" } }));
    expect(minor).toContain("switched off for an athlete under 18");
    expect(minor).not.toContain("Weight this morning");
  });

  it("shows nothing of weight without a limit, and the caution wherever it shows any", () => {
    expect(html(view())).not.toContain("Weight");
    const none = html(view({ weight: { off: "no-weight" } }));
    expect(none).toContain("Weight this morning, kg");
    expect(none).toContain("Rapid weight loss can injure or kill.");
    const line = html(
      view({
        unit: "lb",
        weight: {
          off: null,
          limitKg: 60,
          weighIn: "2027-01-08",
          line: [{ date: "2026-12-02", kg: 62.8 }],
          remarks: [{ kind: "over", text: "Over the line." }],
        },
      }),
    );
    expect(line).toContain("The line today is 138.5 lb, 132.3 lb at the scale, Fri 8 Jan.");
    expect(line).toContain("Over the line.");
  });

  it("says on a hold what stops, who lifts it and that it is no clearance", () => {
    const page = html(view({ hold: { from: "2026-12-01", to: null } }));
    expect(page).toContain("On a hold since Tue 1 Dec");
    expect(page).toContain("until the medic lifts it");
    expect(page).toContain("This is no medical clearance.");
  });

  it("offers no log for travel, the bout and the weigh-in", () => {
    for (const over of [
      { kind: "travel" },
      { source: "bout", kind: "bout" },
      { source: "weigh-in", kind: "weigh-in" },
    ] as const)
      expect(html(view({}, [session(over)]))).not.toMatch(/Log it|I missed it|I can’t make it/);
  });
});
