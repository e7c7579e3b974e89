import { openDatabase } from "./client";

/** A camp has a new revision, saved by whichever server process. */
export interface CampChanged {
  readonly campId: string;
  readonly revision: number;
}

/**
 * Listens on a connection of its own for revisions of all camps; reconnects by itself. Returns a function that stops it.
 * Rejects when the first connection fails.
 */
export async function listenCampChanges(
  url: string,
  onChange: (change: CampChanged) => void,
): Promise<() => Promise<void>> {
  const { sql } = openDatabase(url, { max: 1 });
  await sql.listen("camp_changed", (payload) => {
    const [campId, revision] = payload.split(":");
    if (campId && revision) onChange({ campId, revision: Number(revision) });
  });
  return () => sql.end();
}
