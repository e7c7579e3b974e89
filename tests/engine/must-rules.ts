import type { Lift, PlanInput } from "@/lib/engine";

/**
 * The must rules of placement, written a second time from the design and not from the engine: no line is shared with it,
 * so that an error there cannot hide itself here.
 */
export interface Broken {
  readonly rule: string;
  readonly id: string;
}

/** UTC minutes of a wall-clock reading. */
function utc(input: PlanInput, day: number, minute: number): number {
  const wall = day * 24 * 60 + minute;
  const holding = input.zone.filter((step) => step.from <= wall).at(-1) ?? input.zone[0];
  return wall - (holding ? holding.offset : 0);
}

/** 1 is Monday; day 4 of the epoch, 1970-01-05, was one. */
const isoWeekday = (day: number): number => ((((day - 4) % 7) + 7) % 7) + 1;

/** Days on which nothing is planned. */
export function closedDays(input: PlanInput, day: number): string | null {
  if (day === input.bout.day) return "bout";
  if (input.weighIn?.day === day) return "weigh-in";
  if (input.holds.some((hold) => day >= hold.from && (hold.to === null || day <= hold.to))) return "held";
  const whole = input.sport.find(
    (session) => session.day === day && (session.kind === "rest" || session.kind === "travel"),
  );
  return whole ? whole.kind : null;
}

/** Every must rule that lifts of `suspects` break, against the sport and against all lifts. */
export function brokenMustRules(
  input: PlanInput,
  all: readonly Lift[],
  suspects: readonly Lift[],
): readonly Broken[] {
  const { rules } = input;
  const sport = input.sport
    .filter((session) => session.kind !== "rest" && session.kind !== "travel")
    .map((session) => {
      const from = utc(input, session.day, session.start);
      return { ...session, from, until: from + session.minutes };
    });
  const spans = new Map(all.map((lift) => [lift.id, utc(input, lift.day, lift.start)]));
  const broken: Broken[] = [];

  for (const lift of suspects) {
    const from = utc(input, lift.day, lift.start);
    const until = from + lift.minutes;
    const daysOut = input.bout.day - lift.day;
    const say = (rule: string, breaks: boolean): void => {
      if (breaks) broken.push({ rule, id: lift.id });
    };

    const window = input.athlete.freeHours.some(
      (hours) =>
        hours.weekday === isoWeekday(lift.day) &&
        lift.start >= hours.from &&
        lift.start + lift.minutes <= hours.to,
    );
    say("free-hours", !window || closedDays(input, lift.day) !== null);

    for (const session of sport) {
      const apart = Math.max(session.from - until, from - session.until);
      say("clash", apart < rules["clash.gap"]);
      if (session.kind !== "hard-sparring") continue;
      if (session.from >= from) {
        say(
          "heavy-before-hard",
          lift.heavyLower && session.from - until < 60 * rules["heavy-before-hard.hours"],
        );
      } else {
        say("lift-after-hard", from - session.until < 60 * rules["lift-after-hard.hours"]);
        say(
          "lift-after-hard",
          lift.heavyLower && from - session.until < 60 * rules["heavy-after-hard.hours"],
        );
      }
    }

    for (const other of all) {
      if (other.id === lift.id) continue;
      const otherFrom = spans.get(other.id) ?? Number.NaN;
      const apart = Math.max(otherFrom - until, from - otherFrom - other.minutes);
      say("clash", apart < rules["clash.gap"]);
      say("heavy-apart", lift.heavyLower && other.heavyLower && apart < 60 * rules["heavy-apart.hours"]);
      say("one-lift", other.day === lift.day);
    }

    const sportThatDay = sport.filter((session) => session.day === lift.day).length;
    say("one-lift", sportThatDay + 1 > rules["sessions-a-day"]);
    say("last-heavy", lift.heavyLower && daysOut < rules["last-heavy.days"]);
    say("last-lift", daysOut <= rules["last-lift.days"]);
    say("last-lift", daysOut <= rules["only-primer.days"] && lift.item !== "primer");
  }
  return broken;
}
