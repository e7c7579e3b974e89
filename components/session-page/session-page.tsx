"use client";

import { Notice } from "@/components/ui/notice";
import { useSession } from "@/lib/query/prescription";
import type { SessionPageView } from "@/lib/schemas/prescription";
import { LiftPart } from "./lift-part";
import { LogPart } from "./log-part";
import { SessionHead } from "./session-head";
import { useSessionActs } from "./use-session-acts";
import { WhyPart } from "./why-part";

interface SessionPageProps {
  readonly initial: SessionPageView;
  /** The reader is the athlete, and the session is near enough to be logged on the page of the day. */
  readonly loggable: boolean;
}

/** One session of a camp: what is asked, why, and what was logged. */
export function SessionPage({ initial, loggable }: SessionPageProps) {
  const { data: view, error } = useSession(initial);
  const acts = useSessionActs(view);
  const { lift, log, unit, lastTime, may, past } = view;
  const open = lift?.closed === null;
  return (
    <>
      <SessionHead view={view} today={loggable} />
      {view.session.dropped ? (
        <Notice tone="caution" className="mb-4">
          This session was taken out of the plan; it stays in sight because it was logged.
        </Notice>
      ) : null}
      {error ? (
        <Notice tone="error" role="status" className="mb-4" title="This page may be behind">
          {error.message}
        </Notice>
      ) : null}
      <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_356px]">
        <div className="grid min-w-0 gap-4">
          {log ? <LogPart log={log} lift={lift} unit={unit} /> : null}
          {lift ? (
            <LiftPart
              lift={lift}
              unit={unit}
              lastTime={lastTime}
              acts={acts}
              mayEdit={open && may.includes("prescription.write")}
              maySwap={open && may.includes("prescription.swap")}
            />
          ) : null}
          {!lift && !log ? (
            <Notice>
              {past && may.includes("logs.read")
                ? "Nothing was logged."
                : "There is nothing more to say of it."}
            </Notice>
          ) : null}
        </div>
        {lift ? <WhyPart lift={lift} /> : null}
      </div>
    </>
  );
}
