import type { FieldError } from "@/lib/errors";
import type { CheckIn, LogView, SessionLog } from "@/lib/schemas/today";

/** What an athlete answered and the server has not yet taken. */
export type Work =
  | {
      readonly kind: "log";
      readonly campId: string;
      readonly sessionId: string;
      /** Version that was edited; 0 for a first log. */
      readonly baseVersion: number;
      readonly log: SessionLog;
    }
  | {
      readonly kind: "check-in";
      readonly athleteId: string;
      readonly date: string;
      readonly answers: CheckIn;
    }
  | { readonly kind: "weight"; readonly athleteId: string; readonly date: string; readonly kg: number }
  | {
      readonly kind: "request";
      readonly campId: string;
      readonly sessionId: string;
      readonly reason: string;
    }
  | {
      readonly kind: "withdraw";
      readonly campId: string;
      readonly sessionId: string;
      readonly requestId: string;
    };

/** Why an entry is not sent again by itself: a person has to look. */
export type Stuck =
  | { readonly why: "stale"; readonly theirs: LogView }
  | { readonly why: "refused"; readonly text: string; readonly errors: readonly FieldError[] };

export interface Entry {
  /** UUID of this write: the server takes it once, however often it is sent. */
  readonly key: string;
  readonly madeAt: string;
  /** What it is about, for the panels: "Strength A, Wed 2 Dec". */
  readonly title: string;
  readonly work: Work;
  /** It was sent and no answer came: it may have arrived, so it is repeated as it is and never replaced. */
  readonly tried: boolean;
  readonly stuck: Stuck | null;
}

/** What an entry writes to: a later write to the same place makes an earlier one needless. */
export function placeOf(work: Work): string {
  switch (work.kind) {
    case "log":
    case "request":
      return `${work.kind}:${work.campId}/${work.sessionId}`;
    case "check-in":
    case "weight":
      return `${work.kind}:${work.date}`;
    case "withdraw":
      return `withdraw:${work.requestId}`;
  }
}

/** A request as it goes over the wire. */
export interface Wire {
  readonly method: "POST" | "PUT";
  readonly url: string;
  readonly body: unknown;
}

const sessionUrl = ({ campId, sessionId }: { readonly campId: string; readonly sessionId: string }): string =>
  `/api/camps/${encodeURIComponent(campId)}/sessions/${encodeURIComponent(sessionId)}`;
const athleteUrl = ({ athleteId }: { readonly athleteId: string }): string =>
  `/api/athletes/${encodeURIComponent(athleteId)}`;

export function wireOf({ key, work }: Entry): Wire {
  switch (work.kind) {
    case "log": {
      const { baseVersion, log } = work;
      return { method: "PUT", url: `${sessionUrl(work)}/log`, body: { key, baseVersion, log } };
    }
    case "check-in":
      return { method: "PUT", url: `${athleteUrl(work)}/check-ins/${work.date}`, body: work.answers };
    case "weight":
      return { method: "PUT", url: `${athleteUrl(work)}/weights/${work.date}`, body: { kg: work.kg } };
    case "request":
      return { method: "POST", url: `${sessionUrl(work)}/request`, body: { key, reason: work.reason } };
    case "withdraw":
      return {
        method: "POST",
        url: `/api/requests/${encodeURIComponent(work.requestId)}/withdraw`,
        body: undefined,
      };
  }
}
