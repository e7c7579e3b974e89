import Link from "next/link";
import { daysOutText } from "@/components/camp/bout-line";
import { KindMark } from "@/components/session/kind-mark";
import { PHASE_LOOKS, SPORT_LOOKS, WEIGH_IN_LOOK, liftLook, type WorkLook } from "@/components/session/kinds";
import { classNames } from "@/components/ui/class-names";
import { dayFromIso, isoFromDay } from "@/lib/engine/geometry";
import { ITEMS, SPORT_KINDS, type Day } from "@/lib/engine/types";
import { dayText, longDayText } from "@/lib/format/civil";
import type { CampSummary } from "@/lib/schemas/camp";

/** Days ahead that a row shows. */
export const BOARD_DAYS = 14;

type NextSession = CampSummary["next"][number];

const phaseAt = ({ phases }: CampSummary, day: Day) =>
  phases.find((span) => span.from <= day && day <= span.to)?.phase ?? null;

function lookOf(session: NextSession, camp: CampSummary): WorkLook | null {
  const item = ITEMS.find((known) => known === session.kind);
  if (item) return liftLook(item, phaseAt(camp, dayFromIso(session.date)) ?? "strength");
  const sport = SPORT_KINDS.find((known) => known === session.kind);
  if (sport) return SPORT_LOOKS[sport];
  return session.source === "weigh-in" ? WEIGH_IN_LOOK : null;
}

function DayCell({ camp, day }: { readonly camp: CampSummary; readonly day: Day }) {
  const date = isoFromDay(day);
  if (date === camp.bout.date && camp.status === "on") {
    return (
      <span className="flex min-h-9 items-center justify-center bg-bar font-display text-bar-text">BOUT</span>
    );
  }
  const sessions = camp.next.filter((session) => session.date === date && session.source !== "bout");
  return (
    <span className="flex min-h-9 flex-wrap content-center items-center justify-center gap-1">
      {sessions.map((session) => {
        const look = lookOf(session, camp);
        return look ? (
          <span key={session.id} title={`${session.title}, ${session.start}`}>
            <KindMark mark={look.mark} size={11} className={look.text} />
            <span className="sr-only">
              {session.title} {session.start}
            </span>
          </span>
        ) : null;
      })}
    </span>
  );
}

/** What a coach should know of a camp, in words and numbers. */
export function remarksOf(camp: CampSummary): string[] {
  const lifts = (count: number): string =>
    count === 1 ? "1 lift has no place" : `${count} lifts have no place`;
  const rules = (count: number): string => (count === 1 ? "1 rule is broken" : `${count} rules are broken`);
  return [
    ...(camp.status === "off" ? ["The bout is off"] : []),
    ...(camp.onHold ? ["On a hold"] : []),
    ...(camp.unplaced > 0 ? [lifts(camp.unplaced)] : []),
    ...(camp.violations > 0 ? [rules(camp.violations)] : []),
  ];
}

interface BoardRowProps {
  readonly camp: CampSummary;
  readonly today: Day;
}

/** One camp: who, days out, bout, phase, the next days, and what does not fit. */
export function BoardRow({ camp, today }: BoardRowProps) {
  const boutDay = dayFromIso(camp.bout.date);
  const { count, words } = daysOutText(boutDay, today);
  const phase = phaseAt(camp, today);
  const remarks = remarksOf(camp);
  return (
    <li className="relative grid gap-x-5 gap-y-2 rounded-md border border-line bg-paper px-4 py-3 lg:grid-cols-[92px_minmax(0,260px)_minmax(0,1fr)_minmax(0,180px)] lg:items-center">
      <p className="flex items-end gap-1.5">
        <span className="font-display text-[52px] leading-[0.82]">{count}</span>
        <span className="font-display text-lg leading-none text-ink-2 uppercase">
          {words[0]}
          <br />
          {words[1]}
        </span>
      </p>
      <div className="min-w-0">
        <h2 className="leading-tight font-semibold">
          <Link href={`/camps/${camp.id}`} className="rounded after:absolute after:inset-0 hover:underline">
            {camp.athlete.name}
          </Link>
          {camp.bout.opponent ? (
            <span className="font-normal text-ink-2"> v {camp.bout.opponent}</span>
          ) : null}
        </h2>
        <p className="text-sm text-ink-2">
          {longDayText(boutDay)}
          {camp.bout.place ? `, ${camp.bout.place}` : ""}
        </p>
        <p className="flex items-center gap-1.5 text-sm text-ink-2">
          {phase && camp.status === "on" ? (
            <>
              <span
                className={classNames("h-2.5 w-2.5", boutDay - today < 7 ? "bg-red" : PHASE_LOOKS[phase].bar)}
              />
              {boutDay - today < 7 ? "Fight week" : PHASE_LOOKS[phase].label}
            </>
          ) : null}
        </p>
      </div>
      <ol aria-label={`Next ${BOARD_DAYS} days`} className="grid grid-cols-7 sm:grid-cols-14">
        {Array.from({ length: BOARD_DAYS }, (_, index) => (today + index) as Day).map((day) => (
          <li key={day} className="border-l border-line-soft last:border-r">
            <span
              className={classNames(
                "block text-center text-2xs",
                day === today ? "font-semibold" : "text-ink-3",
              )}
            >
              <span aria-hidden="true">{dayText(day).split(" ")[1]}</span>
              <span className="sr-only">{dayText(day)}</span>
            </span>
            <DayCell camp={camp} day={day} />
          </li>
        ))}
      </ol>
      <ul className="text-sm">
        {remarks.map((remark) => (
          <li key={remark}>{remark}</li>
        ))}
        {remarks.length === 0 ? <li className="text-ink-2">Everything has its place</li> : null}
      </ul>
    </li>
  );
}
