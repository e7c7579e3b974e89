import { withTeam } from "@/lib/http/with-team";
import { campFormSchema } from "@/lib/schemas/camp";
import { createCamp } from "@/lib/services/camps/create";
import { listCampSummaries } from "@/lib/services/camps/read";

export const GET = withTeam(listCampSummaries, {});
export const POST = withTeam(createCamp, { may: "camps.create", body: campFormSchema, status: 201 });
