import { z } from "zod";

/** A calendar to subscribe to: one athlete's, or the whole team's. */
export const feedFormSchema = z.discriminatedUnion("scope", [
  z.object({ scope: z.literal("athlete"), athleteId: z.uuid(), discreet: z.boolean() }),
  z.object({ scope: z.literal("team"), discreet: z.boolean() }),
]);
export type FeedForm = z.infer<typeof feedFormSchema>;

/** A subscription as its owner sees it; its address is not in it, since nobody but the calendar knows it. */
export interface FeedView {
  readonly id: string;
  /** Null: the whole team. */
  readonly athlete: { readonly id: string; readonly name: string } | null;
  readonly discreet: boolean;
  readonly createdAt: string;
  /** Of the last few hours at best: not each reading is written down. */
  readonly lastReadAt: string | null;
  /** False once the role no longer allows it: the address then answers 404. */
  readonly allowed: boolean;
}

/** Answer to making or renewing one: the only time that the address is shown. */
export interface NewFeed {
  readonly feed: FeedView;
  /** https address; a bearer secret. */
  readonly address: string;
}
