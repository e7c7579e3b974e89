import Link from "next/link";
import { hoursText } from "@/components/session/camp-days";
import { KindMark } from "@/components/session/kind-mark";
import { PHASE_LOOKS, weekTitle } from "@/components/session/kinds";
import { intensityText } from "@/components/session/session-why";
import { LinkButton } from "@/components/ui/link-button";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine/geometry";
import { dayText, longDayText } from "@/lib/format/civil";
import type { SessionLink, SessionPageView } from "@/lib/schemas/prescription";
import { daysOutText, lookOf } from "./words";

const sessionHref = (campId: string, id: string): string =>
  `/camps/${campId}/sessions/${encodeURIComponent(id)}`;

function factsOf({ lift, session, daysOut }: SessionPageView): string {
  const facts = [daysOutText(daysOut)];
  if (lift) {
    const { phase, week, sets, intensity, effort } = lift.lift;
    facts.push(PHASE_LOOKS[phase].label, weekTitle(week), `${sets} sets`, intensityText(intensity));
    facts.push(`expect an effort of ${effort}`);
  } else if (session.source === "sport" && session.effort !== null) {
    facts.push(`effort ${session.effort}`, `${Math.round(session.effort * session.minutes)} AU`);
  }
  if (session.place) facts.push(session.place);
  return facts.join(" · ");
}

const Way = ({ to, campId, word }: { to: SessionLink | null; campId: string; word: string }) =>
  to ? (
    <Link
      href={sessionHref(campId, to.id)}
      className="flex min-h-control-small items-center underline underline-offset-4"
    >
      {word}: {to.title}, {dayText(dayFromIso(to.date))}
    </Link>
  ) : null;

/** What the session is, when it is, and the ways on from it. */
export function SessionHead({ view, today }: { readonly view: SessionPageView; readonly today: boolean }) {
  const { session, campId, athlete, lift } = view;
  const look = lookOf(view);
  const place = { start: minuteFromHhmm(session.start), minutes: session.minutes };
  return (
    <header className="mb-4">
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="min-w-0">
          <p className="text-sm text-ink-2">{athlete.name}</p>
          <h1 className="flex items-center gap-2.5 text-2xl font-semibold">
            <KindMark mark={look.mark} size={15} className={look.text} />
            {session.title}
          </h1>
          <p className="mt-0.5">
            <b className="font-semibold">{longDayText(dayFromIso(session.date))}</b>, {hoursText(place)}
          </p>
          <p className="text-sm text-ink-2">{factsOf(view)}</p>
        </div>
        <div className="flex flex-wrap gap-2">
          {today ? (
            <LinkButton size="small" variant="primary" href="/today">
              Log it on today’s page
            </LinkButton>
          ) : null}
          <LinkButton size="small" href={`/camps/${campId}?session=${encodeURIComponent(session.id)}`}>
            To the camp
          </LinkButton>
          <LinkButton size="small" href={`/camps/${campId}/sheet${lift ? `?week=${lift.lift.week}` : ""}`}>
            The week’s sheet
          </LinkButton>
        </div>
      </div>
      <nav aria-label="Sessions" className="mt-2 flex flex-wrap gap-x-6 text-sm">
        <Way to={view.previous} campId={campId} word="Before" />
        <Way to={view.next} campId={campId} word="After" />
      </nav>
    </header>
  );
}
