import type { SportEffect, SportSession } from "../types";

const placeOf = ({ day, start, minutes }: SportSession) => ({ day, start, minutes });

function effectOf(before: SportSession, after: SportSession): SportEffect | null {
  const moved = before.day !== after.day || before.start !== after.start;
  const edited =
    before.minutes !== after.minutes ||
    before.effort !== after.effort ||
    before.kind !== after.kind ||
    before.title !== after.title;
  if (!moved && !edited) return null;
  return {
    id: after.id,
    title: after.title,
    sport: after.kind,
    kind: moved ? "moved" : "edited",
    from: placeOf(before),
    to: placeOf(after),
  };
}

/**
 * What became of each sport session. One that comes or goes outside `span`, the days that both camps have, comes or goes
 * with the camp's own days: that is no change to the sport, and what is past before a later camp start is not dropped.
 */
export function sportEffects(
  before: readonly SportSession[],
  after: readonly SportSession[],
  span: { readonly from: number; readonly to: number },
): readonly SportEffect[] {
  const shared = ({ day }: SportSession): boolean => day >= span.from && day <= span.to;
  const old = new Map(before.map((session) => [session.id, session]));
  const now = new Set(after.map((session) => session.id));
  const kept = after.flatMap((session): SportEffect[] => {
    const was = old.get(session.id);
    const effect = was ? effectOf(was, session) : null;
    if (was) return effect ? [effect] : [];
    const { id, title, kind } = session;
    return shared(session)
      ? [{ id, title, sport: kind, kind: "added", from: null, to: placeOf(session) }]
      : [];
  });
  const gone = before
    .filter((session) => !now.has(session.id) && shared(session))
    .map((session): SportEffect => {
      const { id, title, kind } = session;
      return { id, title, sport: kind, kind: "dropped", from: placeOf(session), to: null };
    });
  const at = ({ from, to }: SportEffect) => to ?? from ?? { day: 0, start: 0 };
  return [...kept, ...gone].sort(
    (a, b) => at(a).day - at(b).day || at(a).start - at(b).start || (a.id < b.id ? -1 : 1),
  );
}
