import type { Au, SportSession } from "../types";

/** Session load, AU: CR-10 effort x minutes. Foster 1998, Med Sci Sports Exerc 30:1164-1168. */
export function sessionLoad(effort: number, minutes: number): Au {
  return (effort * minutes) as Au;
}

/** Load of a sport session: what was answered for when it is done, else what is expected. */
export function sportLoad(session: Pick<SportSession, "effort" | "minutes" | "doneLoad">): Au {
  return session.doneLoad ?? sessionLoad(session.effort, session.minutes);
}
