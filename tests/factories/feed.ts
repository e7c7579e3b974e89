import type { FeedEvent } from "@/lib/calendar/feed";

/** One hour of pads on 5 December 2026. */
export const feedEvent = (over: Partial<FeedEvent> = {}): FeedEvent => ({
  uid: "6f0d4d0e-0000-4000-8000-000000000001",
  source: "sport",
  title: "Pads",
  description: "",
  place: "",
  startsAt: new Date("2026-12-05T18:00:00Z"),
  endsAt: new Date("2026-12-05T19:00:00Z"),
  busy: true,
  cancelled: false,
  sequence: 0,
  changedAt: new Date("2026-11-20T08:15:30Z"),
  ...over,
});
