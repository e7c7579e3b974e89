import { withTeam } from "@/lib/http/with-team";
import { listPeople } from "@/lib/services/accounts/people";

export const GET = withTeam(listPeople, { may: "team.people" });
