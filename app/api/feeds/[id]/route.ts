import { withTeam } from "@/lib/http/with-team";
import { renewFeed, revokeFeed } from "@/lib/services/feeds/manage";

/** A new address for it. */
export const POST = withTeam(renewFeed, { may: "account.own" });
export const DELETE = withTeam(revokeFeed, { may: "account.own" });
