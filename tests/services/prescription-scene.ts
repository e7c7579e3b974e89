import type { LineView, SessionPageView } from "@/lib/schemas/prescription";
import type { TeamContext } from "@/lib/services/context";
import { readSession } from "@/lib/services/prescription/session-page";
import { NOW, type DayScene } from "./day-scene";

export const read = (ctx: TeamContext, scene: Pick<DayScene, "campId">, sid: string) =>
  readSession(ctx, { params: { id: scene.campId, sid } });

export const liftOf = (view: SessionPageView) => {
  if (!view.lift) throw new Error("no prescription");
  return view.lift;
};
export const lineOf = (view: SessionPageView, slot: string): LineView => {
  const line = liftOf(view).lines.find((one) => one.slot === slot);
  if (!line) throw new Error(`no ${slot}`);
  return line;
};

/** The lifts to come of one item, in time. */
export async function coming(scene: DayScene, item: string) {
  const rows = await scene.lifts();
  return rows.filter((row) => row.kind === item && row.startsAt > NOW && row.status === "confirmed");
}
export async function first(scene: DayScene, item: string) {
  const [row] = await coming(scene, item);
  if (!row) throw new Error(`no ${item} to come`);
  return row;
}
