import { withTeam } from "@/lib/http/with-team";
import { withdrawRequest } from "@/lib/services/requests/requests";

export const POST = withTeam(withdrawRequest, { may: "requests.ask" });
