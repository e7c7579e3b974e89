import { isPreview, type PreviewResult } from "@/lib/book/preview-result";
import { dayFromIso, hhmm, minuteFromHhmm } from "@/lib/engine/geometry";
import type {
  Day,
  Instant,
  KnockOn,
  Lift,
  LiftEffect,
  Minute,
  SportEffect,
  SportSession,
  Violation,
} from "@/lib/engine/types";
import { momentText } from "@/lib/format/civil";
import type { Action } from "@/lib/policy";
import type { ChipState } from "@/components/session/chip";
import { ITEM_LOOKS, SPORT_LOOKS, WEIGH_IN_LOOK, liftLook, type WorkLook } from "@/components/session/kinds";
import type { Hand } from "../desk-state";
import { isPastAt, type Picture } from "../picture";

/** One chip of the calendar. */
export interface CalendarEntry {
  /** Of its own in the calendar: what stood somewhere before carries "ghost:" in front of the session's id. */
  readonly id: string;
  readonly sessionId: string;
  readonly source: "lift" | "sport" | "weigh-in";
  readonly day: Day;
  readonly start: Minute;
  readonly wholeDay: boolean;
  readonly look: WorkLook;
  readonly title: string;
  readonly state: ChipState;
  readonly movable: boolean;
  /** All of it in words. */
  readonly label: string;
}

interface Desk {
  readonly shown: Picture;
  readonly preview: PreviewResult | null;
  readonly now: Instant;
  readonly may: readonly Action[];
  readonly hand: Hand | null;
  readonly selected: string | null;
}

type Words = readonly (string | false | null)[];
const say = (...words: Words): string => words.filter(Boolean).join(", ");

const isWholeDay = ({ kind }: SportSession): boolean => kind === "travel" || kind === "rest";

/** Sessions that break a rule: a lift where one is involved, else what the sport itself does. */
function brokenIds(violations: readonly Violation[], lifts: readonly Lift[]): ReadonlySet<string> {
  const liftIds = new Set(lifts.map((lift) => lift.id));
  return new Set(
    violations.flatMap(({ ids }) => {
      const own = ids.filter((id) => liftIds.has(id));
      return own.length > 0 ? own : ids;
    }),
  );
}

const moveText = (effect: LiftEffect | SportEffect | undefined): string | null => {
  if (effect?.kind === "added") return "new, not saved";
  return effect?.kind === "moved" && effect.from ? `moved from ${momentText(effect.from)}, not saved` : null;
};

const landed = (effect: LiftEffect | SportEffect | undefined): boolean =>
  effect?.kind === "moved" || effect?.kind === "added";

function liftEntry(lift: Lift, desk: Desk, effect: LiftEffect | undefined, broken: boolean): CalendarEntry {
  const past = lift.past || isPastAt(desk.shown.zone, lift, desk.now);
  const look = liftLook(lift.item, lift.phase);
  const held = desk.hand?.id === lift.id;
  return {
    id: lift.id,
    sessionId: lift.id,
    source: "lift",
    day: lift.day,
    start: lift.start,
    wholeDay: false,
    look,
    title: look.label,
    movable: !past && desk.may.includes("lifts.write") && desk.shown.book.status === "on",
    state: {
      past,
      broken,
      held,
      pinned: lift.pinned,
      moved: landed(effect),
      marked: desk.selected === lift.id,
    },
    label: say(
      look.label,
      momentText(lift),
      lift.sets > 0 && `${lift.sets} sets`,
      lift.pinned && "pinned",
      broken && "breaks a rule",
      past && "past",
      moveText(effect),
    ),
  };
}

function sportEntry(
  session: SportSession,
  desk: Desk,
  effect: SportEffect | undefined,
  broken: boolean,
): CalendarEntry {
  const past = isPastAt(desk.shown.zone, session, desk.now);
  const look = SPORT_LOOKS[session.kind];
  return {
    id: session.id,
    sessionId: session.id,
    source: "sport",
    day: session.day,
    start: session.start,
    wholeDay: isWholeDay(session),
    look,
    title: session.title,
    movable: !past && desk.may.includes("sport.write") && desk.shown.book.status === "on",
    state: {
      past,
      broken,
      held: desk.hand?.id === session.id,
      moved: landed(effect),
      marked: desk.selected === session.id,
    },
    label: say(
      session.title,
      session.title === look.label ? null : look.label,
      momentText(session),
      broken && "breaks a rule",
      past && "past",
      moveText(effect),
    ),
  };
}

const GONE = new Set<string>(["moved", "dropped", "unplaced"]);

/** What a pointer carries stays where it was as its own ghost until it is dropped; FullCalendar draws the one under the pointer. */
const carriedId = ({ hand }: Desk): string | null => (hand?.by === "pointer" ? hand.id : null);

const carriedState = { ghost: true } as const;

/** Where sessions stood before the change that is being tried. */
function ghosts(knockOn: KnockOn, shown: Picture): CalendarEntry[] {
  const phaseOf = (day: Day) =>
    shown.plan.phases.find((span) => span.from <= day && day <= span.to)?.phase ?? "strength";
  const ghost = (
    id: string,
    look: WorkLook,
    title: string,
    from: { day: Day; start: Minute },
    wholeDay: boolean,
  ) => ({
    id: `ghost:${id}`,
    sessionId: id,
    day: from.day,
    start: from.start,
    wholeDay,
    look,
    title,
    movable: false,
    state: { ghost: true },
    label: `${title} stood here before, ${momentText(from)}`,
  });
  return [
    ...knockOn.lifts.flatMap((effect): CalendarEntry[] =>
      GONE.has(effect.kind) && effect.from
        ? [
            {
              ...ghost(
                effect.id,
                liftLook(effect.item, phaseOf(effect.from.day)),
                ITEM_LOOKS[effect.item].label,
                effect.from,
                false,
              ),
              source: "lift",
            },
          ]
        : [],
    ),
    ...knockOn.sport.flatMap((effect): CalendarEntry[] =>
      GONE.has(effect.kind) && effect.from
        ? [
            {
              ...ghost(
                effect.id,
                SPORT_LOOKS[effect.sport],
                effect.title,
                effect.from,
                effect.sport === "travel" || effect.sport === "rest",
              ),
              source: "sport",
            },
          ]
        : [],
    ),
  ];
}

function weighInEntry({ book, zone }: Picture, now: Instant): CalendarEntry[] {
  if (!book.weighIn || book.status === "off") return [];
  const at = { day: dayFromIso(book.weighIn.date), start: minuteFromHhmm(book.weighIn.time) };
  return [
    {
      id: "weigh-in",
      sessionId: "weigh-in",
      source: "weigh-in",
      ...at,
      wholeDay: false,
      look: WEIGH_IN_LOOK,
      title: WEIGH_IN_LOOK.label,
      movable: false,
      state: { past: isPastAt(zone, at, now) },
      label: `Weigh-in, ${momentText(at)}`,
    },
  ];
}

/** All chips of the calendar, in the order of time. */
export function calendarEntries(desk: Desk): CalendarEntry[] {
  const { shown, preview } = desk;
  const knockOn = preview && isPreview(preview) ? preview.knockOn : null;
  const lifts = new Map(knockOn?.lifts.map((effect) => [effect.id, effect]));
  const sport = new Map(knockOn?.sport.map((effect) => [effect.id, effect]));
  const broken = brokenIds(shown.plan.violations, shown.plan.lifts);
  const carried = carriedId(desk);
  const entries = [
    ...shown.plan.lifts.map((lift) => liftEntry(lift, desk, lifts.get(lift.id), broken.has(lift.id))),
    ...shown.sport.map((session) => sportEntry(session, desk, sport.get(session.id), broken.has(session.id))),
    ...weighInEntry(shown, desk.now),
    ...(knockOn ? ghosts(knockOn, shown).filter((ghost) => ghost.sessionId !== carried) : []),
  ];
  return entries
    .map((entry) => (entry.id === carried ? { ...entry, state: carriedState } : entry))
    .sort((a, b) => a.day - b.day || a.start - b.start || a.id.localeCompare(b.id));
}

/** "18:00", or nothing where the session takes the whole day. */
export const entryTime = (entry: CalendarEntry): string | undefined =>
  entry.wholeDay ? undefined : hhmm(entry.start);
