import { withTeam } from "@/lib/http/with-team";
import { feedFormSchema } from "@/lib/schemas/feed";
import { createFeed, listFeeds } from "@/lib/services/feeds/manage";

export const GET = withTeam(listFeeds, { may: "account.own" });
export const POST = withTeam(createFeed, { may: "account.own", body: feedFormSchema, status: 201 });
