"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { PageLink } from "@/components/ui/page-link";
import { contentOf, type Queue } from "@/lib/offline/queue";
import { EMPTY_LOG } from "@/lib/offline/overlay";
import type { MassUnit } from "@/lib/format/load";
import type { DaySession } from "@/lib/schemas/today";
import { endOf } from "./days";
import { FinishForm } from "./finish-form";
import { Knock } from "./knock";
import { LiftLines } from "./lift-lines";
import { LiftLog } from "./lift-log";
import { LogSummary } from "./log-summary";
import { isLogged, lookOf } from "./looks";
import { RequestForm } from "./request-form";
import { restStore } from "./rest-store";
import { Section, StateWord } from "./section";
import { isWaiting, type Acts } from "./use-acts";

interface SessionCardProps {
  readonly session: DaySession;
  readonly today: string;
  readonly unit: MassUnit;
  readonly queue: Queue;
  readonly acts: Acts;
}

function leadOf({ start, minutes, source, sets, effort, place, kind }: DaySession): string {
  const when = minutes > 0 && source !== "bout" ? `${start} to ${endOf(start, minutes)}` : start;
  const work = source === "lift" && sets !== null ? `${sets} working sets` : "";
  const hard = isLogged({ source, kind }) ? `expect an effort of ${effort}` : "";
  return [when, work, hard, place].filter(Boolean).join(" · ");
}

/** What is asked for, and the way to why and to swaps. */
const LiftPart = ({ session, unit }: Pick<SessionCardProps, "session" | "unit">) => (
  <>
    <LiftLines session={session} unit={unit} />
    <PageLink
      href={`/camps/${session.campId}/sessions/${encodeURIComponent(session.id)}`}
      className="inline-flex min-h-11 items-center text-sm font-semibold underline underline-offset-4"
    >
      Why this, and swaps
    </PageLink>
  </>
);

/** What one can do with a session that may be logged: begin, go on, say it was missed. */
function LogPart({ session, unit, queue, acts }: Omit<SessionCardProps, "today">) {
  const given = session.log;
  const log = given ? contentOf(given) : EMPTY_LOG;
  // Until a button says otherwise a begun log stands open, also when it comes out of this phone's memory after a reload.
  const [said, setOpen] = useState<boolean | null>(null);
  const open = said ?? given?.state === "open";
  const change = (state: "open" | "missed"): void => acts.log(session, () => ({ state }));
  const isLift = session.source === "lift";
  const close = (): void => {
    setOpen(false);
    if (isLift) restStore.stop();
  };
  const word = (
    <StateWord
      given={given !== null}
      waiting={isWaiting(queue, `log:${session.campId}/${session.id}`)}
      className="mt-1"
    />
  );
  const knock = isLift ? null : (
    <Knock taken={log.knock} onTaken={() => acts.log(session, () => ({ knock: true }))} />
  );
  if (open && log.state !== "missed")
    return (
      <>
        {isLift ? <LiftLog session={session} log={log} unit={unit} acts={acts} /> : knock}
        <FinishForm session={session} log={log} acts={acts} onDone={close} />
        {word}
        <Button variant="quiet" wide className="min-h-12" onClick={close}>
          Fold away
        </Button>
      </>
    );
  const asked = isLift ? <LiftPart session={session} unit={unit} /> : null;
  if (log.state === "missed")
    return (
      <>
        {asked}
        <p className="mt-2.5 text-sm font-semibold">You missed it.</p>
        {word}
        <Button
          wide
          className="min-h-12"
          onClick={() => {
            change("open");
            setOpen(true);
          }}
        >
          I did do it
        </Button>
      </>
    );
  const begun = given !== null;
  return (
    <>
      {asked}
      {begun ? <LogSummary log={log} unit={unit} /> : null}
      {log.knock ? knock : null}
      {begun ? word : null}
      <Button
        variant={log.state === "done" ? "plain" : "primary"}
        wide
        className="mt-3 min-h-12"
        onClick={() => setOpen(true)}
      >
        {log.state === "done"
          ? "Edit the log"
          : begun
            ? "Go on logging"
            : isLift
              ? "Start and log"
              : "Log it"}
      </Button>
      {log.state === "done" ? null : (
        <Button variant="quiet" wide className="mt-1 min-h-12" onClick={() => change("missed")}>
          I missed it
        </Button>
      )}
    </>
  );
}

/** One session of the day: what it is, what is in it, and the athlete's answer to it. */
export function SessionCard(props: SessionCardProps) {
  const { session, today, unit, queue, acts } = props;
  const { date, editableUntil, log } = session;
  const logged = isLogged(session);
  const open = logged && date <= today && today <= editableUntil;
  const isLift = session.source === "lift";
  const ahead = logged && date >= today && (log === null || log.state === "open");
  const title =
    session.source === "bout" ? (
      <span className="font-display text-2xl tracking-wide uppercase">{session.title}</span>
    ) : (
      session.title
    );
  return (
    <Section title={title} look={lookOf(session)} lead={leadOf(session)}>
      {isLift && !open ? <LiftPart session={session} unit={unit} /> : null}
      {open ? <LogPart session={session} unit={unit} queue={queue} acts={acts} /> : null}
      {!open && log ? <LogSummary log={contentOf(log)} unit={unit} /> : null}
      {!open && logged && date < today && !log ? (
        <p className="mt-2.5 text-sm text-ink-2">Not logged. The day to log it is over.</p>
      ) : null}
      {ahead || session.request ? <RequestForm session={session} queue={queue} acts={acts} /> : null}
    </Section>
  );
}
